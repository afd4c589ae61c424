import { InjectionToken } from '@angular/core';
import type { CaseEvent, StoredEvent } from '@shared/cases';
import Dexie, { type EntityTable, type Table } from 'dexie';
import type { Kept } from './case-journal';

/** An event that this device made and that is not in {@link DeviceDatabase.log} yet. */
export interface OwnEvent {
  /** The device's sequence; the key. */
  readonly sequence: number;
  readonly caseId: string;
  readonly kept: Kept;
  readonly event: CaseEvent;
  /** Why the server refused it. */
  readonly code?: string;
  readonly details?: Readonly<Record<string, unknown>>;
}

/** One named value: pieces of the pack, the device's id, the feed's position. */
export interface NamedValue {
  readonly name: string;
  readonly value: unknown;
}

/** Everything that one person keeps on this phone. One database a person; upgrades only add. */
export class DeviceDatabase extends Dexie {
  readonly values!: Table<NamedValue, string>;
  readonly own!: EntityTable<OwnEvent, 'sequence'>;
  readonly log!: EntityTable<StoredEvent, 'position'>;

  constructor(
    name: string,
    options: { indexedDB?: IDBFactory; IDBKeyRange?: typeof IDBKeyRange } = {},
  ) {
    // Strict: a transaction completes only when it is on the disk; *kept here* waits for that.
    super(name, { ...options, chromeTransactionDurability: 'strict' });
    this.version(1).stores({
      values: 'name',
      own: 'sequence, caseId, kept, event.id',
      log: 'position, caseId, id',
    });
  }

  async value<T>(name: string): Promise<T | undefined> {
    return (await this.values.get(name))?.value as T | undefined;
  }

  /** Writes, reads and deletes: whether this window can keep anything. */
  async works(): Promise<boolean> {
    const name = 'self-test';
    try {
      await this.values.put({ name, value: 1 });
      const read = await this.value<number>(name);
      await this.values.delete(name);
      return read === 1;
    } catch {
      return false;
    }
  }
}

export const databaseName = (personId: string): string => `lampline-${personId}`;

/** Opens the database of a person; specs put an in-memory one here. */
export type OpenDatabase = (personId: string) => DeviceDatabase;
export const OPEN_DATABASE = new InjectionToken<OpenDatabase>('open database', {
  providedIn: 'root',
  factory: () => (personId) => new DeviceDatabase(databaseName(personId)),
});
