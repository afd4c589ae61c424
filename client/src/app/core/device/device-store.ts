import { Injectable, computed, inject, signal, type Signal } from '@angular/core';
import {
  EVENT_SCHEMA,
  refusalOf,
  type CaseEvent,
  type CaseState,
  type EventType,
  type PayloadOf,
  type StoredEvent,
} from '@shared/cases';
import type { Circuit, LiftState } from '@shared/circuit';
import type { Lift, Session, Site } from '@shared/contract';
import { Subject } from 'rxjs';
import type { AppendResult, CaseJournal } from './case-journal';
import { caseRecord, withOwn, type CaseRecord } from './case-record';
import { CLIENT_BUILD } from './client-build';
import { CLOCK } from './clock';
import { OPEN_DATABASE, type DeviceDatabase, type OwnEvent } from './device-database';
import { NEW_ID } from './ids';
import { circuitKey, circuitsOf, withSameCircuits, type KeptPack } from './kept-pack';
import { allOwn, appendOwn, deviceId } from './outbox-database';
import { TAB_CHANNEL } from './tab-channel';

export type StoreStatus = 'closed' | 'opening' | 'ready' | 'unusable';

/** What this phone holds for the person who is signed in, and the way to add to it. */
@Injectable({ providedIn: 'root' })
export class DeviceStore {
  private readonly openDatabase = inject(OPEN_DATABASE);
  private readonly clock = inject(CLOCK);
  private readonly newId = inject(NEW_ID);

  private readonly pack = signal<KeptPack | undefined>(undefined);
  private readonly records = signal<ReadonlyMap<string, CaseRecord>>(new Map());
  private readonly ownEvents = signal<readonly OwnEvent[]>([]);
  private readonly currentStatus = signal<StoreStatus>('closed');
  private readonly contact = signal<number | undefined>(undefined);
  private readonly circuits = computed(() => circuitsOf(this.pack()));
  private session?: Session;
  private device = '';
  private database?: DeviceDatabase;
  private opening?: Promise<void>;
  /** Appends and reads of the store run one after the other: a read never overlooks an append. */
  private queue: Promise<unknown> = Promise.resolve();
  private readonly otherTabs = inject(TAB_CHANNEL);

  /** An event was kept here; the sender wakes up. */
  readonly appended = new Subject<void>();
  readonly status = this.currentStatus.asReadonly();
  readonly sites: Signal<readonly Site[]> = computed(() => this.pack()?.sites ?? []);
  readonly lifts: Signal<readonly Lift[]> = computed(() => this.pack()?.lifts ?? []);
  /** Names of persons by id. */
  readonly names = computed(() => this.pack()?.names ?? {});
  readonly packOf = this.pack.asReadonly();
  /** When the server last answered all that was asked, milliseconds since 1970. */
  readonly lastContact = this.contact.asReadonly();
  readonly ready = computed(() => this.currentStatus() === 'ready');
  /** The server takes only newer builds of this client; what is kept here is still sent. */
  readonly tooOld = computed(() => (this.pack()?.oldestClient ?? 0) > CLIENT_BUILD);
  readonly cases: Signal<readonly CaseState[]> = computed(() =>
    [...this.records().values()]
      .flatMap(({ state }) => (state ? [state] : []))
      .sort((a, b) => b.openedAt.localeCompare(a.openedAt)),
  );
  /** Own events that the server has not got. */
  readonly waiting = computed(() => this.ownEvents().filter(({ kept }) => kept === 'kept here'));
  readonly refused = computed(() => this.ownEvents().filter(({ kept }) => kept === 'refused'));

  constructor() {
    this.otherTabs.listen((caseIds) => void this.reload(caseIds));
  }

  /** Opens the store of a person and reads what it holds. Never throws: see {@link status}. */
  open(session: Session): Promise<void> {
    if (this.session?.person.id === session.person.id && this.opening) {
      this.session = session;
      return this.opening;
    }
    this.close();
    this.session = session;
    this.opening = this.openNow(session);
    return this.opening;
  }

  private async openNow(session: Session): Promise<void> {
    this.currentStatus.set('opening');
    const database = this.openDatabase(session.person.id);
    this.database = database;
    let status: StoreStatus = 'unusable';
    try {
      if (await database.works()) {
        this.device = await deviceId(database, this.newId);
        this.contact.set(await database.value<number>(LAST_CONTACT));
        await this.reload();
        status = 'ready';
      }
    } catch {
      // This window can't keep anything: the frame says so.
    }
    if (this.database === database) this.currentStatus.set(status);
  }

  /** Forgets what is in memory; the database stays as it is. */
  close(): void {
    this.database?.close();
    this.database = undefined;
    this.session = undefined;
    this.opening = undefined;
    this.contact.set(undefined);
    this.pack.set(undefined);
    this.records.set(new Map());
    this.ownEvents.set([]);
    this.currentStatus.set('closed');
  }

  lift(id: string): Lift | undefined {
    return this.lifts().find((lift) => lift.id === id);
  }

  site(id: string): Site | undefined {
    return this.sites().find((site) => site.id === id);
  }

  /** The same object for the same revision for as long as the pack stays: engines are kept by it. */
  circuit(id: string | null, revision: number | null): Circuit | undefined {
    return this.circuits().get(circuitKey(id, revision));
  }

  /** Whether the pack has a name for this person. */
  knows(personId: string): boolean {
    return personId === this.session?.person.id || Object.hasOwn(this.names(), personId);
  }

  nameOf(personId: string | undefined): string {
    if (personId === undefined) return '';
    if (personId === this.session?.person.id) return this.session.person.name;
    return this.names()[personId] ?? $localize`someone no longer on file`;
  }

