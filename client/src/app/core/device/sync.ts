import { Injectable, computed, inject, signal } from '@angular/core';
import { routes } from '@shared/contract';
import { EMPTY, Subject, defer, exhaustMap, fromEvent, merge, switchMap, timer } from 'rxjs';
import { Api } from '../session/api';
import { ApiError } from '../session/api-error';
import { SessionStore } from '../session/session-store';
import { CLOCK } from './clock';
import { DeviceStore } from './device-store';
import { takeResults, takeStored, waitingEvents } from './outbox-database';
import { nextBatch } from './outbox-order';
import { waitAfter, type SendFailure } from './outbox-policy';
import { CHANCE, SEND_LOCK } from './send-lock';

/** Look for others' events this often while a screen is open, milliseconds. */
const FEED_EVERY = 30_000;
/** The pack (lifts, circuits) is fetched again after so long, milliseconds. */
const PACK_AGE = 10 * 60_000;
/** Events asked for at once. */
const FEED_LIMIT = 200;

export type SyncState =
  | { readonly kind: 'idle' }
  | { readonly kind: 'working' }
  | { readonly kind: 'waiting'; readonly why: SendFailure };

/** Sends the queue, pulls the feed, refreshes the pack. Every tab may append; the holder of a lock sends. */
@Injectable({ providedIn: 'root' })
export class Sync {
  private readonly api = inject(Api);
  private readonly store = inject(DeviceStore);
  private readonly sessions = inject(SessionStore);
  private readonly clock = inject(CLOCK);
  private readonly chance = inject(CHANCE);
  private readonly lock = inject(SEND_LOCK);

  private readonly state = signal<SyncState>({ kind: 'idle' });
  private readonly contact = signal<number | undefined>(undefined);
  private readonly kicks = new Subject<number>();
  private failures = 0;

  readonly status = this.state.asReadonly();
  readonly waiting = computed(() => this.store.waiting().length);
  /** When the server last answered, milliseconds since 1970. */
  readonly lastContact = this.contact.asReadonly();

  constructor() {
    merge(
      this.store.appended.pipe(switchMap(() => timer(50))),
      fromEvent(window, 'online'),
      fromEvent(document, 'visibilitychange'),
      timer(FEED_EVERY, FEED_EVERY),
      this.kicks.pipe(switchMap((wait) => timer(wait))),
    )
      .pipe(exhaustMap(() => (this.store.sending() ? defer(() => this.syncNow()) : EMPTY)))
      .subscribe();
  }

  /** One round under the lock. Never throws; a failure is in {@link status} and is tried again later. */
  async syncNow(): Promise<void> {
    await this.lock(async () => {
      this.state.set({ kind: 'working' });
      try {
        if (!(await this.sessions.fresh(this.clock.now())) && this.sessions.signInToSend()) {
          throw new ApiError(401, 'not_signed_in', '');
        }
        await this.refreshPack();
        await this.sendAll();
        await this.pullFeed();
        this.failures = 0;
        this.contact.set(this.clock.now());
        this.state.set({ kind: 'idle' });
      } catch (error) {
        this.failed(error);
      }
    });
  }

  private failed(error: unknown): void {
    const why: SendFailure =
      error instanceof ApiError && error.status === 401
        ? { kind: 'signed out' }
        : error instanceof ApiError && error.status !== 0
          ? {
              kind: 'answered',
              status: error.status,
              retryAfterSeconds: error.retryAfterSeconds,
            }
          : { kind: 'unreachable' };
    this.failures += 1;
    this.state.set({ kind: 'waiting', why });
    const wait = waitAfter(why, this.failures, this.chance());
    if (wait !== undefined) this.kicks.next(wait);
  }

  private async sendAll(): Promise<void> {
    const sending = this.store.sending();
    if (!sending) return;
    const { database, device } = sending;
    for (;;) {
      const batch = nextBatch(await waitingEvents(database));
      if (batch.length === 0) return;
      const { results } = await this.api.call(routes.sendEvents, {
        body: { device, events: [...batch] },
      });
      const changed = await takeResults(database, batch, results);
      await this.store.reload(changed);
      // Events that must be tried again would be the same batch at once: they wait for the next round.
      if (changed.length === 0) throw new ApiError(503, 'retry', '');
    }
  }

  private async pullFeed(): Promise<void> {
    const sending = this.store.sending();
    if (!sending) return;
    const { database } = sending;
    for (;;) {
      const after = (await database.value<number>('position')) ?? 0;
      const { events, position, more } = await this.api.call(routes.feed, {
        query: { after, limit: FEED_LIMIT },
      });
      if (events.length > 0) {
        await this.store.reload(await takeStored(database, events, position));
      }
      if (!more) return;
    }
  }

  /** Fetches the pack where there is none, or where it is old. */
  async refreshPack(force = false): Promise<void> {
    const sending = this.store.sending();
    const kept = this.store.packOf();
    const age = kept ? this.clock.now() - Date.parse(kept.fetchedAt) : Infinity;
    if (!sending || (!force && age < PACK_AGE)) return;
    const { events, position, ...pack } = await this.api.call(routes.pack);
    const { database } = sending;
    const known = await database.value<number>('position');
    // The pack holds only some cases: a cursor that exists already must not jump over what it left out.
    const changed = await takeStored(database, events, known === undefined ? position : undefined);
    await this.store.keepPack({ ...pack, fetchedAt: new Date(this.clock.now()).toISOString() });
    await this.store.reload(changed);
  }
}
