import { momentsOf, largestMove, squareOf, type Moments } from './cycleMoments';
import { sampleCycle } from './diodeCycle';
import { combinationRows, keptNodes, type Combination, type KeptNodes } from './keptNodes';
import { PHASES, type Cycle } from './cycle';
import { dot } from './diodeNewton';
import { POWER_RECTIFIER, type DiodeLaw } from './diodeLaw';
import { eliminate, passOn, resistanceBetween, type Elimination } from './elimination';
import {
  FLOATING_OHMS,
  type CoilCurrent,
  type NodePair,
  type SettledNetwork,
} from './settledNetwork';
import type { SettledReading } from './solution';
import type { StampedNetwork } from './stamping';
import { EARTH_NODE } from './topology';

/** Samples of a cycle to begin with, and at most. */
export const USUAL_POINTS = 256;
export const MOST_POINTS = 4096;
/** The number of samples is doubled while a mean or RMS moves by this much, volts. */
export const POINTS_VOLTS = 0.02;
/** What connecting the meter may change at the diodes without the cycle being solved again, volts. */
const UNFELT_VOLTS = 0.005;
/** Share of the varying part at the supply's own frequency above which it is named, without unit. */
const FAINT = 0.02;

/** Circuits with bridges: reduced once to the diodes' nodes, solved there sample by sample. */
export class RectifiedNetwork implements SettledNetwork {
  private readonly kept: KeptNodes;
  private readonly elimination: Elimination;
  private readonly hertz: number;
  private readonly cycle: Cycle;
  private readonly moments: Moments;
  /** Node by node: what each function of the moments contributes to the node's voltage. */
  private readonly rows: Float64Array;
  private readonly scratch: Float64Array;
  private readonly metered = new Map<string, { cycle: Cycle; moments: Moments }>();

  constructor(
    network: StampedNetwork,
    law: DiodeLaw = POWER_RECTIFIER,
    points: number = USUAL_POINTS,
  ) {
    const { topology } = network;
    const first = topology.size - topology.kept;
    this.scratch = new Float64Array(topology.size);
    this.hertz = network.sources.find(({ hertz }) => hertz > 0)?.hertz ?? 0;
    this.elimination = eliminate(topology, network.between, network.leak, first);

    const direct = new Float64Array(topology.size);
    const sine = new Float64Array(topology.size);
    for (const { plus, minus, amps, hertz } of network.sources) {
      const into = hertz > 0 ? sine : direct;
      const peak = hertz > 0 ? amps * Math.SQRT2 : amps;
      if (plus !== EARTH_NODE) into[plus]! += peak;
      if (minus !== EARTH_NODE) into[minus]! -= peak;
    }
    passOn(this.elimination, direct);
    passOn(this.elimination, sine);
    this.kept = keptNodes(network, this.elimination, direct.slice(first), sine.slice(first), law);
    this.rows = combinationRows(this.elimination, direct, sine);

    let cycle = sampleCycle(this.kept, points);
    let { all, half } = momentsOf(cycle, this.kept.size);
    while (cycle.points < MOST_POINTS && largestMove(all, half) >= POINTS_VOLTS) {
      cycle = sampleCycle(this.kept, cycle.points * 2);
      ({ all, half } = momentsOf(cycle, this.kept.size));
    }
    this.cycle = cycle;
    this.moments = all;
  }

  read(pair: NodePair, meterOhms: number): SettledReading {
    const weights = this.weights(pair);
    const inner = resistanceBetween(this.elimination, pair.red, pair.black, this.scratch);
    const keptWeights = weights.slice(0, this.kept.size);
    const siemens = 1 / (meterOhms + inner);
    const meter: Combination = {
      weights: keptWeights,
      siemens,
      direct: weights[this.kept.size]!,
      sine: weights[this.kept.size + 1]!,
    };
    const { cycle, moments } = this.withMeter(meter, weights);
    // The meter also draws current through the parts between the kept nodes and the probes.
    const scale = meterOhms * siemens;
    const mean = dot(weights, moments.means) * scale;
    const square = squareOf(moments, weights) * scale * scale;
    const ripple = Math.sqrt(Math.max(0, square - mean * mean));
    const atSupply = Math.hypot(dot(weights, moments.sines), dot(weights, moments.cosines)) * scale;
    const theveninOhms = inner + this.outerOhms(cycle, keptWeights);
    return {
      mean,
      ripple,
      rms: Math.sqrt(square),
      hertz:
        ripple === 0 ? 0 : atSupply / Math.SQRT2 >= FAINT * ripple ? this.hertz : 2 * this.hertz,
      theveninOhms,
      floating: theveninOhms > FLOATING_OHMS,
    };
  }

