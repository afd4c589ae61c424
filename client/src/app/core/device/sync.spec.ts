import { TestBed } from '@angular/core/testing';
import type { CaseEvent, StoredEvent } from '@shared/cases';
import { routes, type EventResult, type Session } from '@shared/contract';
import { Api, type CallOptions } from '../session/api';
import { ApiError } from '../session/api-error';
import { PHONE_DATABASE } from '../session/phone-database';
import { SessionStore } from '../session/session-store';
import { DeviceStore } from './device-store';
import { asStored, inMemoryPhone, opening, technician } from './in-memory-phone';
import { Sync } from './sync';
import { TAB_CHANNEL } from './tab-channel';

type Called = (typeof routes)[keyof typeof routes];

interface Batch {
  readonly device: string;
  readonly events: readonly CaseEvent[];
}

/** A server that accepts all, unless a spec says otherwise. */
class PlayedServer {
  readonly batches: Batch[] = [];
  position = 0;
  refuse?: ApiError;
  readonly calls: Called[] = [];
  feed: readonly StoredEvent[] = [];
  lastAfter?: unknown;
  result = (event: CaseEvent): EventResult => ({
    id: event.id,
    outcome: 'accepted',
    stored: asStored(event, (this.position += 1)),
  });

  async call(route: Called, options: CallOptions<Called> = {}): Promise<unknown> {
    this.calls.push(route);
    if (this.refuse) throw this.refuse;
    switch (route) {
      case routes.sendEvents: {
        const batch = options.body as unknown as Batch;
        this.batches.push(batch);
        return { results: batch.events.map((event) => this.result(event)) };
      }
      case routes.pack:
        return {
          sites: [],
          lifts: [],
          circuits: [],
          events: [],
          names: {},
          position: 0,
          build: 'b',
          oldestClient: 1,
        };
      case routes.feed:
        this.lastAfter = (options.query as { readonly after?: number } | undefined)?.after;
        return {
          events: this.feed,
          position: this.feed.at(-1)?.position ?? this.position,
          more: false,
        };
      default:
        throw new Error(`not played: ${route.path}`);
    }
  }
}

async function phoneWithServer(session: Session = technician) {
  const phone = inMemoryPhone();
  const server = new PlayedServer();
  TestBed.configureTestingModule({
    providers: [
      ...phone.providers,
      { provide: TAB_CHANNEL, useValue: { post: () => undefined, listen: () => undefined } },
      {
        provide: PHONE_DATABASE,
        useValue: { last: async () => session, keep: async () => undefined },
      },
      { provide: Api, useValue: server },
    ],
  });
  await TestBed.inject(SessionStore).restore();
  const store = TestBed.inject(DeviceStore);
  await store.open(technician);
  return { phone, server, store, sync: TestBed.inject(Sync) };
}

