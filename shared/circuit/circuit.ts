import * as z from 'zod';

/** Name of the node that stands for the mass of the building. It has no terminal and no probe reaches it as a tag. */
export const EARTH = 'earth';

const name = z.string().trim().min(1).max(80);
const tag = z.string().trim().min(1).max(40);
const minutes = z.number().min(0).max(600);
/** Part resistances, in ohms at 20 °C. */
const ohms = z.number().min(1e-6).max(1e12);

/** Where a technician stands to put the probes. `shaft` places cost an entry procedure and carry its cautions. */
export const placeSchema = z.object({
  name,
  /** Minutes paid once per stay: barriers, stop switch proven, ladder. */
  setUpMinutes: minutes.default(0),
  shaft: z.boolean().default(false),
});
export type Place = z.infer<typeof placeSchema>;

/** What the technician can set or see; conditions move contacts. The first value is the one at rest. */
export const conditionSchema = z.object({
  name,
  values: z.array(name).min(2).max(20),
  /** Setting it can move the lift or a door: people clear, motor and brake feed made safe first. */
  moves: z.boolean().default(false),
});
export type Condition = z.infer<typeof conditionSchema>;

/** A value for every condition of a circuit, by condition name. */
export type LiftState = Readonly<Record<string, string>>;

/** The voltage class of what a probe touches here, for the cautions. */
export const hazardSchema = z.enum(['extra-low', 'low', 'mains']);

/** A place where a probe can go, by the label in the controller. */
export const terminalSchema = z.object({
  tag,
  /** What stands beside the tag in words, e.g. "safety relay". */
  label: z.string().trim().max(80).optional(),
  places: z.array(name).max(40),
  reachable: z.boolean().default(true),
  hazard: hazardSchema.default('low'),
});
export type Terminal = z.infer<typeof terminalSchema>;

/** What can be wrong with a part. Ohms, factor or diode number are in the {@link Fault}. */
export const faultModes = [
  'open',
  'resistive',
  'not opening',
  'blown',
  'dead',
  'low',
  'high',
  'weak',
  'diode open',
  'diode shorted',
  'partly shorted',
  'stuck in',
  'stuck out',
  'earth',
] as const;
export const faultModeSchema = z.enum(faultModes);
export type FaultMode = z.infer<typeof faultModeSchema>;

const partBase = {
  name,
  place: name,
  /** Relative frequency as the culprit; no fixed sum. */
  weight: z.number().min(0).max(1e6),
  /** One device may have several contacts: they share its name. */
  device: name.optional(),
  /** How it comes back after it has operated. */
  reset: z.enum(['self', 'manual', 'maintained']).optional(),
  /** How it is looked at, in the trade's words. */
  inspection: z.string().trim().max(300).optional(),
  /** Overrides the kind's default share of each mode; relative within the part. */
  modeWeights: z.partialRecord(faultModeSchema, z.number().min(0).max(1e6)).optional(),
};
const two = z.tuple([tag, tag]);

const supplySchema = z.object({
  ...partBase,
  kind: z.literal('supply'),
  /** Positive and negative, or live and the side joined to the return. */
  between: two,
  current: z.enum(['direct', 'alternating']),
  /** Open-circuit volts; RMS where alternating. */
  volts: z.number().min(1).max(1000),
  hertz: z.number().min(1).max(400).optional(),
  ohms,
});

/** Ideal ratio with the resistance of both windings seen from the secondary. */
const transformerSchema = z.object({
  ...partBase,
  kind: z.literal('transformer'),
  primary: two,
  secondary: two,
  /** Secondary over primary turns. */
  ratio: z.number().min(1e-3).max(1e3),
  ohms,
});

const bridgeSchema = z.object({
  ...partBase,
  kind: z.literal('bridge'),
  /** Alternating 1, alternating 2, plus, minus. Diodes: 1 a1→plus, 2 a2→plus, 3 minus→a1, 4 minus→a2. */
  between: z.tuple([tag, tag, tag, tag]),
});

