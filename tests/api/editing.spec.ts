import { v7 } from 'uuid';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Lift, Person, Problem, QueueEntry } from '../../shared/contract';
import { storeField, TestPhone, type Field } from './field';
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

describe('changing a lift', () => {
  const path = () => `/api/lifts/${field.liftId}`;

  it('needs the version that was seen, and shows the other side where that is old', async () => {
    const engineer = server.as('engineer');
    await engineer.patch(path(), { notes: 'x' }).expect(428);
    const first = await engineer.patch(path(), { notes: 'mine' }, { ifMatch: 1 }).expect(200);
    expect(first.body).toMatchObject({ notes: 'mine', version: 2 });
    expect(first.headers['etag']).toBe('"2"');
    const late = await engineer.patch(path(), { notes: 'late' }, { ifMatch: 1 }).expect(412);
    const problem = late.body as Problem;
    expect(problem.code).toBe('version_conflict');
    expect((problem.details!['current'] as Lift).notes).toBe('mine');
  });

  it('is done once for one key, and refuses the key for something else', async () => {
    const administrator = server.as('administrator');
    const key = v7();
    const version = ((await administrator.get(path())).body as Lift).version;
    const change = { hazards: ['Water in the pit'] };
    const once = await administrator.patch(path(), change, { ifMatch: version, key }).expect(200);
    const again = await administrator.patch(path(), change, { ifMatch: version, key }).expect(200);
    expect(again.body).toEqual(once.body);
    await administrator.patch(path(), { notes: 'z' }, { ifMatch: version, key }).expect(422);
  });

  it('refuses a character that can be kept nowhere, and never fails on one', async () => {
    const note = { notes: 'a\u0000b' };
    await server
      .as('engineer')
      .patch(path(), note, { ifMatch: 1 })
      .expect((answer) => {
        expect([400, 412]).toContain(answer.status);
      });
    await server.as('technician').get('/api/lifts?label=%00').expect(400);
  });

  it('says what is wrong beside the field', async () => {
    const wrong = { hazards: [''], notes: 7 };
    const answer = await server.as('engineer').patch(path(), wrong, { ifMatch: 1 }).expect(400);
    const fields = (answer.body as Problem).fields!.map(({ field: name }) => name).sort();
    expect(fields).toEqual(['hazards.0', 'notes']);
  });

  it("answers another organisation's lift exactly as a missing one", async () => {
    const missing = await server.as('technician').get(`/api/lifts/${v7()}`).expect(404);
    const foreign = await server.as('technician').get(`/api/lifts/${theirs.liftId}`).expect(404);
    const bare = ({ requestId: _, ...rest }: Problem) => rest;
    expect(bare(foreign.body as Problem)).toEqual(bare(missing.body as Problem));
  });

  it('finds by label, in small letters too, and only its own', async () => {
    const find = async (label: string) =>
      (
        (await server.as('technician').get(`/api/lifts?label=${label}`).expect(200)).body as {
          lifts: Lift[];
        }
      ).lifts.map(({ id }) => id);
    expect(await find('aaaaaaa')).toEqual([field.liftId]);
    expect(await find('BBBBBBB')).toEqual([]);
  });
});

describe('people', () => {
  const person = async (role: 'technician' | 'administrator') => {
    const { personId } = server.fixtures.ours[role];
    return (await server.as('administrator').get(`/api/people/${personId}`)).body as Person;
  };

  it('shows oneself to everyone, and others only to those who look after people', async () => {
    const { technician, engineer } = server.fixtures.ours;
    await server.as('technician').get(`/api/people/${technician.personId}`).expect(200);
    await server.as('technician').get(`/api/people/${engineer.personId}`).expect(404);
    await server.as('supervisor').get(`/api/people/${engineer.personId}`).expect(200);
    await server.as('technician').get('/api/people').expect(403);
  });

  it('keeps one administrator, and lets nobody change their own role', async () => {
    const own = await person('administrator');
    const change = { role: 'engineer' };
    const answer = await server
      .as('administrator')
      .patch(`/api/people/${own.id}`, change, { ifMatch: own.version })
      .expect(422);
    expect((answer.body as Problem).code).toBe('people.own_role');
  });

  it('ends the sessions of a disabled person within ten seconds', async () => {
    const { id, version } = await person('technician');
    await server.as('technician').get('/api/lifts').expect(200);
    await server
      .as('administrator')
      .patch(`/api/people/${id}`, { disabled: true }, { ifMatch: version })
      .expect(200);
    server.advance(10_000);
    await server.as('technician').get('/api/lifts').expect(401);
    await server
      .as('administrator')
      .patch(`/api/people/${id}`, { disabled: false }, { ifMatch: version + 1 })
      .expect(200);
    server.advance(10_000);
    await server.as('technician').get('/api/lifts').expect(200);
  });
});

describe('checking a circuit', () => {
  it.each([[null], [7], ['words'], [[]], [{}], [{ parts: 'none' }], [{ strings: [{}] }]])(
    'has findings in words for %j, and never fails',
    async (nonsense) => {
      const body = JSON.stringify(nonsense);
      const answer = await server.as('engineer').post('/api/circuits/check', body).expect(200);
      const { findings } = answer.body as { findings: { code: string; detail: string }[] };
      expect(findings.length).toBeGreaterThan(0);
      for (const { code, detail } of findings) expect(detail).not.toBe(code);
    },
  );

  it('says what is not JSON', async () => {
    const answer = await server.as('engineer').post('/api/circuits/check', '{"a":').expect(400);
    expect((answer.body as Problem).code).toBe('malformed_json');
  });
});

describe('the review', () => {
  it('queues closed cases by risk, and a decision takes a case out of it', async () => {
    const phone = new TestPhone(server.as('technician'));
    const [plain, opened] = [phone.closedCase(field), phone.open(field)];
    const arrival = phone.event(opened.caseId, 'arrival checked', {
      peopleSafe: true,
      noticesUp: true,
      meterProven: true,
      linksFound: 0,
    });
    const danger = phone.event(opened.caseId, 'danger raised', {
      danger: { code: 'second earth', observations: [] },
    });
    const isolated = phone.event(opened.caseId, 'isolated', {
      provenDead: true,
      noticeFitted: true,
      told: 'supervisor',
      left: ['second earth at the pit'],
    });
    const closed = phone.event(opened.caseId, 'case closed', { outcome: 'left isolated' });
    const results = await phone.send([...plain, opened, arrival, danger, isolated, closed]);
    expect(results.map(({ outcome }) => outcome)).toEqual(results.map(() => 'accepted'));

    const queue = async () =>
      (
        (await server.as('supervisor').get('/api/review/queue').expect(200)).body as {
          cases: QueueEntry[];
        }
      ).cases;
    expect((await queue()).map(({ id }) => id)).toEqual([opened.caseId, plain[0]!.caseId]);

    const desk = new TestPhone(server.as('supervisor'));
    await desk.send([
      desk.event(plain[0]!.caseId, 'review accepted', { remark: 'Sound' }),
      desk.event(opened.caseId, 'review returned', { question: 'Who was told?' }),
    ]);
    expect(await queue()).toEqual([]);
    const again = desk.event(plain[0]!.caseId, 'review accepted', {});
    const [late] = await desk.send([again]);
    expect(late).toMatchObject({ outcome: 'rejected', code: 'case-not-to-review' });
  });
});
