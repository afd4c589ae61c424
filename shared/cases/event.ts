import * as z from 'zod';
import { payloads, type EventType, type PayloadOf } from './payloads';

/** Version of the payloads that this build writes. Older ones are upcast when read, never rewritten. */
export const EVENT_SCHEMA = 1;

/** Largest event as JSON, bytes. */
export const MOST_EVENT_BYTES = 64 * 1024;

/**
 * One thing that happened in a case, as the device wrote it. The payload stays `unknown` here: a type
 * that this build does not know is kept and shown, not dropped. {@link known} narrows it.
 */
export const caseEventSchema = z.object({
  /** UUIDv7 made on the device. */
  id: z.uuid(),
  caseId: z.uuid(),
  device: z.uuid(),
  /** 1, 2, 3 … per device, without gaps. */
  sequence: z.int().min(1).max(Number.MAX_SAFE_INTEGER),
  schema: z.int().min(1).max(1000),
  type: z.string().min(1).max(60),
  payload: z.record(z.string(), z.unknown()),
  /** The device's clock, ISO 8601 in UTC: evidence, never order. */
  recordedAt: z.iso.datetime(),
  /** The lift state that it was recorded in. */
  state: z.record(z.string(), z.string()),
});
export type CaseEvent = z.infer<typeof caseEventSchema>;

/** An event as the server's log holds it. */
export const storedEventSchema = caseEventSchema.extend({
  /** Person id of who wrote it. */
  actor: z.uuid(),
  receivedAt: z.iso.datetime(),
  /** Device clock minus server clock at receipt, seconds; includes the time it waited unsent. */
  clockOffsetSeconds: z.number(),
  /** 1, 2, 3 … in this case. */
  caseVersion: z.int().min(1),
  /** 1, 2, 3 … in this organisation, in commit order, without gaps. */
  position: z.int().min(1),
});
export type StoredEvent = z.infer<typeof storedEventSchema>;

/** An event whose type and payload this build knows. */
export type KnownEvent = {
  [T in EventType]: Omit<CaseEvent, 'type' | 'payload'> & { type: T; payload: PayloadOf<T> };
}[EventType];

/** Lifts a payload of an older schema to the next one; entry n leads from n to n + 1. */
export type Upcaster = (event: CaseEvent) => CaseEvent;

/** What an event turned out to be. */
export type ReadEvent =
  | { readonly kind: 'known'; readonly event: KnownEvent }
  /** Of a later build: kept and shown as such. */
  | { readonly kind: 'unknown'; readonly event: CaseEvent }
  /** A known type with a payload that does not fit. */
  | { readonly kind: 'invalid'; readonly event: CaseEvent; readonly problems: readonly string[] };

/** Lifts a payload of an older schema step by step to {@link EVENT_SCHEMA}. */
const upcasters: Readonly<Record<number, Upcaster>> = {};

/** Upcasts, then reads the payload by its type. Never throws. */
export function readEvent(
  event: CaseEvent,
  steps: Readonly<Record<number, Upcaster>> = upcasters,
  current = EVENT_SCHEMA,
): ReadEvent {
  if (event.schema > current) return { kind: 'unknown', event };
  let lifted = event;
  while (lifted.schema < current) {
    const step = steps[lifted.schema];
    if (!step) return { kind: 'unknown', event };
    lifted = { ...step(lifted), schema: lifted.schema + 1 };
  }
  if (!Object.hasOwn(payloads, lifted.type)) return { kind: 'unknown', event };
  const type = lifted.type as EventType;
  const parsed = payloads[type].safeParse(lifted.payload);
  if (!parsed.success) {
    const problems = parsed.error.issues.map(
      ({ path, message }) => `${path.join('.')}: ${message}`,
    );
    return { kind: 'invalid', event, problems };
  }
  return { kind: 'known', event: { ...lifted, type, payload: parsed.data } as KnownEvent };
}
