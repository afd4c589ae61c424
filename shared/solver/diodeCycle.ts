import { criticalVolts, junction, limitedStep, type DiodeLaw } from './diodeLaw';
import { SmallNetwork } from './smallNetwork';

/** Newton steps at one sample before it is taken as it is. Usual: two or three. */
const MAX_STEPS = 200;
/** A junction's last step that ends Newton, volts: the error left is its square over 2·N·VT, 1e-5 V. */
const LAST_STEP_VOLTS = 1e-3;
/** Below this a junction carries its saturation current whatever the voltage, volts. */
const BLOCKED_VOLTS = -1;
/** Points of the cycle at which the network's impedance is kept. */
export const PHASES = 16;

/** A conductance across a combination of nodes: current = siemens · (weights · volts + direct + sine·sin). */
export interface Combination {
  readonly weights: Float64Array;
  readonly siemens: number;
  /** Volts in series that do not depend on these nodes. */
  readonly direct: number;
  readonly sine: number;
}

/** The nodes of bridges and transformers with all that the rest of the circuit does to them. */
export interface KeptNodes {
  readonly size: number;
  /** Siemens, upper triangle. */
  readonly between: Float64Array;
  readonly leak: Float64Array;
  /** Amperes into each node: constant, and times the sine of the supply. */
  readonly direct: Float64Array;
  readonly sine: Float64Array;
  /** Anode and cathode; -1 is earth. */
  readonly diodes: readonly (readonly [number, number])[];
  readonly windings: readonly Combination[];
  readonly law: DiodeLaw;
}

/** A settled cycle at the kept nodes. */
export interface Cycle {
  readonly points: number;
  /** Volts, sample by sample, node by node. */
  readonly volts: Float64Array;
  /** Junction volts, sample by sample, diode by diode: where Newton starts next time. */
  readonly junctions: Float64Array;
  /** By phase, ohms between all pairs of nodes without the meter. */
  readonly impedances: Float64Array;
}

/** One sample's linearised network. Allocated once for a cycle. */
class Newton {
  private readonly network: SmallNetwork;
  private readonly answers: Float64Array[];
  private readonly totals: Float64Array;
  private readonly slopes: Float64Array;
  private readonly offsets: Float64Array;
  private readonly critical: number;
  private readonly point = new Float64Array(2);
  readonly volts: Float64Array;

  constructor(
    private readonly kept: KeptNodes,
    private readonly extras: readonly Combination[],
  ) {
    this.network = new SmallNetwork(kept.size);
    this.answers = extras.map(() => new Float64Array(kept.size));
    this.totals = new Float64Array(extras.length);
    this.slopes = new Float64Array(kept.diodes.length);
    this.offsets = new Float64Array(kept.diodes.length);
    this.critical = criticalVolts(kept.law);
    this.volts = new Float64Array(kept.size);
  }

  /** Settles one sample from the junction volts given, which it improves in place. */
  settle(sine: number, junctions: Float64Array): void {
    for (let step = 0; step < MAX_STEPS; step++) {
      this.linearise(junctions);
      this.solve(sine);
      if (this.advance(junctions) < LAST_STEP_VOLTS) return;
    }
  }

  private linearise(junctions: Float64Array): void {
    const { kept, network, slopes, offsets, point } = this;
    network.load(kept.between, kept.leak);
    for (let d = 0; d < kept.diodes.length; d++) {
      junction(kept.law, junctions[d]!, point);
      const stretch = 1 + point[1]! * kept.law.seriesOhms;
      slopes[d] = point[1]! / stretch;
      offsets[d] = (point[0]! - point[1]! * junctions[d]!) / stretch;
      network.add(kept.diodes[d]![0], kept.diodes[d]![1], slopes[d]!);
    }
    network.factor();
    for (let e = 0; e < this.extras.length; e++) {
      const answer = this.answers[e]!;
      answer.set(this.extras[e]!.weights);
      network.solve(answer);
      this.subtract(answer, e, 0);
      this.totals[e] = 1 / this.extras[e]!.siemens + dot(this.extras[e]!.weights, answer);
    }
  }

