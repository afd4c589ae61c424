import { EARTH, type Circuit, type Part, type PartOf, type Terminal } from './circuit';
import { CONTROLLER } from './sections';

/** The least that has to be known to have a circuit: the supply and the string, tag by tag. */
export interface StringSpec {
  readonly name: string;
  /** Volts of the supply: RMS where alternating, also before a bridge. */
  readonly volts: number;
  /** `rectified`: an alternating supply with a bridge, and direct current in the string. */
  readonly current: 'direct' | 'alternating' | 'rectified';
  /** A link from the supply's return pole to earth. */
  readonly earthed: boolean;
  readonly hertz?: number;
  /** Inner ohms of the supply. */
  readonly supplyOhms?: number;
  readonly stops: readonly StringStop[];
}

/** A tag of the string, the coils that hang on it, and the part that leads to the next tag. */
export interface StringStop {
  readonly tag: string;
  /** Default: the controller. */
  readonly places?: readonly string[];
  readonly coils?: readonly SpecCoil[];
  readonly next?: SpecPart;
}

export interface SpecCoil {
  readonly name: string;
  readonly ohms?: number;
}

export interface SpecPart {
  readonly kind: 'contact' | 'core';
  readonly name: string;
  /** Default: the controller. */
  readonly place?: string;
  readonly ohms?: number;
  readonly weight?: number;
  readonly when?: Pick<PartOf<'contact'>, 'relay' | 'condition'>;
}

/** Tags of what stands around the string in every circuit made here. */
export const SPEC_TAGS = {
  supplyPlus: 'S',
  supplyMinus: 'N',
  alternating1: 'AC1',
  alternating2: 'AC2',
  return: 'R',
} as const;

/** Judgement, from ordinary relay-logic lifts; each can be given in the spec. */
const USUAL = {
  supplyOhms: 1.5,
  fuseOhms: 0.1,
  contactOhms: 0.1,
  coreOhms: 0.3,
  returnOhms: 0.1,
  linkOhms: 0.05,
  coilOhms: 3300,
  hertz: 50,
} as const;
/** Pull-in and drop-out of a coil, of its rated current: 65 % and 27 % (common practice for DC relays). */
const PULL_IN = 0.65;
const DROP_OUT = 0.27;
/** Mean of a rectified sine per volt RMS, 2·√2/π. */
const FULL_WAVE_MEAN = (2 * Math.SQRT2) / Math.PI;

/** Builds the circuit of a spec: supply, fuse, string, coils to the return, return wire, earth link. */
export function buildStringCircuit(spec: StringSpec): Circuit {
  const rectified = spec.current === 'rectified';
  const stringVolts = rectified ? spec.volts * FULL_WAVE_MEAN : spec.volts;
  const first = spec.stops[0]!.tag;
  const last = spec.stops.at(-1)!.tag;
  const parts = [
    ...supplyParts(spec, first),
    ...spec.stops.flatMap((stop, k) => stringPart(stop, spec.stops[k + 1])),
    ...spec.stops.flatMap((stop) => coilParts(stop, spec, stringVolts)),
  ];
  const places = new Set([
    CONTROLLER,
    ...spec.stops.flatMap(({ places: own }) => own ?? []),
    ...parts.map(({ place }) => place),
  ]);
  return {
    format: 1,
    name: spec.name,
    drawing: spec.name,
    nominalVolts: stringVolts,
    stringCurrent: spec.current === 'alternating' ? 'alternating' : 'direct',
    places: [...places].map((name) => ({ name, setUpMinutes: 0, shaft: false })),
    minutes: {},
    readingMinutes: 0.5,
    conditions: conditionsOf(spec),
    terminals: terminalsOf(spec),
    parts,
    strings: [
      {
        name: 'safety string',
        from: first,
        to: last,
        return: SPEC_TAGS.return,
        supplyReturn: SPEC_TAGS.supplyMinus,
      },
    ],
  };
}