describe('sending', () => {
  it('sends what is kept in the order of the phone, and keeps it as sent', async () => {
    const { server, store, sync } = await phoneWithServer();
    const { caseId } = await store.openCase(opening);
    await store.journal(caseId).append('note written', { text: 'first' });
    await store.journal(caseId).append('note written', { text: 'second' });
    await sync.syncNow();
    expect(server.batches[0]!.events.map(({ sequence }) => sequence)).toEqual([1, 2, 3]);
    expect(store.waiting()).toEqual([]);
    expect(
      store
        .journal(caseId)
        .entries()
        .map(({ kept }) => kept),
    ).toEqual(Array.from({ length: 3 }, () => 'sent'));
    expect(sync.status()).toEqual({ kind: 'idle' });
  });

  it('takes a duplicate for delivered', async () => {
    const { server, store, sync } = await phoneWithServer();
    const accepted = server.result;
    server.result = (event) => ({ ...accepted(event), outcome: 'duplicate' });
    await store.openCase(opening);
    await sync.syncNow();
    expect(store.waiting()).toEqual([]);
  });

  it('sets a refused event aside with reason and data, and sends those of other cases', async () => {
    const { server, store, sync } = await phoneWithServer();
    const bad = await store.openCase(opening);
    const good = await store.openCase(opening);
    const accepted = server.result;
    server.result = (event) =>
      event.caseId === bad.caseId
        ? { id: event.id, outcome: 'rejected', code: 'sync.unknown-lift' }
        : accepted(event);
    await sync.syncNow();
    expect(store.waiting()).toEqual([]);
    expect(sync.quarantine()).toMatchObject([
      { caseId: bad.caseId, code: 'sync.unknown-lift', event: { payload: opening } },
    ]);
    expect(store.journal(good.caseId).entries()[0]?.kept).toBe('sent');
    expect(store.journal(bad.caseId).entries()[0]).toMatchObject({
      kept: 'refused',
      code: 'sync.unknown-lift',
    });
  });

  it('sends *retry* again in a later round, not at once', async () => {
    const { server, store, sync } = await phoneWithServer();
    await store.openCase(opening);
    const accepted = server.result;
    server.result = ({ id }) => ({ id, outcome: 'retry' });
    await sync.syncNow();
    expect(server.batches).toHaveLength(1);
    expect(store.waiting()).toHaveLength(1);
    server.result = accepted;
    await sync.syncNow();
    expect(store.waiting()).toEqual([]);
  });

  it.each([0, 400, 401, 403, 409, 413, 429, 500, 503])(
    'never takes status %i for delivered',
    async (status) => {
      const { server, store, sync } = await phoneWithServer();
      await store.openCase(opening);
      server.refuse = new ApiError(status, 'any', '');
      await sync.syncNow();
      expect(store.waiting()).toHaveLength(1);
      expect(sync.status().kind).toBe('waiting');
      server.refuse = undefined;
      await sync.syncNow();
      expect(store.waiting()).toEqual([]);
    },
  );

  it('asks for nothing while the server wants quiet', async () => {
    const { phone, server, store, sync } = await phoneWithServer();
    await store.openCase(opening);
    server.refuse = new ApiError(429, 'busy', '', [], {}, 120);
    await sync.syncNow();
    server.refuse = undefined;
    phone.now += 119_000;
    await sync.syncNow();
    expect(server.batches).toEqual([]);
    phone.now += 2_000;
    await sync.syncNow();
    expect(store.waiting()).toEqual([]);
  });

  it('sends half after a batch was too large', async () => {
    const { server, store, sync } = await phoneWithServer();
    const { caseId } = await store.openCase(opening);
    for (const text of ['a', 'b', 'c'])
      await store.journal(caseId).append('note written', { text });
    server.refuse = new ApiError(413, 'body_too_large', '');
    await sync.syncNow();
    server.refuse = undefined;
    await sync.syncNow();
    expect(server.batches.map(({ events }) => events.length)).toEqual([2, 2]);
  });

  it("never sends one person's queue with another person's cookies", async () => {
    const other = { ...technician, person: { ...technician.person, id: opening.liftId } };
    const { server, store, sync } = await phoneWithServer(other);
    await store.openCase(opening);
    await sync.syncNow();
    expect(server.batches).toEqual([]);
    expect(store.waiting()).toHaveLength(1);
  });
});

describe('the feed', () => {
  it('brings the cases of others, and fetches the pack again for a name that is not on file', async () => {
    const { server, store, sync } = await phoneWithServer();
    await sync.syncNow();
    const packs = () => server.calls.filter((route) => route === routes.pack).length;
    expect(packs()).toBe(1);
    server.feed = [
      {
        ...asStored(
          {
            id: opening.liftId,
            caseId: opening.circuitId,
            device: opening.liftId,
            sequence: 1,
            schema: 1,
            type: 'case opened',
            payload: opening,
            recordedAt: '2026-11-12T08:00:00.000Z',
            state: {},
          },
          7,
        ),
        actor: opening.liftId,
      },
    ];
    await sync.syncNow();
    expect(store.cases().map(({ id }) => id)).toEqual([opening.circuitId]);
    expect(packs()).toBe(1);
    server.feed = [];
    await sync.syncNow();
    expect(packs()).toBe(2);
    expect(server.lastAfter).toBe(7);
  });
});
