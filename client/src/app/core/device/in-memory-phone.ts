import type { Provider } from '@angular/core';
import type { CaseEvent, StoredEvent } from '@shared/cases';
import type { Session } from '@shared/contract';
import { IDBFactory, IDBKeyRange } from 'fake-indexeddb';
import { CLOCK } from './clock';
import { DeviceDatabase, OPEN_DATABASE, databaseName } from './device-database';
import { NEW_ID } from './ids';
import { CHANCE, SEND_LOCK } from './send-lock';

/** For specs: a phone whose store is in memory, and whose time, ids and chance are the spec's. */
export const START = Date.parse('2026-11-12T09:00:00Z');
export const LIFT = '0190a000-0000-7000-8000-000000000001';
export const CIRCUIT = '0190a000-0000-7000-8000-000000000002';
const PERSON = '0190a000-0000-7000-8000-000000000003';

export const technician: Session = {
  person: { id: PERSON, name: 'Mara Lindqvist', role: 'technician' },
  organisation: {
    id: '0190a000-0000-7000-8000-000000000004',
    name: 'Northgate Lifts',
    timeZone: 'Europe/Dublin',
  },
  until: new Date(START + 600_000).toISOString(),
};

export const opening = {
  liftId: LIFT,
  circuitId: CIRCUIT,
  circuitRevision: 1,
  complaint: 'Does not move',
  practice: false,
};

export interface InMemoryPhone {
  now: number;
  /** So many of the next events can't be written. */
  failingWrites: number;
  /** The browser lets nothing be stored, as some private windows do. */
  blocked: boolean;
  readonly open: (personId: string) => DeviceDatabase;
  readonly newId: () => string;
  readonly providers: Provider[];
}

const blockedFactory = {
  open: () => {
    throw new DOMException('blocked', 'InvalidStateError');
  },
} as unknown as IDBFactory;

export function inMemoryPhone(): InMemoryPhone {
  const indexedDB = new IDBFactory();
  let ids = 0;
  const phone: InMemoryPhone = {
    now: START,
    failingWrites: 0,
    blocked: false,
    open: (personId) => {
      const database = new DeviceDatabase(databaseName(personId), {
        indexedDB: phone.blocked ? blockedFactory : indexedDB,
        IDBKeyRange,
      });
      database.own.hook('creating', () => {
        if (phone.failingWrites === 0) return;
        phone.failingWrites -= 1;
        throw new Error('the disk is full');
      });
      return database;
    },
    newId: () => `0190b000-0000-7000-8000-${String((ids += 1)).padStart(12, '0')}`,
    get providers(): Provider[] {
      return [
        { provide: CLOCK, useValue: { now: () => phone.now } },
        { provide: NEW_ID, useValue: phone.newId },
        { provide: OPEN_DATABASE, useValue: phone.open },
        { provide: SEND_LOCK, useValue: (work: () => Promise<void>) => work() },
        { provide: CHANCE, useValue: () => 0 },
      ];
    },
  };
  return phone;
}

/** The event as the server's log would hold it. */
export const asStored = (
  event: CaseEvent,
  position: number,
  caseVersion = position,
): StoredEvent => ({
  ...event,
  actor: PERSON,
  receivedAt: new Date(START).toISOString(),
  clockOffsetSeconds: 0,
  caseVersion,
  position,
});

/** An event that no reducer needs to read. */
export const noteEvent = (id: string, caseId: string): Omit<CaseEvent, 'sequence'> => ({
  id,
  caseId,
  device: '0190a000-0000-7000-8000-000000000009',
  schema: 1,
  type: 'note written',
  payload: { text: 'Keeper moved 4 mm' },
  recordedAt: new Date(START).toISOString(),
  state: {},
});