  current(pair: NodePair, ohms: number): CoilCurrent {
    const weights = this.weights(pair);
    const { size } = this.kept;
    const { points, volts } = this.cycle;
    let magnitude = 0;
    for (let j = 0; j < points; j++) {
      let value = weights[size]! + weights[size + 1]! * Math.sin((2 * Math.PI * j) / points);
      for (let k = 0; k < size; k++) value += weights[k]! * volts[j * size + k]!;
      magnitude += Math.abs(value);
    }
    return {
      meanMagnitude: magnitude / points / ohms,
      rms: Math.sqrt(squareOf(this.moments, weights)) / ohms,
    };
  }

  /** What the functions of the moments contribute to red minus black. */
  private weights({ red, black }: NodePair): Float64Array {
    const width = this.kept.size + 2;
    const weights = new Float64Array(width);
    for (let k = 0; k < width; k++) {
      if (red !== EARTH_NODE) weights[k]! += this.rows[red * width + k]!;
      if (black !== EARTH_NODE) weights[k]! -= this.rows[black * width + k]!;
    }
    return weights;
  }

  /** Resistance that the diodes and all behind them put in series, over the cycle's conducting parts. */
  private outerOhms(cycle: Cycle, weights: Float64Array): number {
    let siemens = 0;
    for (let phase = 0; phase < PHASES; phase++) {
      siemens += 1 / this.phaseOhms(cycle.impedances, phase, weights);
    }
    return PHASES / siemens;
  }

  private phaseOhms(impedances: Float64Array, phase: number, weights: Float64Array): number {
    const { size } = this.kept;
    let ohms = 0;
    for (let a = 0; a < size; a++) {
      if (weights[a] === 0) continue;
      const row = (phase * size + a) * size;
      for (let b = 0; b < size; b++) ohms += weights[a]! * weights[b]! * impedances[row + b]!;
    }
    return ohms > 0 ? ohms : 0;
  }

  /** The cycle with the meter connected, solved again only where the diodes would feel it. */
  private withMeter(
    meter: Combination,
    weights: Float64Array,
  ): { readonly cycle: Cycle; readonly moments: Moments } {
    if (!this.feels(meter, weights)) return { cycle: this.cycle, moments: this.moments };
    // Probes that load the kept nodes alike share one cycle: that of all tags on the live side, say.
    const key = [...meter.weights, meter.direct / 100, meter.sine / 100, Math.log(meter.siemens)]
      .map((value) => value.toFixed(4))
      .join();
    let found = this.metered.get(key);
    if (!found) {
      const cycle = sampleCycle(this.kept, this.cycle.points, meter, this.cycle);
      found = { cycle, moments: momentsOf(cycle, this.kept.size).all };
      this.metered.set(key, found);
    }
    return found;
  }

  /** Whether the meter's own current would move the kept nodes by more than a display shows. */
  private feels(meter: Combination, weights: Float64Array): boolean {
    const { size, capacitors } = this.kept;
    const { points, volts, momentary } = this.cycle;
    const ohms = (phase: number) => this.phaseOhms(momentary, phase, meter.weights);
    // Charge carries the meter's current on from where the diodes conduct, so its mean counts as well.
    const lasting = capacitors.length > 0 ? this.outerOhms(this.cycle, meter.weights) : 0;
    for (let phase = 0; phase < PHASES; phase++) {
      const j = (phase * points) / PHASES;
      let value = weights[size]! + weights[size + 1]! * Math.sin((2 * Math.PI * j) / points);
      for (let k = 0; k < size; k++) value += weights[k]! * volts[j * size + k]!;
      const drop = Math.max(lasting, ohms(phase)) * meter.siemens * value;
      if (Math.abs(drop) > UNFELT_VOLTS) return true;
    }
    return false;
  }
}