const contactSchema = z.object({
  ...partBase,
  kind: z.literal('contact'),
  between: two,
  ohms,
  /** Closed only while this relay is in (or out). Without relay and condition: closed when the lift is safe. */
  relay: z.object({ name, closedWhen: z.enum(['in', 'out']) }).optional(),
  /** Closed only while the condition has one of these values. */
  condition: z.object({ name, closedWhen: z.array(name).min(1) }).optional(),
});

const plain = <K extends string>(kind: K) =>
  z.object({ ...partBase, kind: z.literal(kind), between: two, ohms });

const coilSchema = z.object({
  ...partBase,
  kind: z.literal('coil'),
  between: two,
  ohms,
  current: z.enum(['direct', 'alternating']),
  ratedVolts: z.number().min(1).max(1000),
  /** Coil current that pulls the armature in: mean of the magnitude on DC, RMS on AC, milliamperes. */
  pullInMilliamps: z.number().min(0.01).max(1e5),
  dropOutMilliamps: z.number().min(0.001).max(1e5),
  /** Seconds from crossing the threshold to the contacts' change; orders the events. */
  delaySeconds: z.number().min(0).max(60).default(0.03),
});

const capacitorSchema = z.object({
  ...partBase,
  kind: z.literal('capacitor'),
  between: two,
  farads: z.number().min(1e-13).max(1),
});

export const partSchema = z.discriminatedUnion('kind', [
  supplySchema,
  transformerSchema,
  bridgeSchema,
  contactSchema,
  plain('core'),
  plain('conductor'),
  plain('fuse'),
  plain('link'),
  plain('lamp'),
  plain('resistor'),
  coilSchema,
  capacitorSchema,
]);
export type Part = z.infer<typeof partSchema>;
export type PartKind = Part['kind'];
export type PartOf<K extends PartKind> = Extract<Part, { kind: K }>;

/** The series line that the line of lamps draws: where it starts, where it ends, what its coils return to. */
export const stringSchema = z.object({
  name,
  /** First terminal behind the supply and its fuse. */
  from: tag,
  /** Last terminal before the last coil. */
  to: tag,
  /** The return that black rests on. */
  return: tag,
  /** The other pole of the supply: proves the return. */
  supplyReturn: tag,
});
export type StringLine = z.infer<typeof stringSchema>;

/** A lift's safety circuit as a netlist, drawn from its wiring diagram. Issued revisions never change. */
export const circuitSchema = z.object({
  /** Version of this format; older ones are upcast on import. */
  format: z.literal(1).default(1),
  name,
  /** Number of the paper drawing it was taken from. */
  drawing: z.string().trim().max(80),
  nominalVolts: z.number().min(1).max(1000),
  /** What the string carries where T0 meets R: decides the meter function. */
  stringCurrent: z.enum(['direct', 'alternating']),
  places: z.array(placeSchema).min(1).max(100),
  /** Minutes from place to place, set-up not included. A missing pair is found over others. */
  minutes: z.record(z.string(), z.record(z.string(), minutes)),
  /** Minutes for one reading where one stands. */
  readingMinutes: minutes.default(0.5),
  conditions: z.array(conditionSchema).max(40),
  terminals: z.array(terminalSchema).min(2).max(600),
  parts: z.array(partSchema).min(1).max(600),
  strings: z.array(stringSchema).min(1).max(8),
});
export type Circuit = z.infer<typeof circuitSchema>;

/** One thing wrong: a part in a mode, or a terminal touching earth. */
export const faultSchema = z.object({
  /** Part name; or, for `earth`, the terminal's tag. */
  part: name,
  mode: faultModeSchema,
  /** Resistance that replaces the part's (`resistive`, `weak`, `earth`, `not opening`), ohms. */
  ohms: z.number().min(0).max(1e12).optional(),
  /** Factor on the supply's volts (`low`, `high`) or the coil's effective turns (`partly shorted`). */
  factor: z.number().min(0).max(10).optional(),
  /** Which diode of a bridge, 1 to 4. */
  diode: z.union([z.literal(1), z.literal(2), z.literal(3), z.literal(4)]).optional(),
});
export type Fault = z.infer<typeof faultSchema>;

export const relayPositionSchema = z.enum(['in', 'out', 'chatter']);
export type RelayPosition = z.infer<typeof relayPositionSchema>;
