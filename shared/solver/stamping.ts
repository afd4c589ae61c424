import {
  EARTH,
  type Circuit,
  type LiftState,
  type Part,
  type PartKind,
  type PartOf,
  type RelayPosition,
} from '../circuit/circuit';
import { contactClosed } from '../circuit/liftState';
import { OPEN_OHMS, type DiodeState, type FaultEffects } from './faultEffects';
import { EARTH_NODE, type Topology } from './topology';

/** Leak from every node to earth, siemens: what keeps a floating node defined (1 Tohm). */
export const NODE_LEAK_SIEMENS = 1e-12;

/** A current that a supply drives into `plus` and out of `minus`: volts over ohms, RMS if alternating. */
export interface StampedSource {
  readonly plus: number;
  readonly minus: number;
  readonly amps: number;
  /** 0 for direct current. */
  readonly hertz: number;
}
export interface StampedTransformer {
  readonly primary: readonly [number, number];
  readonly secondary: readonly [number, number];
  readonly ratio: number;
  readonly siemens: number;
}
export interface StampedBridge {
  /** Alternating 1, alternating 2, plus, minus. */
  readonly nodes: readonly [number, number, number, number];
  readonly diodes: ReadonlyMap<number, DiodeState>;
}
export interface StampedCapacitor {
  readonly a: number;
  readonly b: number;
  readonly farads: number;
}

/** A circuit in one state with one set of faults, as numbers on the nodes of its topology. */
export interface StampedNetwork {
  readonly topology: Topology;
  /** By edge, siemens; never negative. */
  readonly between: Float64Array;
  /** By node, siemens to earth. */
  readonly leak: Float64Array;
  readonly sources: StampedSource[];
  readonly capacitors: StampedCapacitor[];
  readonly transformers: StampedTransformer[];
  readonly bridges: StampedBridge[];
}

export interface Situation {
  readonly state: LiftState;
  readonly relays: Readonly<Record<string, RelayPosition>>;
  readonly effects: FaultEffects;
}

type Stamp<K extends PartKind> = (part: PartOf<K>, pen: Pen, situation: Situation) => void;

/** Puts values on nodes by tag. */
class Pen {
  constructor(readonly network: StampedNetwork) {}

  node(tag: string): number {
    return tag === EARTH ? EARTH_NODE : this.network.topology.nodes.get(tag)!;
  }

  conductance(a: number, b: number, siemens: number): void {
    if (a === b) return;
    if (a === EARTH_NODE) this.network.leak[b]! += siemens;
    else if (b === EARTH_NODE) this.network.leak[a]! += siemens;
    else this.network.between[this.network.topology.edge(a, b)]! += siemens;
  }

  resistor([from, to]: readonly [string, string], ohms: number): void {
    this.conductance(this.node(from), this.node(to), 1 / ohms);
  }
}

const resistive = (
  part: Extract<Part, { ohms: number; between: unknown }>,
  pen: Pen,
  { effects }: Situation,
) => pen.resistor(part.between, effects.ohms.get(part.name) ?? part.ohms);

/** What each kind of part is to the solver. A new kind needs a line here and nothing else in this folder. */
const STAMPS: { readonly [K in PartKind]: Stamp<K> } = {
  core: resistive,
  conductor: resistive,
  fuse: resistive,
  link: resistive,
  lamp: resistive,
  resistor: resistive,
  coil: resistive,
  contact: (part, pen, { effects, state, relays }) => {
    const closed = effects.notOpening.has(part.name) || contactClosed(part, state, relays);
    pen.resistor(part.between, closed ? (effects.ohms.get(part.name) ?? part.ohms) : OPEN_OHMS);
  },
  supply: (part, pen, { effects }) => {
    const ohms = effects.ohms.get(part.name) ?? part.ohms;
    const volts = part.volts * (effects.voltsFactor.get(part.name) ?? 1);
    pen.resistor(part.between, ohms);
    pen.network.sources.push({
      plus: pen.node(part.between[0]),
      minus: pen.node(part.between[1]),
      amps: volts / ohms,
      hertz: part.current === 'alternating' ? hertzOf(part) : 0,
    });
  },
  transformer: (part, pen, { effects }) => {
    pen.network.transformers.push({
      primary: [pen.node(part.primary[0]), pen.node(part.primary[1])],
      secondary: [pen.node(part.secondary[0]), pen.node(part.secondary[1])],
      ratio: part.ratio * (effects.voltsFactor.get(part.name) ?? 1),
      siemens: 1 / (effects.ohms.get(part.name) ?? part.ohms),
    });
  },
  bridge: (part, pen, { effects }) => {
    const [a1, a2, plus, minus] = part.between;
    pen.network.bridges.push({
      nodes: [pen.node(a1), pen.node(a2), pen.node(plus), pen.node(minus)],
      diodes: effects.diodes.get(part.name) ?? new Map<number, DiodeState>(),
    });
  },
  capacitor: (part, pen) => {
    pen.network.capacitors.push({
      a: pen.node(part.between[0]),
      b: pen.node(part.between[1]),
      farads: part.farads,
    });
  },
};

/** Frequency of an alternating supply that does not name it, hertz (common practice: 50). */
export const USUAL_HERTZ = 50;

export function hertzOf(part: PartOf<'supply'>): number {
  return part.hertz ?? USUAL_HERTZ;
}

/** The values of every part in this situation. */
export function stamp(circuit: Circuit, topology: Topology, situation: Situation): StampedNetwork {
  const network: StampedNetwork = {
    topology,
    between: new Float64Array(topology.edges),
    leak: new Float64Array(topology.size).fill(NODE_LEAK_SIEMENS),
    sources: [],
    capacitors: [],
    transformers: [],
    bridges: [],
  };
  const pen = new Pen(network);
  for (const part of circuit.parts) {
    (STAMPS[part.kind] as Stamp<PartKind>)(part, pen, situation);
  }
  for (const { tag, ohms } of situation.effects.earths) {
    if (topology.nodes.has(tag)) pen.conductance(pen.node(tag), EARTH_NODE, 1 / ohms);
  }
  return network;
}
