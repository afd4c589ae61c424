import { createHash } from 'node:crypto';
import type { StoredEvent } from '@shared/cases';
import type { caseEvent } from './schema';

/** Keys sorted at every depth: the same content has one text, whatever the order it came in. */
function canonical(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(canonical);
  if (value === null || typeof value !== 'object') return value;
  const entries = Object.entries(value).sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0));
  return Object.fromEntries(entries.map(([key, inner]) => [key, canonical(inner)]));
}

/** SHA-256 of what the device sent, by content. */
export const sentDigest = (event: unknown): Buffer =>
  createHash('sha256')
    .update(JSON.stringify(canonical(event)) ?? 'undefined')
    .digest();

/** The row as it crosses the wire. */
export function storedEvent(row: typeof caseEvent.$inferSelect): StoredEvent {
  const { id, caseId, device, sequence, schema, type, payload, recordedAt, state } = row;
  return {
    id,
    caseId,
    device,
    sequence,
    schema,
    type,
    payload,
    recordedAt,
    state,
    actor: row.actor,
    receivedAt: row.receivedAt.toISOString(),
    clockOffsetSeconds: row.clockOffsetSeconds,
    caseVersion: row.caseVersion,
    position: row.position,
  };
}
