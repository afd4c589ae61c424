import type { CaseEvent, StoredEvent } from '@shared/cases';
import type { EventResult } from '@shared/contract';
import type { DeviceDatabase, OwnEvent } from './device-database';
import { afterResult } from './outbox-order';

/** The one file of the outbox that knows IndexedDB. */
const NEXT_SEQUENCE = 'next sequence';
const DEVICE = 'device';

/** The device's id, made at the first use of this database. */
export function deviceId(database: DeviceDatabase, newId: () => string): Promise<string> {
  return database.transaction('rw', database.values, async () => {
    const kept = await database.value<string>(DEVICE);
    if (kept) return kept;
    const made = newId();
    await database.values.put({ name: DEVICE, value: made });
    return made;
  });
}

/**
 * Gives the event its sequence and keeps both in one strict transaction. Resolves after `complete`:
 * only then may a screen say *kept here*. Rejects when nothing was kept.
 */
export function appendOwn(
  database: DeviceDatabase,
  event: Omit<CaseEvent, 'sequence'>,
): Promise<CaseEvent> {
  return database.transaction('rw', database.values, database.own, async () => {
    // A second try after a broken connection: the first one may have got through.
    const before = await database.own.where('event.id').equals(event.id).first();
    if (before) return before.event;
    const sequence = (await database.value<number>(NEXT_SEQUENCE)) ?? 1;
    const numbered: CaseEvent = { ...event, sequence };
    await database.own.add({ sequence, caseId: event.caseId, kept: 'kept here', event: numbered });
    await database.values.put({ name: NEXT_SEQUENCE, value: sequence + 1 });
    return numbered;
  });
}

/** Own events that the server has not got, in order. */
export const waitingEvents = (database: DeviceDatabase): Promise<OwnEvent[]> =>
  database.own.where('kept').equals('kept here').sortBy('sequence');

/** Own events that are not in the log: waiting and refused. */
export const allOwn = (database: DeviceDatabase): Promise<OwnEvent[]> =>
  database.own.orderBy('sequence').toArray();

/**
 * Takes the server's results: an acknowledged event moves to the log and leaves the queue in one
 * transaction, a refused one stays with its reason, anything else stays as it is.
 * @returns the cases that changed
 */
export function takeResults(
  database: DeviceDatabase,
  batch: readonly CaseEvent[],
  results: readonly EventResult[],
): Promise<readonly string[]> {
  return database.transaction('rw', database.own, database.log, async () => {
    const changed = new Set<string>();
    for (const event of batch) {
      const result = results.find(({ id }) => id === event.id);
      const becomes = afterResult(result);
      if (becomes === 'kept here') continue;
      changed.add(event.caseId);
      if (becomes === 'in the log') {
        await database.log.put(result!.stored!);
        await database.own.delete(event.sequence);
      } else {
        await database.own.update(event.sequence, {
          kept: 'refused',
          code: result!.code,
          details: result!.details,
        });
      }
    }
    return [...changed];
  });
}

/**
 * Takes events of the server's feed or pack; own ones among them leave the queue.
 * @param position up to which the log is complete now; undefined leaves the cursor where it is
 */
export function takeStored(
  database: DeviceDatabase,
  events: readonly StoredEvent[],
  position?: number,
): Promise<readonly string[]> {
  return database.transaction('rw', database.values, database.own, database.log, async () => {
    await database.log.bulkPut([...events]);
    const device = await database.value<string>(DEVICE);
    const own = events.filter((event) => event.device === device).map(({ sequence }) => sequence);
    await database.own.bulkDelete(own);
    if (position !== undefined) await database.values.put({ name: 'position', value: position });
    return [...new Set(events.map(({ caseId }) => caseId))];
  });
}
