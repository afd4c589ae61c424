import type { Circuit, Fault, LiftState, Part, Terminal } from '@shared/circuit';

/** A circuit as `tests/hunts/data/hunts.json` and `tests/reference/data/reference.json` hold it. */
export interface HuntCircuit {
  readonly id: string;
  readonly kind?: string;
  readonly terminals: readonly { readonly name: string; readonly places: readonly string[] }[];
  readonly parts: readonly HuntPart[];
  readonly minutes?: Readonly<Record<string, Readonly<Record<string, number>>>>;
  readonly readingMinutes?: number;
  readonly meter?: {
    readonly ohms: number;
    readonly accuracyPercent: number;
    readonly digits: number;
  };
}

export interface HuntPart {
  readonly name: string;
  readonly kind: string;
  readonly between: readonly string[];
  readonly place: string;
  readonly weight: number;
  readonly ohms?: number;
  readonly volts?: number;
  readonly ac?: boolean;
  readonly hz?: number;
  readonly device?: string;
  readonly relay?: string;
  readonly condition?: string;
  readonly ratedVolts?: number;
  readonly pullInMilliamps?: number;
  readonly dropOutMilliamps?: number;
  readonly farads?: number;
}

export interface HuntFault {
  readonly part?: string;
  readonly terminal?: string;
  readonly mode: string;
  readonly ohms?: number;
  readonly factor?: number;
  readonly diode?: number;
}

export interface HuntSample {
  readonly red: string;
  readonly black: string;
  readonly dc: number;
  readonly ac: number;
  readonly rms: number;
}

const YES = 'yes';
const NO = 'no';

/** The product's circuit of a hunt's circuit. Shaft places are told by name; set-up is in the minutes. */
export function huntCircuit(hunt: HuntCircuit): Circuit {
  const supply = hunt.parts.find(({ kind }) => kind === 'supply')!;
  const bridge = hunt.parts.find(({ kind }) => kind === 'bridge');
  const placeNames = new Set([
    ...Object.keys(hunt.minutes ?? {}),
    ...hunt.terminals.flatMap(({ places }) => places),
    ...hunt.parts.map(({ place }) => place),
  ]);
  const conditions = new Set(hunt.parts.flatMap(({ condition }) => (condition ? [condition] : [])));
  const bridgeFirst =
    bridge !== undefined && hunt.parts.filter(({ kind }) => kind === 'coil').length > 1;
  return {
    format: 1,
    name: hunt.id,
    drawing: hunt.id,
    nominalVolts: supply.volts!,
    stringCurrent: supply.ac && !(bridge && bridgeFirst) ? 'alternating' : 'direct',
    places: [...placeNames].map((name) => ({
      name,
      setUpMinutes: 0,
      shaft: ['shaft top', 'pit', 'car top'].includes(name),
    })),
    minutes: hunt.minutes ?? {},
    readingMinutes: hunt.readingMinutes ?? 0.5,
    conditions: [...conditions].map((name) => ({ name, values: [NO, YES], moves: true })),
    terminals: hunt.terminals.map(({ name, places }): Terminal => ({
      tag: name,
      places: [...places],
      reachable: true,
      hazard: 'low',
    })),
    parts: hunt.parts.map(huntPart),
    strings: stringEnds(hunt).map(([from, to], k) => ({
      name: `safety string ${k + 1}`,
      from,
      to,
      return: 'R',
      supplyReturn: bridgeFirst ? bridge.between[3]! : supply.between[1]!,
    })),
  };
}

/** From behind the fuse to the last coil's tag, or the bridge's where the bridge is last; two if a relay feeds one. */
function stringEnds({ parts }: HuntCircuit): readonly (readonly [string, string])[] {
  const fuse = parts.find(({ kind }) => kind === 'fuse')!;
  const coils = parts.filter(({ kind }) => kind === 'coil');
  const bridge = parts.find(({ kind }) => kind === 'bridge');
  if (bridge && coils.length === 1) return [[fuse.between[1]!, bridge.between[0]!]];
  const feedsBridge = bridge?.between.includes(fuse.between[1]!) ?? false;
  const from = feedsBridge ? bridge!.between[2]! : fuse.between[1]!;
  const tagOf = (coil: string) => coils.find(({ name }) => name === coil)!.between[0]!;
  const relayFed = parts.some(({ relay }) => relay !== undefined);
  return relayFed
    ? [
        [from, tagOf('safety relay')],
        [from, tagOf('lock relay')],
      ]
    : [[from, tagOf('lock relay')]];
}

function huntPart(part: HuntPart): Part {
  const { name, place, weight, ohms } = part;
  const base = { name, place, weight };
  const between: [string, string] = [part.between[0]!, part.between[1]!];
  switch (part.kind) {
    case 'supply':
      return {
        ...base,
        kind: 'supply',
        between,
        current: part.ac ? 'alternating' : 'direct',
        volts: part.volts!,
        hertz: part.hz,
        ohms: ohms!,
      };
    case 'bridge':
      return { ...base, kind: 'bridge', between: part.between as [string, string, string, string] };
    case 'contact':
      return {
        ...base,
        kind: 'contact',
        between,
        ohms: ohms!,
        device: part.device,
        relay: part.relay ? { name: part.relay, closedWhen: 'in' } : undefined,
        condition: part.condition ? { name: part.condition, closedWhen: [YES] } : undefined,
      };
    case 'coil':
      return {
        ...base,
        kind: 'coil',
        between,
        ohms: ohms!,
        current: part.ac ? 'alternating' : 'direct',
        ratedVolts: part.ratedVolts!,
        pullInMilliamps: part.pullInMilliamps!,
        dropOutMilliamps: part.dropOutMilliamps!,
        delaySeconds: 0.03,
      };
    case 'capacitor':
      return { ...base, kind: 'capacitor', between, farads: part.farads! };
    case 'core':
    case 'fuse':
    case 'link':
    case 'lamp':
      return { ...base, kind: part.kind, between, ohms: ohms! };
    default:
      throw new RangeError(`kind ${part.kind}`);
  }
}

export function huntFault({ part, terminal, mode, ohms, factor, diode }: HuntFault): Fault {
  return {
    part: part ?? terminal!,
    mode: mode as Fault['mode'],
    ohms,
    factor,
    diode: diode as Fault['diode'],
  };
}

/** `idle`, or the name of the condition that is set. */
export function huntState(circuit: Circuit, state: string): LiftState {
  return Object.fromEntries(
    circuit.conditions.map(({ name }) => [name, name === state ? YES : NO]),
  );
}
