import { eq, sql } from 'drizzle-orm';
import { v7 } from 'uuid';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { PayloadOf } from '../../shared/cases';
import { caseEvent, caseRow, quarantine } from '../../api/platform/db/schema';
import { outcomesOf, storeField, TestPhone, type Field } from './field';
import { startTestServer, type TestServer } from './server';

let server: TestServer;
let field: Field;
let theirs: Field;
beforeAll(async () => {
  server = await startTestServer();
  field = await storeField(server, 'ours', 'AAAAAAA');
  theirs = await storeField(server, 'theirs', 'BBBBBBB');
});
afterAll(() => server.stop());

const phone = () => new TestPhone(server.as('technician'));
const logOf = (caseId: string) =>
  server.asOwner(({ db }) =>
    db.select().from(caseEvent).where(eq(caseEvent.caseId, caseId)).orderBy(caseEvent.caseVersion),
  );

describe('sending events', () => {
  it('stores them once, in the order of the device, with actor, version and position', async () => {
    const own = phone();
    const opened = own.open(field);
    const results = await own.send([opened, own.note(opened.caseId), own.note(opened.caseId)]);
    expect(outcomesOf(results)).toEqual(['accepted', 'accepted', 'accepted']);
    const log = await logOf(opened.caseId);
    expect(log.map(({ caseVersion }) => caseVersion)).toEqual([1, 2, 3]);
    expect(log.map(({ sequence }) => sequence)).toEqual([1, 2, 3]);
    expect(new Set(log.map(({ actor }) => actor))).toEqual(
      new Set([server.fixtures.ours.technician.personId]),
    );
    const positions = log.map(({ position }) => position);
    expect(positions).toEqual([positions[0]!, positions[0]! + 1, positions[0]! + 2]);
  });

  // L2: delivered at least once, in effect once.
  it('answers a re-send as duplicate with the stored event, and stores nothing', async () => {
    const own = phone();
    const events = [own.open(field)];
    const [first] = await own.send(events);
    const [second] = await own.send(events);
    expect(second!.outcome).toBe('duplicate');
    expect(second!.stored).toEqual(first!.stored);
    expect(await logOf(events[0]!.caseId)).toHaveLength(1);
  });

  it('takes the same content with its keys in another order for the same', async () => {
    const own = phone();
    const event = own.open(field);
    await own.send([event]);
    const turned = Object.fromEntries(Object.entries(event).reverse());
    expect(outcomesOf(await own.send([turned]))).toEqual(['duplicate']);
  });

  it('refuses a re-send with another content, by id and by number', async () => {
    const own = phone();
    const opened = own.open(field);
    await own.send([opened]);
    const changed = { ...opened, recordedAt: '2020-01-01T00:00:00.000Z' };
    const renamed = { ...own.note(opened.caseId), sequence: 1 };
    expect(outcomesOf(await own.send([changed, renamed]))).toEqual([
      'rejected id-reuse',
      'rejected sequence-reuse',
    ]);
  });

  // L3: what a device made before may not come after.
  it('refuses an older number of the device that it has never seen', async () => {
    const own = phone();
    const opened = own.open(field);
    const [late, later] = [own.note(opened.caseId), own.note(opened.caseId)];
    await own.send([opened, later]);
    expect(outcomesOf(await own.send([late]))).toEqual(['rejected sequence-behind']);
  });

  // L4 and L5: a bad event delays nothing but its own case, and is kept with its data.
  it('sets a bad event aside and takes the others', async () => {
    const own = phone();
    const [a, b] = [own.open(field), own.open(field)];
    const bad = { ...own.note(a.caseId), payload: { text: 7 } };
    const nonsense = { hello: 'there' };
    const results = await own.send([a, bad, nonsense, b]);
    expect(outcomesOf(results)).toEqual([
      'accepted',
      'rejected payload-invalid',
      'rejected envelope-invalid',
      'accepted',
    ]);
    const kept = await server.asOwner(({ db }) =>
      db.select().from(quarantine).where(eq(quarantine.device, own.device)),
    );
    expect(kept.map(({ event }) => event)).toEqual(expect.arrayContaining([nonsense]));
    expect(kept.map(({ code }) => code).sort()).toEqual(['envelope-invalid', 'payload-invalid']);
    await own.send([a, bad, nonsense, b]);
    const again = await server.asOwner(({ db }) =>
      db.select().from(quarantine).where(eq(quarantine.device, own.device)),
    );
    expect(again).toHaveLength(2);
  });

  it('refuses a reading of 1e9 volts, a comma in a number, one tag twice, and more than one case', async () => {
    const own = phone();
    const opened = own.open(field);
    const huge = own.reading(opened.caseId, '1', 1e9);
    const comma = own.event(opened.caseId, 'reading taken', {
      ...(own.reading(opened.caseId, '1', 1).payload as PayloadOf<'reading taken'>),
      volts: '109,6' as never,
    });
    const oneTag = own.reading(opened.caseId, 'R', 0);
    const secondOpening = { ...own.open(field), caseId: opened.caseId };
    expect(outcomesOf(await own.send([opened, huge, comma, oneTag, secondOpening]))).toEqual([
      'accepted',
      'rejected payload-invalid',
      'rejected payload-invalid',
      'rejected probes-on-one-tag',
      'rejected case-already-open',
    ]);
  });

  it('takes a negative reading as it stands, and a tag that the circuit lacks as it was written', async () => {
    const own = phone();
    const opened = own.open(field);
    const results = await own.send([
      opened,
      own.reading(opened.caseId, '1', -109.6),
      own.reading(opened.caseId, 'not on the drawing', 12),
    ]);
    expect(outcomesOf(results)).toEqual(['accepted', 'accepted', 'accepted']);
    const [, swapped] = await logOf(opened.caseId);
    expect(swapped!.payload['volts']).toBe(-109.6);
  });

  it('refuses a reading for a closed case, with the reason', async () => {
    const own = phone();
    const closed = own.closedCase(field);
    const reading = own.reading(closed[0]!.caseId, '1', 110);
    expect(outcomesOf(await own.send([...closed, reading]))).toEqual([
      'accepted',
      'accepted',
      'rejected case-closed',
    ]);
  });

  it('keeps a type of a later build', async () => {
    const own = phone();
    const opened = own.open(field);
    const later = { ...own.note(opened.caseId), type: 'trap left', payload: { where: 'gate' } };
    expect(outcomesOf(await own.send([opened, later]))).toEqual(['accepted', 'accepted']);
  });

  it('refuses an event that is too large, and takes the next', async () => {
    const own = phone();
    const opened = own.open(field);
    const large = { ...own.note(opened.caseId), payload: { text: 'x'.repeat(70_000) } };
    expect(outcomesOf(await own.send([opened, large, own.note(opened.caseId)]))).toEqual([
      'accepted',
      'rejected event-too-large',
      'accepted',
    ]);
  });

  it.each([
    ['a NUL', { payload: { text: 'a\u0000b' } }],
    ['half a pair', { payload: { text: 'a\ud800b' } }],
    ['a NUL in a name', { state: { 'a\u0000b': 'c' } }],
    ['the year 0', { recordedAt: '0000-01-01T00:00:00.000Z' }],
  ])('sets aside an entry with %s, and takes what comes after', async (_, poison) => {
    const own = phone();
    const opened = own.open(field);
    const bad = { ...own.note(opened.caseId), ...poison };
    const after = own.note(opened.caseId);
    const [first, second, third] = await own.send([opened, bad, after]);
    expect([first!.outcome, third!.outcome]).toEqual(['accepted', 'accepted']);
    expect(second!.outcome === 'accepted' || second!.code === 'cannot-be-stored').toBe(true);
    expect((await own.send([bad]))[0]!.outcome).not.toBe('retry');
  });

  it('sets aside an opening that no date can hold, and answers the rest by name', async () => {
    const own = phone();
    const opened = { ...own.open(field), recordedAt: '0000-01-01T00:00:00.000Z' };
    const note = own.note(opened.caseId);
    expect(outcomesOf(await own.send([opened, note]))).toEqual([
      'rejected cannot-be-stored',
      'rejected case-unknown',
    ]);
  });

  it("refuses another person's device, another organisation's lift, and a review by a technician", async () => {
    const own = phone();
    const opened = own.open(field);
    await own.send([opened]);
    const engineer = new TestPhone(server.as('engineer'));
    const borrowed = { ...own.note(opened.caseId), device: own.device };
    const answer = await server
      .as('engineer')
      .post('/api/sync/events', { device: own.device, events: [borrowed] });
    expect(outcomesOf((answer.body as { results: [] }).results)).toEqual([
      'rejected device-not-yours',
    ]);
    expect(outcomesOf(await engineer.send([engineer.open(theirs)]))).toEqual([
      'rejected unknown-lift',
    ]);
    const closed = own.closedCase(field);
    const accepted = own.event(closed[0]!.caseId, 'review accepted', {});
    expect(outcomesOf(await own.send([...closed, accepted])).at(-1)).toBe(
      'rejected review-not-allowed',
    );
  });

  it('lets two devices write into one case at the same time', async () => {
    const [one, two] = [phone(), new TestPhone(server.as('engineer'))];
    const opened = one.open(field);
    await one.send([opened]);
    const notes = (of: TestPhone) => Array.from({ length: 10 }, () => of.note(opened.caseId));
    const [a, b] = await Promise.all([one.send(notes(one)), two.send(notes(two))]);
    expect([...a, ...b].every(({ outcome }) => outcome === 'accepted')).toBe(true);
    const log = await logOf(opened.caseId);
    expect(log.map(({ caseVersion }) => caseVersion)).toEqual(
      Array.from({ length: 21 }, (_, k) => k + 1),
    );
  });

  it('is limited to a hundred events', async () => {
    const own = phone();
    const opened = own.open(field);
    const many = Array.from({ length: 100 }, () => own.note(opened.caseId));
    await server
      .as('technician')
      .post('/api/sync/events', { device: own.device, events: [opened, ...many] })
      .expect(400);
  });

  it('keeps the line of a case equal to what its events make', async () => {
    const { rebuildProjections } = await import('../../api/features/cases/projection');
    const { organisationId, personId } = server.fixtures.ours.technician;
    const lines = () =>
      server.asOwner(({ db }) =>
        db
          .select()
          .from(caseRow)
          .where(eq(caseRow.organisationId, organisationId))
          .orderBy(caseRow.id),
      );
    const before = await lines();
    const rebuilt = await server.database.inOrganisation(
      organisationId,
      personId,
      rebuildProjections,
    );
    expect(rebuilt).toBe(before.length);
    expect(await lines()).toEqual(before);
  });

  it('can neither change nor remove an event through the application', async () => {
    const { organisationId, personId } = server.fixtures.ours.technician;
    const attempt = (statement: ReturnType<typeof sql>) =>
      server.database.inOrganisation(organisationId, personId, ({ db }) => db.execute(statement));
    for (const statement of [
      sql`update case_event set type = 'other'`,
      sql`delete from case_event`,
      sql`truncate case_event`,
    ]) {
      await expect(attempt(statement)).rejects.toMatchObject({ cause: { code: '42501' } });
    }
  });
});

