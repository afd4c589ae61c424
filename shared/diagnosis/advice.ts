import * as z from 'zod';
import { faultSchema } from '../circuit/circuit';
import { meterFunctionSchema } from './observation';

/**
 * What the engine says after each observation, as data: codes, tags, parts and numbers.
 * Sentences are made from it by one table (`shared/contract/sentences.ts`).
 * zod, because advice shown is kept in the case's events as it was shown.
 */
export const reasonSchema = z.object({
  code: z.string(),
  tags: z.array(z.string()).default([]),
  parts: z.array(z.string()).default([]),
  numbers: z.record(z.string(), z.number()).default({}),
  /** Ids of the observations that it rests on. */
  observations: z.array(z.string()).default([]),
});
export type Reason = z.infer<typeof reasonSchema>;

/** Parts and modes that no permitted, reachable reading separates share one class. */
export const suspectSchema = z.object({
  /** The likeliest member first. */
  faults: z.array(faultSchema).min(1),
  /** 0 to 1, of all that is believed. */
  probability: z.number(),
  /** Readings that point to it. */
  because: z.array(reasonSchema),
});
export type Suspect = z.infer<typeof suspectSchema>;

export const clearedSchema = z.object({ part: z.string(), because: z.array(reasonSchema) });

/** One bar of the line of lamps: the parts between two neighbouring tags. */
export const sectionBeliefSchema = z.object({
  from: z.string(),
  to: z.string(),
  parts: z.array(z.string()),
  /** Probability that the culprit is in it. */
  probability: z.number(),
  state: z.enum(['live', 'suspected', 'cleared', 'unknown']),
});
export type SectionBelief = z.infer<typeof sectionBeliefSchema>;

/** What one outcome of a reading would mean. Volts as the meter shows them. */
export const outcomeSchema = z.object({
  band: z.enum(['full', 'none', 'between', 'in', 'out']),
  fromVolts: z.number().optional(),
  toVolts: z.number().optional(),
  probability: z.number(),
  /** Parts still suspected afterwards, likeliest first, at most six. */
  leaves: z.array(z.string()),
  /** First and last tag of the stretch that is left, where it is one stretch. */
  stretch: z.tuple([z.string(), z.string()]).optional(),
});
export type Outcome = z.infer<typeof outcomeSchema>;

export const cautionCodes = [
  'live terminals',
  'may start when cleared',
  'people and motion',
  'shaft entry',
  'car top',
  'pit',
  'landing door',
  'high voltage dc',
  'return may be live',
  'mains',
] as const;
export const cautionCodeSchema = z.enum(cautionCodes);
export type CautionCode = z.infer<typeof cautionCodeSchema>;

/** The next reading, or a free look at a relay. */
export const suggestionSchema = z.object({
  kind: z.enum(['reading', 'relay']),
  purpose: z.enum(['prove supply', 'prove return', 'locate', 'confirm', 'different', 'repeat']),
  place: z.string(),
  red: z.string().optional(),
  black: z.string().optional(),
  function: meterFunctionSchema.optional(),
  /** Smallest range that takes the supply, volts. */
  rangeVolts: z.number().optional(),
  relay: z.string().optional(),
  state: z.record(z.string(), z.string()),
  /** Travel, set-up and reading from where the technician stands. */
  minutes: z.number(),
  outcomes: z.array(outcomeSchema),
  because: z.array(reasonSchema),
  cautions: z.array(cautionCodeSchema),
});
export type Suggestion = z.infer<typeof suggestionSchema>;

/** Conditions (a) to (e) of the stopping rule; a finding needs all of them. */
export const stoppingSchema = z.object({
  direct: z.boolean(),
  believed: z.boolean(),
  withoutAnyOnePair: z.boolean(),
  described: z.boolean(),
  noDanger: z.boolean(),
});
export type Stopping = z.infer<typeof stoppingSchema>;

export const dangerSchema = z.object({
  code: z.enum([
    'volts beyond open device',
    'relay in without volts',
    'device does not open string',
    'car moved with door open',
    'second earth',
  ]),
  part: z.string().optional(),
  observations: z.array(z.string()),
});
export type Danger = z.infer<typeof dangerSchema>;

export const stepSchema = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('suggestion'), suggestion: suggestionSchema }),
  z.object({
    kind: z.literal('finding'),
    suspect: suspectSchema,
    /** True when (c) of the stopping rule could not be met by any reading. */
    restsOnOneReading: z.boolean(),
    /** The reading that measured it directly. */
    directObservation: z.string(),
  }),
  z.object({ kind: z.literal('nothing wrong'), because: z.array(reasonSchema) }),
  /** Readings cannot all be true: the suggestion is a different reading that would tell which. */
  z.object({
    kind: z.literal('contradiction'),
    doubtful: z.array(z.string()),
    suggestion: suggestionSchema.optional(),
  }),
  z.object({ kind: z.literal('stop'), dangers: z.array(dangerSchema).min(1) }),
  /** No permitted, reachable reading would tell more; the suspects stand as they are. */
  z.object({ kind: z.literal('exhausted'), because: z.array(reasonSchema) }),
]);
export type Step = z.infer<typeof stepSchema>;

export const adviceSchema = z.object({
  engine: z.string(),
  step: stepSchema,
  stopping: stoppingSchema,
  /** At most ten classes, likeliest first. */
  suspects: z.array(suspectSchema),
  cleared: z.array(clearedSchema),
  sections: z.array(sectionBeliefSchema),
  /** Belief that the circuit as drawn does not describe what is wrong. */
  notDescribed: z.number(),
  nothingWrong: z.number(),
  /** Supply volts at the string's start as the readings make it, and one standard deviation. */
  supplyVolts: z.object({ mean: z.number(), deviation: z.number() }),
  /** Expected minutes to a confirmed finding by the plan, from here; absent where no plan was made. */
  expectedMinutes: z.number().optional(),
});
export type Advice = z.infer<typeof adviceSchema>;

/** What the engine is asked. */
export interface AdviceRequest {
  readonly observations: readonly import('./observation').Observation[];
  /** Where the technician stands. */
  readonly place: string;
  /** The lift state now; readings carry their own. */
  readonly state: import('../circuit/circuit').LiftState;
  /** Terminals that can't be reached, by tag, and relays that can't be seen, by name. */
  readonly unreachable: readonly string[];
  /** Suggestions declined as *not sure*, as `red black function`: not offered again at once. */
  readonly declined: readonly string[];
  readonly meter: import('./observation').Meter;
}
