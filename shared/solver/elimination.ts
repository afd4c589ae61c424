import type { Topology } from './topology';

/**
 * Elimination of a network of conductances without any subtraction: a node is replaced by the
 * conductances that it made between its neighbours (star to mesh), and its leak by leaks at them.
 * Diagonals are never formed, so a leak of 1e-12 S survives beside conductances of 1e6 S, where an
 * ordinary factorisation loses it to rounding (cf. Grassmann, Taksar & Heyman 1985 for Markov chains).
 */
export interface Elimination {
  readonly topology: Topology;
  /** Number of eliminated nodes: all but the kept ones, or all. */
  readonly count: number;
  /** In step with `topology.neighbour`: the share of a node's current that each neighbour takes. */
  readonly share: Float64Array;
  /** 1 over the sum of a node's conductances, ohms. */
  readonly inverse: Float64Array;
  /** What is left between and at the kept nodes. */
  readonly between: Float64Array;
  readonly leak: Float64Array;
}

/** Eliminates the first `count` nodes. Leaves its arguments as they are. */
export function eliminate(
  topology: Topology,
  givenBetween: Float64Array,
  givenLeak: Float64Array,
  count: number,
): Elimination {
  const { start, neighbour, toNeighbour, pairStart, pairEdge } = topology;
  const between = Float64Array.from(givenBetween);
  const leak = Float64Array.from(givenLeak);
  const share = new Float64Array(neighbour.length);
  const inverse = new Float64Array(count);
  for (let k = 0; k < count; k++) {
    const from = start[k]!;
    const to = start[k + 1]!;
    let total = leak[k]!;
    for (let s = from; s < to; s++) total += between[toNeighbour[s]!]!;
    inverse[k] = 1 / total;
    let pair = pairStart[k]!;
    for (let s = from; s < to; s++) {
      const part = between[toNeighbour[s]!]! / total;
      share[s] = part;
      leak[neighbour[s]!]! += part * leak[k]!;
      for (let t = s + 1; t < to; t++)
        between[pairEdge[pair++]!]! += part * between[toNeighbour[t]!]!;
    }
  }
  return { topology, count, share, inverse, between, leak };
}

/** Hands the currents into eliminated nodes on to the later ones, in place. */
export function passOn(e: Elimination, currents: Float64Array): void {
  const { start, neighbour } = e.topology;
  for (let k = 0; k < e.count; k++) {
    const own = currents[k]!;
    if (own === 0) continue;
    for (let s = start[k]!; s < start[k + 1]!; s++) currents[neighbour[s]!]! += e.share[s]! * own;
  }
}

/**
 * Turns passed-on currents into voltages, in place: entries of kept nodes must hold their voltages
 * already, those of eliminated nodes their currents.
 */
export function recover(e: Elimination, values: Float64Array): void {
  const { start, neighbour } = e.topology;
  for (let k = e.count - 1; k >= 0; k--) {
    let volts = values[k]! * e.inverse[k]!;
    for (let s = start[k]!; s < start[k + 1]!; s++) volts += e.share[s]! * values[neighbour[s]!]!;
    values[k] = volts;
  }
}

/**
 * Resistance between two eliminated nodes, kept nodes held at 0 V; -1 is earth; ohms. The ampere goes in
 * at one and out at the other, so that what both share (where they float, nearly everything) never
 * enters. `scratch` has a place for every node.
 */
export function resistanceBetween(
  e: Elimination,
  red: number,
  black: number,
  scratch: Float64Array,
): number {
  if (red === black) return 0;
  const inner = (node: number) => node >= 0 && node < e.count;
  scratch.fill(0);
  if (inner(red)) scratch[red] = 1;
  if (inner(black)) scratch[black] = -1;
  passOn(e, scratch);
  scratch.fill(0, e.count);
  recover(e, scratch);
  const ohms = (inner(red) ? scratch[red]! : 0) - (inner(black) ? scratch[black]! : 0);
  return Math.max(0, ohms);
}
