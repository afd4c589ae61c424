import type { EventResult, Role } from '@shared/contract';
import type { InOrganisation } from '../../platform/db/doors';
import { isPassing, isUnstorable } from './passingFailure';
import { readBatch, runsOf, type BatchEntry } from './readBatch';
import { setAsideUnstorable } from './setAsideUnstorable';
import { storeRun, type RunContext } from './storeRun';

export interface Sending {
  readonly role: Role;
  readonly device: string;
  readonly events: readonly unknown[];
  readonly now: Date;
  readonly ids: () => string;
  readonly inside: <T>(work: (org: InOrganisation) => Promise<T>) => Promise<T>;
}

/** How often a run is tried when another transaction was in its way. */
const TRIES = 3;

/**
 * One result per event, in the order of the batch. A run that can't be stored now answers `retry`, and so
 * do all after it: a later event of the device may not pass an earlier one.
 */
export async function sendEvents(sending: Sending): Promise<{ results: EventResult[] }> {
  const { role, device, now, ids, inside } = sending;
  const results: EventResult[] = [];
  let stopped = false;
  const context = { role, device, now, ids };
  for (const run of runsOf(readBatch(device, sending.events))) {
    if (!stopped) {
      const stored = await storeSafely(run, context, inside);
      if (stored) {
        results.push(...stored);
        continue;
      }
      stopped = true;
    }
    for (const entry of run) {
      const id = entry.kind === 'event' ? entry.event.id : entry.id;
      results.push({ id, outcome: 'retry' });
    }
  }
  return { results };
}

/**
 * Stores a run; where the database can't hold one of its values, entry by entry, and the one that can't be
 * held is set aside: else it would come again with every batch and hold up everything behind it.
 */
async function storeSafely(
  run: readonly BatchEntry[],
  context: RunContext,
  inside: Sending['inside'],
): Promise<EventResult[] | undefined> {
  try {
    return await tryRun(() => inside((org) => storeRun(org, run, context)));
  } catch (error) {
    if (!isUnstorable(error)) throw error;
    const [only, ...others] = run;
    if (only && others.length === 0) {
      return inside(async (org) => [await setAsideUnstorable(org, only, context)]);
    }
    const results: EventResult[] = [];
    for (const entry of run) {
      const stored = await storeSafely([entry], context, inside);
      if (!stored) return undefined;
      results.push(...stored);
    }
    return results;
  }
}

async function tryRun<T>(store: () => Promise<T>): Promise<T | undefined> {
  for (let attempt = 1; attempt <= TRIES; attempt++) {
    try {
      return await store();
    } catch (error) {
      if (!isPassing(error)) throw error;
    }
  }
  return undefined;
}
