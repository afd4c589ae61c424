import * as z from 'zod';
import { relayPositionSchema } from '../circuit/circuit';

/** What reads the volts. `lamp` answers bright, dim or none and never a number. */
export const meterSchema = z.object({
  kind: z.enum(['digital', 'low impedance', 'lamp']).default('digital'),
  /** Input resistance, ohms. */
  ohms: z.number().min(100).max(1e9),
  /** Of the reading, per cent. */
  accuracyPercent: z.number().min(0).max(50),
  /** Smallest step of the display, volts. */
  stepVolts: z.number().min(0).max(10),
});
export type Meter = z.infer<typeof meterSchema>;

/** The usual meter of the trade (common practice): 10 Mohm, 1 per cent, tenths of a volt. */
export const USUAL_METER: Meter = {
  kind: 'digital',
  ohms: 10e6,
  accuracyPercent: 1,
  stepVolts: 0.1,
};

export const meterFunctionSchema = z.enum(['dc volts', 'ac volts']);
export type MeterFunction = z.infer<typeof meterFunctionSchema>;

const liftState = z.record(z.string(), z.string());

/** One thing seen on the lift, as evidence. `id` is the event's id, so that reasons can point back. */
export const observationSchema = z.discriminatedUnion('kind', [
  z.object({
    kind: z.literal('reading'),
    id: z.string(),
    red: z.string(),
    black: z.string(),
    function: meterFunctionSchema,
    /** Red minus black. Negative DC means swapped probes: the sign is kept. */
    volts: z.number(),
    meter: meterSchema,
    state: liftState,
    place: z.string(),
  }),
  z.object({
    kind: z.literal('relay'),
    id: z.string(),
    relay: z.string(),
    position: relayPositionSchema,
    state: liftState,
  }),
  /** A device seen to be open, or to be shut, by eye: soft evidence, never proof of its contact. */
  z.object({
    kind: z.literal('device'),
    id: z.string(),
    part: z.string(),
    seen: z.enum(['open', 'shut']),
    state: liftState,
  }),
]);
export type Observation = z.infer<typeof observationSchema>;
export type ReadingObservation = Extract<Observation, { kind: 'reading' }>;
