import type { StampedNetwork } from './stamping';
import { EARTH_NODE, type Topology } from './topology';

/** A vector of complex numbers, by node. */
export interface Phasors {
  readonly re: Float64Array;
  readonly im: Float64Array;
}

export const phasors = (size: number): Phasors => ({
  re: new Float64Array(size),
  im: new Float64Array(size),
});

/**
 * Elimination at one frequency, of all nodes, star to mesh as in `elimination.ts`. Conductances and
 * capacitances are all positive, so that here too diagonals are sums and nothing is subtracted.
 */
export class PhasorElimination {
  private readonly topology: Topology;
  private readonly share: Phasors;
  private readonly inverse: Phasors;

  constructor(network: StampedNetwork, hertz: number) {
    const { topology } = network;
    this.topology = topology;
    const between: Phasors = {
      re: Float64Array.from(network.between),
      im: new Float64Array(topology.edges),
    };
    const leak: Phasors = {
      re: Float64Array.from(network.leak),
      im: new Float64Array(topology.size),
    };
    for (const { a, b, farads } of network.capacitors) {
      const siemens = 2 * Math.PI * hertz * farads;
      if (a === b) continue;
      if (a === EARTH_NODE) leak.im[b]! += siemens;
      else if (b === EARTH_NODE) leak.im[a]! += siemens;
      else between.im[topology.edge(a, b)]! += siemens;
    }
    this.share = phasors(topology.neighbour.length);
    this.inverse = phasors(topology.size);
    this.eliminate(between, leak);
  }

  private eliminate(between: Phasors, leak: Phasors): void {
    const { start, neighbour, toNeighbour, pairStart, pairEdge, size } = this.topology;
    for (let k = 0; k < size; k++) {
      const from = start[k]!;
      const to = start[k + 1]!;
      let re = leak.re[k]!;
      let im = leak.im[k]!;
      for (let s = from; s < to; s++) {
        re += between.re[toNeighbour[s]!]!;
        im += between.im[toNeighbour[s]!]!;
      }
      const square = re * re + im * im;
      const inverseRe = re / square;
      const inverseIm = -im / square;
      this.inverse.re[k] = inverseRe;
      this.inverse.im[k] = inverseIm;
      let pair = pairStart[k]!;
      for (let s = from; s < to; s++) {
        const edge = toNeighbour[s]!;
        const shareRe = between.re[edge]! * inverseRe - between.im[edge]! * inverseIm;
        const shareIm = between.re[edge]! * inverseIm + between.im[edge]! * inverseRe;
        this.share.re[s] = shareRe;
        this.share.im[s] = shareIm;
        leak.re[neighbour[s]!]! += shareRe * leak.re[k]! - shareIm * leak.im[k]!;
        leak.im[neighbour[s]!]! += shareRe * leak.im[k]! + shareIm * leak.re[k]!;
        for (let t = s + 1; t < to; t++) {
          const other = toNeighbour[t]!;
          const target = pairEdge[pair++]!;
          between.re[target]! += shareRe * between.re[other]! - shareIm * between.im[other]!;
          between.im[target]! += shareRe * between.im[other]! + shareIm * between.re[other]!;
        }
      }
    }
  }

  /** Currents into the nodes become the voltages that they make, in place. */
  solve({ re, im }: Phasors): void {
    const { start, neighbour, size } = this.topology;
    const { share, inverse } = this;
    for (let k = 0; k < size; k++) {
      if (re[k] === 0 && im[k] === 0) continue;
      for (let s = start[k]!; s < start[k + 1]!; s++) {
        re[neighbour[s]!]! += share.re[s]! * re[k]! - share.im[s]! * im[k]!;
        im[neighbour[s]!]! += share.re[s]! * im[k]! + share.im[s]! * re[k]!;
      }
    }
    for (let k = size - 1; k >= 0; k--) {
      let voltsRe = re[k]! * inverse.re[k]! - im[k]! * inverse.im[k]!;
      let voltsIm = re[k]! * inverse.im[k]! + im[k]! * inverse.re[k]!;
      for (let s = start[k]!; s < start[k + 1]!; s++) {
        const j = neighbour[s]!;
        voltsRe += share.re[s]! * re[j]! - share.im[s]! * im[j]!;
        voltsIm += share.re[s]! * im[j]! + share.im[s]! * re[j]!;
      }
      re[k] = voltsRe;
      im[k] = voltsIm;
    }
  }
}
