import type { SettledReading } from './solution';
import {
  FLOATING_OHMS,
  type CoilCurrent,
  type NodePair,
  type SettledNetwork,
} from './settledNetwork';
import { PhasorElimination, phasors, type Phasors } from './phasorElimination';
import type { StampedNetwork, StampedTransformer } from './stamping';
import { EARTH_NODE } from './topology';

/** Share of the RMS of all that varies below which a frequency is not named, without unit. */
const FAINT = 0.02;
/** Points over which the mean magnitude of a current with both parts is taken. */
const MIXED_POINTS = 256;

interface Complex {
  readonly re: number;
  readonly im: number;
}

const times = (a: Complex, b: Complex): Complex => ({
  re: a.re * b.re - a.im * b.im,
  im: a.re * b.im + a.im * b.re,
});
const over = (a: Complex, b: Complex): Complex => {
  const square = b.re * b.re + b.im * b.im;
  return { re: (a.re * b.re + a.im * b.im) / square, im: (a.im * b.re - a.re * b.im) / square };
};
const size = (a: Complex): number => Math.hypot(a.re, a.im);
const at = (v: Phasors, node: number): Complex =>
  node === EARTH_NODE ? { re: 0, im: 0 } : { re: v.re[node]!, im: v.im[node]! };
const across = (v: Phasors, pair: NodePair): Complex => {
  const red = at(v, pair.red);
  const black = at(v, pair.black);
  return { re: red.re - black.re, im: red.im - black.im };
};
const addAt = (v: Phasors, node: number, amps: number): void => {
  if (node !== EARTH_NODE) v.re[node]! += amps;
};

/** What one frequency (0: direct current) makes in a circuit without diodes. Volts are RMS. */
class Frequency {
  private readonly elimination: PhasorElimination;
  private readonly volts: Phasors;
  /** Transformers one after the other: each answer includes those before it. */
  private readonly transformers: { own: StampedTransformer; answer: Phasors; total: Complex }[] =
    [];

  constructor(
    private readonly network: StampedNetwork,
    readonly hertz: number,
  ) {
    this.elimination = new PhasorElimination(network, hertz);
    // A winding carries no direct current across: without this the ideal ratio would.
    for (const own of hertz > 0 ? network.transformers : []) {
      const answer = phasors(network.topology.size);
      addAt(answer, own.secondary[0], 1);
      addAt(answer, own.secondary[1], -1);
      addAt(answer, own.primary[0], -own.ratio);
      addAt(answer, own.primary[1], own.ratio);
      this.solve(answer);
      const seen = this.windingVolts(own, answer);
      this.transformers.push({
        own,
        answer,
        total: { re: 1 / own.siemens + seen.re, im: seen.im },
      });
    }
    this.volts = phasors(network.topology.size);
    for (const source of network.sources) {
      if (source.hertz !== hertz) continue;
      addAt(this.volts, source.plus, source.amps);
      addAt(this.volts, source.minus, -source.amps);
    }
    this.solve(this.volts);
  }

  private windingVolts({ primary, secondary, ratio }: StampedTransformer, v: Phasors): Complex {
    const p = across(v, { red: primary[0], black: primary[1] });
    const s = across(v, { red: secondary[0], black: secondary[1] });
    return { re: s.re - ratio * p.re, im: s.im - ratio * p.im };
  }

  /** Each transformer is one conductance across a combination of nodes: a rank-one update. */
  private solve(v: Phasors): void {
    this.elimination.solve(v);
    for (const { own, answer, total } of this.transformers) {
      const amps = over(this.windingVolts(own, v), total);
      for (let k = 0; k < v.re.length; k++) {
        const change = times(amps, { re: answer.re[k]!, im: answer.im[k]! });
        v.re[k]! -= change.re;
        v.im[k]! -= change.im;
      }
    }
  }

  open(pair: NodePair): Complex {
    return across(this.volts, pair);
  }

  /** Ohms between the probes: one ampere in at red and out at black, so that what both share cancels. */
  impedance(pair: NodePair): Complex {
    const current = phasors(this.network.topology.size);
    addAt(current, pair.red, 1);
    addAt(current, pair.black, -1);
    this.solve(current);
    return across(current, pair);
  }
}

/** Circuits without diodes: each frequency by itself, and their sum. */
export class PhasorNetwork implements SettledNetwork {
  private readonly frequencies: readonly Frequency[];

  constructor(network: StampedNetwork) {
    const all = [...new Set(network.sources.map(({ hertz }) => hertz))].sort((a, b) => a - b);
    this.frequencies = (all.length > 0 ? all : [0]).map((hertz) => new Frequency(network, hertz));
  }

  read(pair: NodePair, meterOhms: number): SettledReading {
    let mean = 0;
    let square = 0;
    let theveninOhms = 0;
    const varying: { hertz: number; rms: number }[] = [];
    for (const frequency of this.frequencies) {
      const z = frequency.impedance(pair);
      const volts = over(frequency.open(pair), { re: 1 + z.re / meterOhms, im: z.im / meterOhms });
      theveninOhms = size(z);
      if (frequency.hertz === 0) {
        mean = volts.re;
      } else {
        square += size(volts) ** 2;
        varying.push({ hertz: frequency.hertz, rms: size(volts) });
      }
    }
    const ripple = Math.sqrt(square);
    return {
      mean,
      ripple,
      rms: Math.hypot(mean, ripple),
      hertz: varying.find(({ rms }) => ripple > 0 && rms >= FAINT * ripple)?.hertz ?? 0,
      theveninOhms,
      floating: theveninOhms > FLOATING_OHMS,
    };
  }

  current(pair: NodePair, ohms: number): CoilCurrent {
    let mean = 0;
    const rms: number[] = [];
    for (const frequency of this.frequencies) {
      const volts = frequency.open(pair);
      if (frequency.hertz === 0) mean = volts.re / ohms;
      else rms.push(size(volts) / ohms);
    }
    const varying = Math.hypot(...rms);
    return { rms: Math.hypot(mean, varying), meanMagnitude: meanMagnitude(mean, varying) };
  }
}

/** Mean over a cycle of |mean + sine|; amperes. */
function meanMagnitude(mean: number, rms: number): number {
  if (rms === 0) return Math.abs(mean);
  if (Math.abs(mean) >= Math.SQRT2 * rms) return Math.abs(mean);
  let sum = 0;
  for (let j = 0; j < MIXED_POINTS; j++) {
    sum += Math.abs(mean + Math.SQRT2 * rms * Math.sin((2 * Math.PI * (j + 0.5)) / MIXED_POINTS));
  }
  return sum / MIXED_POINTS;
}
