import { TestBed } from '@angular/core/testing';
import { DeviceStore } from './device-store';
import {
  CIRCUIT,
  LIFT,
  asStored,
  inMemoryPhone,
  opening,
  technician,
  type InMemoryPhone,
} from './in-memory-phone';
import { takeStored } from './outbox-database';
import { TAB_CHANNEL, type TabChannel } from './tab-channel';

/** Tabs that hear each other as soon as one speaks. */
function channelOf(tabs: ((caseIds: readonly string[]) => void)[]): TabChannel {
  let own: ((caseIds: readonly string[]) => void) | undefined;
  return {
    post: (caseIds) => tabs.filter((heard) => heard !== own).forEach((heard) => heard(caseIds)),
    listen: (heard) => {
      own = heard;
      tabs.push(heard);
    },
  };
}

async function openTab(
  phone: InMemoryPhone,
  tabs: ((caseIds: readonly string[]) => void)[] = [],
  session = technician,
): Promise<DeviceStore> {
  TestBed.resetTestingModule();
  TestBed.configureTestingModule({
    providers: [...phone.providers, { provide: TAB_CHANNEL, useValue: channelOf(tabs) }],
  });
  const store = TestBed.inject(DeviceStore);
  await store.open(session);
  return store;
}

describe('a case on this phone', () => {
  it('is there after opening it, and after the window is opened again', async () => {
    const phone = inMemoryPhone();
    const store = await openTab(phone);
    const { kind, caseId } = await store.openCase(opening, { gate: 'shut' });
    expect(kind).toBe('kept here');
    expect(store.journal(caseId).state()).toMatchObject({
      liftId: LIFT,
      circuitId: CIRCUIT,
      status: 'open',
      openedBy: technician.person.id,
      state: { gate: 'shut' },
    });

    const again = await openTab(phone);
    expect(again.journal(caseId).state()).toEqual(store.journal(caseId).state());
    expect(again.waiting()).toHaveLength(1);
  });

  it('shows each entry with how it got on', async () => {
    const phone = inMemoryPhone();
    const store = await openTab(phone);
    const { caseId } = await store.openCase(opening);
    const journal = store.journal(caseId);
    await journal.append('note written', { text: 'Car at 3' });
    const [opened] = store.waiting();
    await takeStored(store.sending()!.database, [asStored(opened!.event, 1)], 1);
    await store.changed([caseId]);
    expect(journal.entries().map(({ type, kept }) => [type, kept])).toEqual([
      ['case opened', 'sent'],
      ['note written', 'kept here'],
    ]);
    expect(journal.state()?.notes).toHaveLength(1);
  });

  it('marks what came late from another phone', async () => {
    const phone = inMemoryPhone();
    const store = await openTab(phone);
    const { caseId } = await store.openCase(opening);
    const { event } = store.waiting()[0]!;
    const note = { ...event, type: 'note written', payload: { text: 'x' }, device: LIFT };
    await takeStored(store.sending()!.database, [
      asStored(event, 1),
      asStored({ ...note, id: CIRCUIT, recordedAt: '2026-11-12T08:00:00.000Z' }, 2),
    ]);
    await store.changed([caseId]);
    expect(
      store
        .journal(caseId)
        .entries()
        .map(({ late }) => late),
    ).toEqual([false, true]);
  });

  it('refuses what the rules of a case refuse, and keeps nothing of it', async () => {
    const store = await openTab(inMemoryPhone());
    const result = await store.journal(LIFT).append('note written', { text: 'x' });
    expect(result).toEqual({ kind: 'refused', refusal: { code: 'case-unknown', details: {} } });
    expect(store.waiting()).toEqual([]);
  });

  it('checks each event against the case that the one before left', async () => {
    const store = await openTab(inMemoryPhone());
    const { caseId } = await store.openCase(opening);
    const journal = store.journal(caseId);
    const link = { link: LIFT, mark: 'red 1', from: 'T1', to: 'T2', reason: 'x', found: false };
    const results = await Promise.all([
      journal.append('link fitted', link),
      journal.append('link fitted', link),
    ]);
    expect(results.map(({ kind }) => kind)).toEqual(['kept here', 'refused']);
  });
});