describe('the feed', () => {
  const feed = async (after: number, limit = 500) =>
    (await server.as('technician').get(`/api/sync/feed?after=${after}&limit=${limit}`)).body as {
      events: { position: number }[];
      position: number;
      more: boolean;
    };

  it('gives every position once, in order, in pages', async () => {
    const whole = await feed(0);
    expect(whole.events.map(({ position }) => position)).toEqual(whole.events.map((_, k) => k + 1));
    const page = await feed(0, 3);
    expect(page).toMatchObject({ position: 3, more: true });
    expect((await feed(3, 2)).events.map(({ position }) => position)).toEqual([4, 5]);
    expect(await feed(whole.position)).toEqual({
      events: [],
      position: whole.position,
      more: false,
    });
  });

  // L7: a reader never passes an event that appears behind its cursor.
  it('misses nothing while others write', async () => {
    let position = (await feed(0)).position;
    const start = position;
    const writers = Array.from({ length: 6 }, async () => {
      const own = phone();
      const opened = own.open(field, v7());
      await own.send([opened]);
      for (let k = 0; k < 5; k++) await own.send([own.note(opened.caseId)]);
    });
    const seen: number[] = [];
    let writing = true;
    const done = Promise.all(writers).then(() => (writing = false));
    while (writing || (await feed(position)).events.length > 0) {
      const page = await feed(position, 4);
      seen.push(...page.events.map((event) => event.position));
      position = page.position;
    }
    await done;
    expect(seen).toEqual(Array.from({ length: 36 }, (_, k) => start + k + 1));
  });

  it("never shows another organisation's events", async () => {
    const answer = await server.as('technician', 'theirs').get('/api/sync/feed');
    expect(answer.body).toMatchObject({ events: [], position: 0, more: false });
  });
});

describe('the pack', () => {
  it('holds lifts, circuits and cases, and a position from which the feed goes on', async () => {
    const { body } = await server.as('technician').get('/api/sync/pack').expect(200);
    const pack = body as { lifts: { id: string }[]; circuits: unknown[]; position: number };
    expect(pack.lifts.map(({ id }) => id)).toEqual([field.liftId]);
    expect(pack.circuits).toHaveLength(1);
    const own = phone();
    const opened = own.open(field);
    await own.send([opened]);
    const feed = await server.as('technician').get(`/api/sync/feed?after=${pack.position}`);
    const events = (feed.body as { events: { id: string }[] }).events;
    expect(events.map(({ id }) => id)).toEqual([opened.id]);
  });
});
