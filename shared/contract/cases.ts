import * as z from 'zod';
import { outcomeOfCaseSchema, storedEventSchema } from '../cases';
import { idSchema } from './primitives';

export const caseStatusSchema = z.enum(['open', 'closed', 'returned', 'accepted']);

/** One line of a list of cases; a projection of its events. */
export const caseSummarySchema = z.object({
  id: idSchema,
  liftId: idSchema,
  liftName: z.string(),
  siteName: z.string(),
  status: caseStatusSchema,
  complaint: z.string(),
  /** Device of the finding, where one is stated. */
  device: z.string().nullable(),
  cause: z.string().nullable(),
  outcome: outcomeOfCaseSchema.nullable(),
  practice: z.boolean(),
  openedAt: z.iso.datetime(),
  closedAt: z.iso.datetime().nullable(),
  openedBy: z.string(),
  readings: z.int(),
  dangers: z.int(),
  version: z.int(),
});
export type CaseSummary = z.infer<typeof caseSummarySchema>;

/** A weakness of a closed case's evidence, computed (trade.md 4.3). */
export const weaknessSchema = z.object({
  code: z.string(),
  /** `grave` comes first in the queue. */
  weight: z.enum(['grave', 'note']),
  details: z.record(z.string(), z.unknown()),
});
export type Weakness = z.infer<typeof weaknessSchema>;

export const queueEntrySchema = caseSummarySchema.extend({
  weaknesses: z.array(weaknessSchema),
  /** Larger is looked at first; grave weaknesses and dangers before age. */
  risk: z.number(),
});
export type QueueEntry = z.infer<typeof queueEntrySchema>;

export const caseDetailSchema = z.object({
  summary: caseSummarySchema,
  events: z.array(storedEventSchema),
  names: z.record(z.string(), z.string()),
  weaknesses: z.array(weaknessSchema),
});
export type CaseDetail = z.infer<typeof caseDetailSchema>;