  /** The rank-one updates of the first `count` extras on a solution; `sine` gives their own volts. */
  private subtract(values: Float64Array, count: number, sine: number | undefined): void {
    for (let e = 0; e < count; e++) {
      const extra = this.extras[e]!;
      const own = sine === undefined ? 0 : extra.direct + sine * extra.sine;
      const amps = (dot(extra.weights, values) + own) / this.totals[e]!;
      const answer = this.answers[e]!;
      for (let k = 0; k < values.length; k++) values[k]! -= amps * answer[k]!;
    }
  }

  private solve(sine: number): void {
    const { kept, volts, offsets } = this;
    for (let k = 0; k < kept.size; k++) volts[k] = kept.direct[k]! + sine * kept.sine[k]!;
    for (let d = 0; d < kept.diodes.length; d++) {
      const [anode, cathode] = kept.diodes[d]!;
      if (anode >= 0) volts[anode]! -= offsets[d]!;
      if (cathode >= 0) volts[cathode]! += offsets[d]!;
    }
    this.network.solve(volts);
    this.subtract(volts, this.extras.length, sine);
  }

  /** Moves the junctions to where the solved voltages put them; the largest step that matters, volts. */
  private advance(junctions: Float64Array): number {
    const { kept, volts, slopes, offsets } = this;
    let largest = 0;
    for (let d = 0; d < kept.diodes.length; d++) {
      const [anode, cathode] = kept.diodes[d]!;
      const across = (anode >= 0 ? volts[anode]! : 0) - (cathode >= 0 ? volts[cathode]! : 0);
      const wanted = across - (slopes[d]! * across + offsets[d]!) * kept.law.seriesOhms;
      const before = junctions[d]!;
      const after = limitedStep(kept.law, this.critical, wanted, before);
      junctions[d] = after;
      if (before < BLOCKED_VOLTS && wanted < BLOCKED_VOLTS) continue;
      largest = Math.max(largest, Math.abs(wanted - before));
    }
    return largest;
  }

  /** Ohms between all pairs of nodes at the last linearisation, the first `count` extras connected. */
  impedances(count: number, out: Float64Array, offset: number): void {
    const { size } = this.kept;
    const column = new Float64Array(size);
    for (let k = 0; k < size; k++) {
      column.fill(0);
      column[k] = 1;
      this.network.solve(column);
      this.subtract(column, count, undefined);
      out.set(column, offset + k * size);
    }
  }
}

const sineTables = new Map<number, Float64Array>();

/** The sine at `points` even steps of a cycle; kept, since every cycle needs it. */
export function sinesOf(points: number): Float64Array {
  let table = sineTables.get(points);
  if (!table) {
    table = Float64Array.from({ length: points }, (_, j) => Math.sin((2 * Math.PI * j) / points));
    sineTables.set(points, table);
  }
  return table;
}

export function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let k = 0; k < a.length; k++) sum += a[k]! * b[k]!;
  return sum;
}

/**
 * The voltages over one cycle at `points` even steps, the meter connected if there is one. `near` is a
 * cycle of the same kept nodes to start from. No part here stores charge, so each sample stands alone.
 */
export function sampleCycle(
  kept: KeptNodes,
  points: number,
  meter?: Combination,
  near?: Cycle,
): Cycle {
  const { size, diodes } = kept;
  const newton = new Newton(kept, meter ? [...kept.windings, meter] : kept.windings);
  const volts = new Float64Array(points * size);
  const junctions = new Float64Array(points * diodes.length);
  const impedances = new Float64Array(PHASES * size * size);
  const now = new Float64Array(diodes.length);
  const sines = sinesOf(points);
  for (let j = 0; j < points; j++) {
    if (near) now.set(near.junctions.subarray(j * diodes.length, (j + 1) * diodes.length));
    newton.settle(sines[j]!, now);
    volts.set(newton.volts, j * size);
    junctions.set(now, j * diodes.length);
    const phase = (j * PHASES) / points;
    if (Number.isInteger(phase)) {
      newton.impedances(kept.windings.length, impedances, phase * size * size);
    }
  }
  return { points, volts, junctions, impedances };
}
