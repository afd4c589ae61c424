import type { EventResult } from '@shared/contract';
import type { InOrganisation } from '../../platform/db/doors';
import { sentDigest } from '../../platform/db/storedEvent';
import type { BatchEntry } from './readBatch';
import { setAside } from './repository';
import type { RunContext } from './storeRun';

/** Characters that PostgreSQL takes in no text: NUL, and halves of a pair. */
const UNSTORABLE = /\0|\p{Surrogate}/gu;
const REPLACEMENT = '\uFFFD';

/** The same data with every such character replaced, at any depth. */
export function storable(value: unknown): unknown {
  if (typeof value === 'string') return value.replace(UNSTORABLE, REPLACEMENT);
  if (Array.isArray(value)) return value.map(storable);
  if (value === null || typeof value !== 'object') return value;
  return Object.fromEntries(
    Object.entries(value).map(([key, inner]) => [storable(key) as string, storable(inner)]),
  );
}

/** Keeps an entry that no column can hold, as far as it can be kept, and refuses it by name. */
export async function setAsideUnstorable(
  org: InOrganisation,
  entry: BatchEntry,
  { device, now, ids }: RunContext,
): Promise<EventResult> {
  const id = entry.kind === 'event' ? entry.event.id : entry.id;
  await setAside(org, {
    id: ids(),
    eventId: storable(id) as string | null,
    device,
    code: 'cannot-be-stored',
    details: {},
    event: storable(entry.sent) ?? null,
    sentDigest: sentDigest(entry.sent),
    receivedAt: now,
  });
  return { id, outcome: 'rejected', code: 'cannot-be-stored' };
}
