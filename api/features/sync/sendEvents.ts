import type { EventResult, Role } from '@shared/contract';
import type { InOrganisation } from '../../platform/db/doors';
import { readBatch, runsOf } from './readBatch';
import { storeRun } from './storeRun';
import { isPassing } from './passingFailure';

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
  for (const run of runsOf(readBatch(device, sending.events))) {
    if (!stopped) {
      const stored = await tryRun(() =>
        inside((org) => storeRun(org, run, { role, device, now, ids })),
      );
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