describe('a store that fails', () => {
  it('is opened again once without a word', async () => {
    const phone = inMemoryPhone();
    const store = await openTab(phone);
    phone.failingWrites = 1;
    expect((await store.openCase(opening)).kind).toBe('kept here');
    expect(store.waiting().map(({ sequence }) => sequence)).toEqual([1]);
  });

  it('says that nothing was kept, and shows nothing as kept', async () => {
    const phone = inMemoryPhone();
    const store = await openTab(phone);
    phone.failingWrites = 2;
    expect(await store.openCase(opening)).toMatchObject({ kind: 'failed' });
    expect(store.waiting()).toEqual([]);
    expect(store.cases()).toEqual([]);
    expect((await store.openCase(opening)).kind).toBe('kept here');
  });

  it('is called unusable when it cannot be written at all', async () => {
    const phone = inMemoryPhone();
    phone.blocked = true;
    const store = await openTab(phone);
    expect(store.status()).toBe('unusable');
    expect((await store.openCase(opening)).kind).toBe('failed');
  });
});

describe('several tabs and persons', () => {
  it('shows in every tab what one of them kept, with one sequence', async () => {
    const phone = inMemoryPhone();
    const tabs: ((caseIds: readonly string[]) => void)[] = [];
    const first = await openTab(phone, tabs);
    const second = await openTab(phone, tabs);
    const { caseId } = await first.openCase(opening);
    await vi.waitFor(() => expect(second.journal(caseId).state()).toBeDefined());
    await second.journal(caseId).append('note written', { text: 'from the other tab' });
    await vi.waitFor(() => expect(first.journal(caseId).state()?.notes).toHaveLength(1));
    expect(first.waiting().map(({ sequence }) => sequence)).toEqual([1, 2]);
    expect(second.waiting().map(({ sequence }) => sequence)).toEqual([1, 2]);
  });

  it("keeps each person's cases to that person", async () => {
    const phone = inMemoryPhone();
    const store = await openTab(phone);
    const { caseId } = await store.openCase(opening);
    const other = { ...technician, person: { ...technician.person, id: LIFT, name: 'Ola' } };
    await store.open(other);
    expect(store.journal(caseId).state()).toBeUndefined();
    expect(store.waiting()).toEqual([]);
    await store.open(technician);
    expect(store.journal(caseId).state()).toBeDefined();
  });
});

describe('the pack', () => {
  const pack = {
    sites: [],
    lifts: [],
    names: {},
    build: 'b',
    oldestClient: 1,
    fetchedAt: '2026-11-12T09:00:00Z',
    circuits: [
      {
        circuitId: CIRCUIT,
        revision: 1,
        issuedAt: '2026-11-01T09:00:00Z',
        circuit: { name: 'invented' } as never,
      },
    ],
  };

  it('gives the same circuit object after it was fetched again', async () => {
    const store = await openTab(inMemoryPhone());
    await store.keepPack(pack);
    const before = store.circuit(CIRCUIT, 1);
    await store.keepPack(structuredClone({ ...pack, fetchedAt: '2026-11-12T10:00:00Z' }));
    expect(before).toBeDefined();
    expect(store.circuit(CIRCUIT, 1)).toBe(before);
    expect(store.packOf()?.fetchedAt).toBe('2026-11-12T10:00:00Z');
  });

  it('says when the server takes only newer clients', async () => {
    const store = await openTab(inMemoryPhone());
    await store.keepPack(pack);
    expect(store.tooOld()).toBe(false);
    await store.keepPack({ ...pack, oldestClient: 1_000_000 });
    expect(store.tooOld()).toBe(true);
  });
});
