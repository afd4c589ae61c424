import * as z from 'zod';
import { faultSchema, relayPositionSchema } from '../circuit';
import {
  cautionCodeSchema,
  dangerSchema,
  meterFunctionSchema,
  meterSchema,
  stepSchema,
  suspectSchema,
} from '../diagnosis';

const id = z.uuid();
const words = z.string().trim().min(1).max(2000);
const short = z.string().trim().min(1).max(200);
const optionalWords = z.string().trim().max(2000).optional();
const tag = z.string().trim().min(1).max(40);
const name = z.string().trim().min(1).max(80);

/** Largest voltage that a lift's control circuit can show on a meter, volts; more is a slip of typing. */
export const MOST_VOLTS = 1500;

/** How a case can end (records.md names what each of them asks for). */
export const outcomes = [
  'repaired',
  'running on arrival',
  'left isolated',
  'cause outside the chain',
  'closed by the client side',
  'no access',
  'handed to another trade',
] as const;
export const outcomeOfCaseSchema = z.enum(outcomes);
export type OutcomeOfCase = z.infer<typeof outcomeOfCaseSchema>;

/** What can be disturbed besides a temporary link; all of it is restored before return to service. */
export const disturbances = [
  'lifted lead',
  'earth link',
  'unplugged coil',
  'setting',
  'cover',
  'paper between contacts',
] as const;

/** Schema version 1 of every payload, by event type. Review types begin with `review`. */
export const payloads = {
  'case opened': z.object({
    liftId: id,
    circuitId: id,
    circuitRevision: z.int().min(1),
    /** What the client says is wrong. */
    complaint: words,
    /** Played by the solver on a demo lift, not a real visit. */
    practice: z.boolean().default(false),
  }),
  'arrival checked': z.object({
    /** Everyone in the car and in the shaft seen or spoken to. */
    peopleSafe: z.boolean(),
    /** Barriers and notices on the landings concerned. */
    noticesUp: z.boolean(),
    meterProven: z.boolean().default(false),
    /** Temporary links found in the controller or the shaft; each is entered as `link fitted`. */
    linksFound: z.int().min(0).max(50),
    note: optionalWords,
  }),
  'reading taken': z.object({
    red: tag,
    black: tag,
    function: meterFunctionSchema,
    /** Red minus black, volts, as the meter showed it. */
    volts: z.number().min(-MOST_VOLTS).max(MOST_VOLTS),
    meter: meterSchema,
    place: name,
    entered: z.enum(['digits', 'same as supply', 'zero', 'practice']),
    /** The `advice shown` that asked for it; absent when the technician chose it. */
    answers: id.optional(),
  }),
  'relay seen': z.object({ relay: name, position: relayPositionSchema, answers: id.optional() }),
  'device seen': z.object({ part: name, seen: z.enum(['open', 'shut']) }),
  /** A tag that no probe gets to, or a relay that can't be seen. */
  'could not reach': z.object({ what: tag, why: optionalWords }),
  /** *Not sure*: the suggestion is set aside. The key is `red black function`. */
  'suggestion declined': z.object({ key: z.string().max(120), answers: id.optional() }),
  'place changed': z.object({ place: name }),
  /** The new lift state is the event's own `state`. */
  'state changed': z.object({}),
  /** Withdraws an earlier event of this case; its data stays in the log. */
  'event withdrawn': z.object({ of: id, why: optionalWords }),
  'caution acknowledged': z.object({ codes: z.array(cautionCodeSchema).max(20), place: name }),
  'advice shown': z.object({
    engine: z.string().max(40),
    step: stepSchema,
    suspects: z.array(suspectSchema).max(10),
    notDescribed: z.number(),
    nothingWrong: z.number(),
    expectedMinutes: z.number().optional(),
  }),
  'danger raised': z.object({ danger: dangerSchema }),
  'link fitted': z.object({
    link: id,
    /** Number or mark on the link itself. */
    mark: short,
    from: tag,
    to: tag,
    reason: words,
    /** Was already there on arrival. */
    found: z.boolean().default(false),
  }),
  'link removed': z.object({ link: id }),
  'thing disturbed': z.object({
    thing: id,
    kind: z.enum(disturbances),
    what: short,
    before: z.string().trim().max(200).optional(),
  }),
  'thing restored': z.object({ thing: id, after: z.string().trim().max(200).optional() }),
  'person entered': z.object({ entry: id, who: short, place: name }),
  'person left': z.object({ entry: id }),
  isolated: z.object({
    /** Tester proven, all conductors tested, tester proven again. */
    provenDead: z.boolean(),
    noticeFitted: z.boolean(),
    /** Role or function told (supervisor, owner), never more personal data than needed. */
    told: short.optional(),
    /** What is left as it is, named. */
    left: z.array(short).max(50).default([]),
  }),
  're-energised': z.object({}),
  'finding stated': z.object({
    /** Part and mode; several where several were found together. */
    faults: z.array(faultSchema).min(1).max(10),
    /** Device that the parts belong to, as it is proven later. */
    device: name,
    cause: words,
    proof: z.discriminatedUnion('kind', [
      /** Measured on the part itself: the event id of the reading. */
      z.object({ kind: z.literal('measured'), reading: id }),
      z.object({ kind: z.literal('seen'), what: words }),
      z.object({ kind: z.literal('not possible'), why: words }),
    ]),
    /** Belief when it was stated, 0 to 1. */
    believed: z.number().min(0).max(1).optional(),
    restsOnOneReading: z.boolean().default(false),
  }),
  'repair done': z.object({
    what: words,
    /** Every device that was touched: each must be proven. */
    devices: z.array(name).min(1).max(50),
    parts: z
      .array(
        z.object({
          description: short,
          number: z.string().trim().max(80).optional(),
          quantity: z.int().min(1).max(999),
        }),
      )
      .max(50)
      .default([]),
  }),
  /** The device was operated: `stopped` when the string opened and the relay dropped. */
  'device proven': z.object({
    device: name,
    result: z.enum(['stopped', 'did not stop', 'not possible']),
    how: words,
  }),
  'returned to service': z.object({
    /** Runs in both directions. */
    runs: z.int().min(0).max(999),
    coversOn: z.boolean(),
  }),
  'note written': z.object({ text: words }),
  'case closed': z.object({ outcome: outcomeOfCaseSchema, remark: optionalWords }),
  'review accepted': z.object({ remark: optionalWords }),
  'review returned': z.object({ question: words }),
} as const;

export type EventType = keyof typeof payloads;
export type PayloadOf<T extends EventType> = z.infer<(typeof payloads)[T]>;
export const eventTypes = Object.keys(payloads) as EventType[];

/** Types that only a supervisor may write; also those of a newer client that begin so. */
export const isReviewType = (type: string): boolean => type.startsWith('review ');
