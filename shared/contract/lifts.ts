import * as z from 'zod';
import { circuitSchema, faultSchema } from '../circuit';
import { idSchema, versionSchema } from './primitives';

export const siteSchema = z.object({ id: idSchema, name: z.string(), address: z.string() });
export type Site = z.infer<typeof siteSchema>;

/** Seven of Crockford's letters and digits (no I, L, O, U): short enough to read over a telephone. */
export const labelCodeSchema = z
  .string()
  .trim()
  .toUpperCase()
  .regex(/^[0-9A-HJKMNP-TV-Z]{7}$/);

export const liftSchema = z.object({
  id: idSchema,
  siteId: idSchema,
  name: z.string(),
  /** On the label in the machine room, as letters and as QR. */
  label: labelCodeSchema,
  maker: z.string(),
  controller: z.string(),
  landings: z.array(z.string()).min(1),
  hazards: z.array(z.string()),
  notes: z.string(),
  circuitId: idSchema.nullable(),
  circuitRevision: versionSchema.nullable(),
  /** A demo lift's hidden fault: *play the meter* answers from it. Null on a real lift. */
  practiceFaults: z.array(faultSchema).nullable(),
  version: versionSchema,
});
export type Lift = z.infer<typeof liftSchema>;

export const liftChangeSchema = z
  .object({
    name: z.string().trim().min(1).max(120),
    notes: z.string().trim().max(4000),
    hazards: z.array(z.string().trim().min(1).max(200)).max(20),
  })
  .partial();
export type LiftChange = z.infer<typeof liftChangeSchema>;

export const circuitRevisionSchema = z.object({
  circuitId: idSchema,
  revision: versionSchema,
  issuedAt: z.iso.datetime(),
  circuit: circuitSchema,
});
export type CircuitRevision = z.infer<typeof circuitRevisionSchema>;

export const checkFindingSchema = z.object({
  severity: z.enum(['error', 'warning']),
  code: z.string(),
  /** Path into the circuit, or a tag or part name. */
  at: z.string(),
  details: z.record(z.string(), z.union([z.string(), z.number()])).optional(),
  /** The finding in a sentence. */
  detail: z.string(),
});
