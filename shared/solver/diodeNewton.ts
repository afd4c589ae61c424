import { criticalVolts, junction, limitedStep } from './diodeLaw';
import type { Combination, KeptNodes } from './keptNodes';
import { SmallNetwork } from './smallNetwork';

/** Newton steps at one sample before it is taken as it is. Usual: two or three. */
const MAX_STEPS = 200;
/** A junction's last step that ends Newton, volts: the error left is its square over 2·N·VT, 1e-5 V. */
const LAST_STEP_VOLTS = 1e-3;
/** Below this a junction carries its saturation current whatever the voltage, volts. */
const BLOCKED_VOLTS = -1;
/** One sample's linearised network. Allocated once for a cycle. */
export class DiodeNewton {
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

  /**
   * Settles one sample from the junction volts given, which it improves in place. `stored` are amperes
   * into the nodes besides those of the kept nodes' own: what capacitors remember.
   */
  settle(sine: number, junctions: Float64Array, stored?: Float64Array): void {
    for (let step = 0; step < MAX_STEPS; step++) {
      this.linearise(junctions);
      this.solve(sine, stored);
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

  private solve(sine: number, stored: Float64Array | undefined): void {
    const { kept, volts, offsets } = this;
    for (let k = 0; k < kept.size; k++) volts[k] = kept.direct[k]! + sine * kept.sine[k]!;
    if (stored) for (let k = 0; k < kept.size; k++) volts[k]! += stored[k]!;
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

  /** What amperes into the nodes change at the last linearisation, in place. */
  respond(values: Float64Array): void {
    this.network.solve(values);
    this.subtract(values, this.extras.length, undefined);
  }

  /** Ohms between all pairs of nodes at these junction volts, the first `count` extras connected. */
  impedances(junctions: Float64Array, count: number, out: Float64Array, offset: number): void {
    const { size } = this.kept;
    const column = new Float64Array(size);
    this.linearise(junctions);
    for (let k = 0; k < size; k++) {
      column.fill(0);
      column[k] = 1;
      this.network.solve(column);
      this.subtract(column, count, undefined);
      out.set(column, offset + k * size);
    }
  }
}

export function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let k = 0; k < a.length; k++) sum += a[k]! * b[k]!;
  return sum;
}
