import { InjectionToken } from '@angular/core';
import type { Session } from '@shared/contract';
import Dexie, { type EntityTable } from 'dexie';

interface LastSession {
  readonly key: 'last';
  readonly session: Session;
  /** Signed out with events unsent: kept, and opened again only by the same person. */
  readonly locked: boolean;
}

/** What belongs to the phone and not to one person: who used it last. No token is ever in it. */
export class PhoneDatabase extends Dexie {
  private readonly sessions!: EntityTable<LastSession, 'key'>;

  constructor(options: { indexedDB?: IDBFactory; IDBKeyRange?: typeof IDBKeyRange } = {}) {
    super('lampline-phone', { ...options, chromeTransactionDurability: 'strict' });
    this.version(1).stores({ sessions: 'key' });
  }

  async last(): Promise<Session | undefined> {
    const kept = await this.sessions.get('last');
    return kept && !kept.locked ? kept.session : undefined;
  }

  async keep(session: Session): Promise<void> {
    await this.sessions.put({ key: 'last', session, locked: false });
  }

  /** After signing out: the phone no longer opens for this person without a sign-in. */
  async lock(): Promise<void> {
    await this.sessions.update('last', { locked: true });
  }
}

export const PHONE_DATABASE = new InjectionToken<PhoneDatabase>('phone database', {
  providedIn: 'root',
  factory: () => new PhoneDatabase(),
});
