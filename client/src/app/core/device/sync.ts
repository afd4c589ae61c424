import { Injectable, computed, inject, signal } from '@angular/core';
import { MOST_EVENTS_IN_BATCH, routes } from '@shared/contract';
import { Subject, exhaustMap, filter, fromEvent, merge, switchMap, timer } from 'rxjs';
import { Api } from '../session/api';
import { ApiError } from '../session/api-error';
import { SessionStore } from '../session/session-store';
import { CLOCK } from './clock';
import { DeviceStore } from './device-store';
import { takeResults, takeStored, waitingEvents } from './outbox-database';
import { nextBatch } from './outbox-order';
import { believed, failureOf, waitAfter, type SendFailure } from './outbox-policy';
import { CHANCE, SEND_LOCK } from './send-lock';

/** Look for others' events this often while a screen is open, milliseconds. */
const FEED_EVERY = 30_000;
/** The pack (lifts, circuits) is fetched again after so long, milliseconds. */
const PACK_AGE = 10 * 60_000;
/** Events asked for at once. */
const FEED_LIMIT = 200;
/** Readings that follow each other closely go in one batch, milliseconds. */
const SETTLE = 50;

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
  private readonly retries = new Subject<number>();
  private failures = 0;
  private most = MOST_EVENTS_IN_BATCH;
  /** The server asked for quiet until then, milliseconds since 1970. */
  private quietUntil = 0;
  private running?: Promise<void>;
  /** Someone asked for the pack, or the feed named a person whom it does not: it is fetched again. */
  private packWanted = false;

  readonly status = this.state.asReadonly();
  readonly waiting = computed(() => this.store.waiting().length);
  /** Events that the server refused, with reason and data. */
  readonly quarantine = this.store.refused;
  readonly lastContact = this.store.lastContact;

  constructor() {
    merge(
      this.store.appended.pipe(switchMap(() => timer(SETTLE))),
      fromEvent(window, 'online'),
      fromEvent(document, 'visibilitychange').pipe(filter(() => !document.hidden)),
      timer(FEED_EVERY, FEED_EVERY),
      this.retries.pipe(switchMap((wait) => timer(wait))),
    )
      .pipe(exhaustMap(() => this.syncNow()))
      .subscribe();
  }

  /** One round under the lock. Never throws; a failure is in {@link status} and is tried again later. */
  syncNow(): Promise<void> {
    this.running ??= this.lock(() => this.round()).finally(() => (this.running = undefined));
    return this.running;
  }

  /** One round that fetches the pack whatever its age. */
  refreshNow(): Promise<void> {
    this.packWanted = true;
    return this.syncNow();
  }

  private async round(): Promise<void> {
    if (!this.store.sending() || this.clock.now() < this.quietUntil) return;
    this.state.set({ kind: 'working' });
    try {
      const fresh = await this.sessions.fresh(this.clock.now());
      if (!fresh && this.sessions.signInToSend()) throw new ApiError(401, 'not_signed_in', '');
      await this.sendAll();
      await this.refreshPack();
      await this.pullFeed();
      this.failures = 0;
      await this.store.keepContact(this.clock.now());
      this.state.set({ kind: 'idle' });
      // What was kept while this round ran has not woken another one.
      if (this.waiting() > 0) this.retries.next(SETTLE);
    } catch (error) {
      this.failed(failureOf(error));
    }
  }

  private failed(why: SendFailure): void {
    this.failures += 1;
    this.state.set({ kind: 'waiting', why });
    this.quietUntil = this.clock.now() + believed(why);
    const wait = waitAfter(why, this.failures, this.chance());
    if (wait !== undefined) this.retries.next(wait);
  }

  /** The open store, if it is of the person whose cookies the browser sends. */
  private ofPerson(): ReturnType<DeviceStore['sending']> {
    const sending = this.store.sending();
    return sending?.personId === this.sessions.session()?.person.id ? sending : undefined;
  }

  private async sendAll(): Promise<void> {
    for (;;) {
      const sending = this.ofPerson();
      if (!sending) return;
      const { database, device } = sending;
      const batch = nextBatch(await waitingEvents(database), this.most);
      if (batch.length === 0) return;
      const { results } = await this.sent(device, batch);
      const changed = await takeResults(database, batch, results);
      await this.store.changed(changed);
      // Events that must be tried again would be the same batch at once: they wait for the next round.
      if (changed.length === 0) throw new ApiError(503, 'retry', '');
    }
  }

  private async sent(device: string, batch: ReturnType<typeof nextBatch>) {
    try {
      return await this.api.call(routes.sendEvents, { body: { device, events: [...batch] } });
    } catch (error) {
      // Too large for something on the way: the next try takes half.
      if (failureOf(error).kind === 'too large') this.most = Math.max(1, batch.length >> 1);
      throw error;
    }
  }

  private async pullFeed(): Promise<void> {
    for (;;) {
      const sending = this.ofPerson();
      if (!sending) return;
      const { database } = sending;
      const after = (await database.value<number>('position')) ?? 0;
      const { events, position, more } = await this.api.call(routes.feed, {
        query: { after, limit: FEED_LIMIT },
      });
      if (events.length > 0) {
        this.packWanted ||= events.some(({ actor }) => !this.store.knows(actor));
        await this.store.changed(await takeStored(database, events, position));
      }
      if (!more) return;
    }
  }

  /** Fetches the pack where there is none, or where it is old or wanted. */
  private async refreshPack(): Promise<void> {
    const sending = this.ofPerson();
    const kept = this.store.packOf();
    const age = kept ? this.clock.now() - Date.parse(kept.fetchedAt) : Infinity;
    if (!sending || (age < PACK_AGE && !this.packWanted)) return;
    const { events, position, ...pack } = await this.api.call(routes.pack);
    this.packWanted = false;
    const { database } = sending;
    const known = await database.value<number>('position');
    // The pack holds only some cases: a cursor that exists already must not jump over what it left out.
    const changed = await takeStored(database, events, known === undefined ? position : undefined);
    await this.store.keepPack({ ...pack, fetchedAt: new Date(this.clock.now()).toISOString() });
    await this.store.changed(changed);
  }
}
