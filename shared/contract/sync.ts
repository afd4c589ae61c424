import * as z from 'zod';
import { storedEventSchema } from '../cases';
import { circuitRevisionSchema, liftSchema, siteSchema } from './lifts';
import { idSchema } from './primitives';

/** Most events in one request; a longer queue is sent in several. */
export const MOST_EVENTS_IN_BATCH = 100;

/**
 * The envelope is read event by event, so that a bad one gets its own result and delays nothing else.
 */
export const eventBatchSchema = z.object({
  device: idSchema,
  events: z.array(z.unknown()).min(1).max(MOST_EVENTS_IN_BATCH),
});
export type EventBatch = z.infer<typeof eventBatchSchema>;

export const eventResultSchema = z.object({
  /** The event's id; null where it had none that could be read. */
  id: z.string().nullable(),
  outcome: z.enum(['accepted', 'duplicate', 'rejected', 'retry']),
  /** Why, where rejected: key of the sentence. */
  code: z.string().optional(),
  details: z.record(z.string(), z.unknown()).optional(),
  stored: storedEventSchema.optional(),
});
export type EventResult = z.infer<typeof eventResultSchema>;
/** In the order of the batch. */
export const eventResultsSchema = z.object({ results: z.array(eventResultSchema) });
export type EventResults = z.infer<typeof eventResultsSchema>;

export const feedSchema = z.object({
  events: z.array(storedEventSchema),
  /** Position of the last event given, or the cursor asked with. */
  position: z.int().min(0),
  more: z.boolean(),
});
export type Feed = z.infer<typeof feedSchema>;

/** What a phone holds to work without signal. */
export const packSchema = z.object({
  sites: z.array(siteSchema),
  lifts: z.array(liftSchema),
  circuits: z.array(circuitRevisionSchema),
  /** Events of open cases and of the last closed ones of these lifts. */
  events: z.array(storedEventSchema),
  /** Names of the persons in those events, by id; erased ones are missing. */
  names: z.record(z.string(), z.string()),
  /** Organisation position up to which the events are complete. */
  position: z.int().min(0),
  /** Stamp of the server's build. */
  build: z.string(),
  /** Oldest client build number that may still send. */
  oldestClient: z.int().min(1),
});
export type Pack = z.infer<typeof packSchema>;
