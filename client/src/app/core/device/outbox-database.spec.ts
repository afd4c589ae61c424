import { asStored, inMemoryPhone, noteEvent } from './in-memory-phone';
import {
  allOwn,
  appendOwn,
  deviceId,
  takeResults,
  takeStored,
  waitingEvents,
} from './outbox-database';

function opened() {
  const phone = inMemoryPhone();
  return { phone, database: phone.open('somebody') };
}

describe('appending', () => {
  it('numbers events of many callers at once without gap and without double', async () => {
    const { phone, database } = opened();
    const other = phone.open('somebody');
    const appended = await Promise.all(
      Array.from({ length: 20 }, (_, index) =>
        appendOwn(index % 2 ? database : other, noteEvent(phone.newId(), 'case')),
      ),
    );
    const sequences = appended.map(({ sequence }) => sequence).sort((a, b) => a - b);
    expect(sequences).toEqual(Array.from({ length: 20 }, (_, index) => index + 1));
  });

  it('takes neither event nor number when the write fails', async () => {
    const { phone, database } = opened();
    await appendOwn(database, noteEvent(phone.newId(), 'case'));
    phone.failingWrites = 1;
    await expect(appendOwn(database, noteEvent(phone.newId(), 'case'))).rejects.toThrow();
    const next = await appendOwn(database, noteEvent(phone.newId(), 'case'));
    expect(next.sequence).toBe(2);
    expect(await allOwn(database)).toHaveLength(2);
  });

  it('keeps an event once, although it is tried again after it got through', async () => {
    const { phone, database } = opened();
    const event = noteEvent(phone.newId(), 'case');
    const first = await appendOwn(database, event);
    expect(await appendOwn(database, event)).toEqual(first);
    expect(await allOwn(database)).toHaveLength(1);
  });

  it('asks for strict durability', async () => {
    const { phone, database } = opened();
    const durabilities: string[] = [];
    database.own.hook('creating', (_key, _own, transaction) => {
      durabilities.push((transaction.idbtrans as IDBTransaction).durability);
    });
    await appendOwn(database, noteEvent(phone.newId(), 'case'));
    expect(durabilities).toEqual(['strict']);
  });

  it('keeps one device id', async () => {
    const { phone, database } = opened();
    const id = await deviceId(database, phone.newId);
    expect(await deviceId(phone.open('somebody'), phone.newId)).toBe(id);
  });
});

describe('results of the server', () => {
  async function three() {
    const { phone, database } = opened();
    const events = [];
    for (const name of ['case', 'case', 'other']) {
      events.push(await appendOwn(database, noteEvent(phone.newId(), name)));
    }
    return {
      database,
      events: events as [(typeof events)[0], (typeof events)[0], (typeof events)[0]],
    };
  }

  it('moves what was accepted into the log, sets aside what was refused, keeps the rest', async () => {
    const { database, events } = await three();
    const changed = await takeResults(database, events, [
      { id: events[0].id, outcome: 'accepted', stored: asStored(events[0], 41) },
      { id: events[2].id, outcome: 'rejected', code: 'case-closed', details: { status: 'closed' } },
    ]);
    expect(changed).toEqual(['case', 'other']);
    expect((await waitingEvents(database)).map(({ sequence }) => sequence)).toEqual([2]);
    expect(await database.log.toArray()).toEqual([asStored(events[0], 41)]);
    const [refused] = await database.own.where('kept').equals('refused').toArray();
    expect(refused).toMatchObject({
      sequence: 3,
      code: 'case-closed',
      details: { status: 'closed' },
      event: events[2],
    });
  });

  it('keeps everything when the server answers for none of them', async () => {
    const { database, events } = await three();
    expect(await takeResults(database, events, [])).toEqual([]);
    expect(await waitingEvents(database)).toHaveLength(3);
  });
});

describe("the server's feed", () => {
  it('takes own events out of the queue, and leaves those of others with the same number', async () => {
    const { phone, database } = opened();
    const device = await deviceId(database, phone.newId);
    const mine = await appendOwn(database, { ...noteEvent(phone.newId(), 'case'), device });
    await appendOwn(database, { ...noteEvent(phone.newId(), 'case'), device });
    const theirs = asStored({ ...noteEvent(phone.newId(), 'case'), sequence: 2 }, 8);
    await takeStored(database, [asStored(mine, 7), theirs], 8);
    expect((await waitingEvents(database)).map(({ sequence }) => sequence)).toEqual([2]);
    expect(await database.value('position')).toBe(8);
  });

  it('leaves the cursor where it is when the events come from elsewhere', async () => {
    const { database } = opened();
    await takeStored(database, [], 5);
    await takeStored(database, [asStored({ ...noteEvent('a', 'case'), sequence: 1 }, 9)]);
    expect(await database.value('position')).toBe(5);
  });
});