  /** For the sender; undefined while no store is open. */
  sending():
    | {
        readonly database: DeviceDatabase;
        readonly device: string;
        readonly personId: string;
      }
    | undefined {
    return this.database && this.session && this.currentStatus() === 'ready'
      ? { database: this.database, device: this.device, personId: this.session.person.id }
      : undefined;
  }

  journal(caseId: string): CaseJournal {
    const record = computed(() => this.records().get(caseId));
    return {
      caseId,
      state: computed(() => record()?.state),
      entries: computed(() => record()?.entries ?? []),
      append: (type, payload, state) => this.append(caseId, type, payload, state),
    };
  }

  /** Opens a case on a lift; the id is made here. */
  async openCase(
    payload: PayloadOf<'case opened'>,
    state: LiftState = {},
  ): Promise<AppendResult & { readonly caseId: string }> {
    const caseId = this.newId();
    return { ...(await this.append(caseId, 'case opened', payload, state)), caseId };
  }

  /** One after the other: each is checked against the case that the one before left. */
  private append<T extends EventType>(
    caseId: string,
    type: T,
    payload: PayloadOf<T>,
    state?: LiftState,
  ): Promise<AppendResult> {
    return this.inTurn(() => this.appendNow(caseId, type, payload, state));
  }

  private inTurn<T>(work: () => Promise<T>): Promise<T> {
    const result = this.queue.then(work);
    this.queue = result.catch(() => undefined);
    return result;
  }

  private async appendNow(
    caseId: string,
    type: EventType,
    payload: object,
    state?: LiftState,
  ): Promise<AppendResult> {
    const record = this.records().get(caseId);
    const unnumbered: Omit<CaseEvent, 'sequence'> = {
      id: this.newId(),
      caseId,
      device: this.device,
      schema: EVENT_SCHEMA,
      type,
      // As JSON carries it: what is kept equals what is sent.
      payload: JSON.parse(JSON.stringify(payload)) as Record<string, unknown>,
      recordedAt: new Date(this.clock.now()).toISOString(),
      state: state ?? record?.state?.state ?? {},
    };
    const role = this.session?.person.role ?? '';
    const refusal = refusalOf(record?.state, { ...unnumbered, sequence: 1 }, { role });
    if (refusal) return { kind: 'refused', refusal };
    try {
      const event = await this.kept(unnumbered);
      this.take({ sequence: event.sequence, caseId, kept: 'kept here', event });
      this.otherTabs.post([caseId]);
      this.appended.next();
      return { kind: 'kept here', id: event.id };
    } catch (error) {
      return { kind: 'failed', message: error instanceof Error ? error.message : String(error) };
    }
  }

  /** A connection that the browser closed is opened again once. */
  private async kept(event: Omit<CaseEvent, 'sequence'>): Promise<CaseEvent> {
    if (!this.database) throw new Error($localize`No store is open in this window.`);
    try {
      return await appendOwn(this.database, event);
    } catch {
      this.database.close();
      await this.database.open();
      return appendOwn(this.database, event);
    }
  }

  private take(own: OwnEvent): void {
    const actor = this.session?.person.id ?? '';
    const record = this.records().get(own.caseId) ?? {
      caseId: own.caseId,
      state: undefined,
      entries: [],
    };
    this.records.set(new Map(this.records()).set(own.caseId, withOwn(record, own, actor)));
    this.ownEvents.set([...this.ownEvents(), own]);
  }

  /** Keeps the pack's pieces; its events go through the log. */
  async keepPack(pack: KeptPack): Promise<void> {
    const kept = withSameCircuits(this.pack(), pack);
    await this.database?.values.put({ name: 'pack', value: kept });
    this.pack.set(kept);
  }

  /** The server answered all that was asked, at this time (milliseconds since 1970). */
  async keepContact(at: number): Promise<void> {
    this.contact.set(at);
    await this.database?.values.put({ name: LAST_CONTACT, value: at });
  }

  /** After this tab changed the queue or the log: reads the cases again and tells the other tabs. */
  async changed(caseIds: readonly string[]): Promise<void> {
    if (caseIds.length === 0) return;
    await this.reload(caseIds);
    this.otherTabs.post(caseIds);
  }

  /** Reads cases again after the log or the queue changed: those named, or all. */
  reload(caseIds?: readonly string[]): Promise<void> {
    return this.inTurn(() => this.reloadNow(caseIds));
  }

  private async reloadNow(caseIds?: readonly string[]): Promise<void> {
    const { database } = this;
    if (!database) return;
    const [own, stored, pack] = await Promise.all([
      allOwn(database),
      caseIds
        ? database.log
            .where('caseId')
            .anyOf([...caseIds])
            .toArray()
        : database.log.toArray(),
      database.value<KeptPack>('pack'),
    ]);
    // Another person's store was opened meanwhile: these are not theirs.
    if (database !== this.database) return;
    const touched = new Set(caseIds ?? [...own, ...stored].map(({ caseId }) => caseId));
    const records = new Map(caseIds ? this.records() : []);
    for (const caseId of touched) {
      const record = caseRecord(
        caseId,
        stored.filter((event) => event.caseId === caseId).sort(byCaseVersion),
        own.filter((event) => event.caseId === caseId),
        this.session?.person.id ?? '',
      );
      records.set(caseId, record);
    }
    this.ownEvents.set(own);
    this.records.set(records);
    if (pack && pack.fetchedAt !== this.pack()?.fetchedAt) {
      this.pack.set(withSameCircuits(this.pack(), pack));
    }
  }
}

/** Name of the value that holds when the server last answered all. */
const LAST_CONTACT = 'last contact';
const byCaseVersion = (a: StoredEvent, b: StoredEvent): number => a.caseVersion - b.caseVersion;
