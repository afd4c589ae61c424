import type { CaseEvent } from '@shared/cases';
import { MOST_EVENTS_IN_BATCH, type EventResult } from '@shared/contract';
import type { OwnEvent } from './device-database';

/** Largest batch as JSON, bytes: under the server's limit for one request. */
export const MOST_BATCH_BYTES = 512 * 1024;

/**
 * The next events to send, in the device's order, cut at the batch's limits; at least one, if any.
 * @param most events; fewer after the server found a batch too large
 */
export function nextBatch(
  waiting: readonly OwnEvent[],
  most = MOST_EVENTS_IN_BATCH,
): readonly CaseEvent[] {
  const batch: CaseEvent[] = [];
  let bytes = 0;
  for (const { event, kept } of [...waiting].sort((a, b) => a.sequence - b.sequence)) {
    if (kept !== 'kept here') continue;
    bytes += JSON.stringify(event).length;
    if (batch.length > 0 && (batch.length >= most || bytes > MOST_BATCH_BYTES)) {
      break;
    }
    batch.push(event);
  }
  return batch;
}

/** What becomes of an event by its result; `kept here` stays in the queue. */
export function afterResult(
  result: EventResult | undefined,
): 'in the log' | 'refused' | 'kept here' {
  if (!result) return 'kept here';
  if (result.outcome === 'rejected') return 'refused';
  const acknowledged = result.outcome === 'accepted' || result.outcome === 'duplicate';
  // Without the stored event the acknowledgement proves nothing.
  return acknowledged && result.stored ? 'in the log' : 'kept here';
}