function terminalsOf(spec: StringSpec): Terminal[] {
  const around: readonly string[] = [
    ...(spec.current === 'rectified' ? [SPEC_TAGS.alternating1, SPEC_TAGS.alternating2] : []),
    SPEC_TAGS.supplyPlus,
    SPEC_TAGS.supplyMinus,
    SPEC_TAGS.return,
  ];
  const terminal = (tag: string, places: readonly string[]): Terminal => ({
    tag,
    places: [...places],
    reachable: true,
    hazard: 'low',
  });
  return [
    ...around.map((tag) => terminal(tag, [CONTROLLER])),
    ...spec.stops.map(({ tag, places }) => terminal(tag, places ?? [CONTROLLER])),
  ];
}

function conditionsOf(spec: StringSpec): Circuit['conditions'] {
  const names = new Set(
    spec.stops.flatMap(({ next }) => (next?.when?.condition ? [next.when.condition.name] : [])),
  );
  return [...names].map((name) => ({ name, values: ['no', 'yes'], moves: false }));
}

function supplyParts(spec: StringSpec, first: string): Part[] {
  const { supplyPlus, supplyMinus, alternating1, alternating2 } = SPEC_TAGS;
  const at = { place: CONTROLLER };
  const rectified = spec.current === 'rectified';
  const parts: Part[] = [
    {
      ...at,
      kind: 'supply',
      name: 'supply',
      weight: 2,
      between: rectified ? [alternating1, alternating2] : [supplyPlus, supplyMinus],
      current: spec.current === 'direct' ? 'direct' : 'alternating',
      volts: spec.volts,
      hertz: spec.current === 'direct' ? undefined : (spec.hertz ?? USUAL.hertz),
      ohms: spec.supplyOhms ?? USUAL.supplyOhms,
    },
    {
      ...at,
      kind: 'fuse',
      name: 'fuse',
      weight: 6,
      between: [supplyPlus, first],
      ohms: USUAL.fuseOhms,
    },
    {
      ...at,
      kind: 'conductor',
      name: 'return wire',
      weight: 2,
      between: [SPEC_TAGS.return, supplyMinus],
      ohms: USUAL.returnOhms,
    },
  ];
  if (rectified) {
    const between: [string, string, string, string] = [
      alternating1,
      alternating2,
      supplyPlus,
      supplyMinus,
    ];
    parts.push({ ...at, kind: 'bridge', name: 'bridge', weight: 3, between });
  }
  if (spec.earthed) {
    const between: [string, string] = [supplyMinus, EARTH];
    parts.push({
      ...at,
      kind: 'link',
      name: 'earth link',
      weight: 0,
      between,
      ohms: USUAL.linkOhms,
    });
  }
  return parts;
}

function stringPart({ tag, next }: StringStop, after: StringStop | undefined): Part[] {
  if (!next || !after) return [];
  const { kind, name, place = CONTROLLER, weight = 1, when } = next;
  const base = { name, place, weight, between: [tag, after.tag] as [string, string] };
  return kind === 'contact'
    ? [{ ...base, kind, ohms: next.ohms ?? USUAL.contactOhms, device: name, ...when }]
    : [{ ...base, kind, ohms: next.ohms ?? USUAL.coreOhms }];
}

function coilParts({ tag, coils = [] }: StringStop, spec: StringSpec, volts: number): Part[] {
  return coils.map(({ name, ohms = USUAL.coilOhms }) => ({
    kind: 'coil',
    name,
    place: CONTROLLER,
    weight: 1.5,
    between: [tag, SPEC_TAGS.return],
    ohms,
    current: spec.current === 'alternating' ? 'alternating' : 'direct',
    ratedVolts: volts,
    pullInMilliamps: ((PULL_IN * volts) / ohms) * 1000,
    dropOutMilliamps: ((DROP_OUT * volts) / ohms) * 1000,
    delaySeconds: 0.03,
  }));
}
