import type { Circuit } from '../circuit';
import type { AdviceRequest, Danger } from './advice';
import { setUpKey, type Belief } from './belief';
import type { Evidence } from './evidence';
import { answerable } from './answerable';
import { candidatesOf, type Candidate } from './candidates';
import { dangersOf } from './danger';
import type { Hypothesis } from './hypotheses';
import { deviationOf, FLOATING_MOST } from './likelihood';
import { LinePlan } from './linePlan';
import type { Observation, ReadingObservation } from './observation';
import type { Prediction, Predictions } from './predictions';

/** Two predictions this many deviations apart are told apart. */
export const APART = 3;
/** A hypothesis with less is not looked at when classes are made. */
const WORTH_A_CLASS = 1e-3;
/** A hypothesis with less does not make an outcome of its own. */
const WORTH_AN_OUTCOME = 1e-6;

/** Hypotheses that one reading would show alike. */
export interface Group {
  /** Volts that the meter would show, of the lowest and the highest member. */
  readonly from: number;
  readonly to: number;
  readonly share: number;
  readonly members: readonly number[];
}

/** One request's working: what is believed, what could be read, and what would tell what apart. */
export class Consultation {
  readonly belief: Belief;
  readonly dangers: readonly Danger[];
  readonly readings: readonly ReadingObservation[];
  readonly candidates: readonly Candidate[];
  readonly classes: readonly (readonly number[])[];
  readonly plan: LinePlan;
  private readonly beliefsWithout = new Map<string, Belief>();

  constructor(
    readonly circuit: Circuit,
    readonly hypotheses: readonly Hypothesis[],
    readonly predictions: Predictions,
    private readonly evidence: Evidence,
    readonly request: AdviceRequest,
  ) {
    const known = answerable(circuit, request.observations);
    this.readings = known.filter((seen) => seen.kind === 'reading');
    this.known = known;
    this.belief = this.believe(known);
    this.dangers = dangersOf(circuit, known);
    this.candidates = candidatesOf(circuit, request);
    this.classes = this.classesOf();
    this.plan = new LinePlan(circuit, request, hypotheses, this.belief);
  }

  private readonly known: readonly Observation[];

  private believe(observations: readonly Observation[]): Belief {
    return this.evidence.belief(observations);
  }

  /** What would be believed with all readings of one set-up left out. */
  without(key: string): Belief {
    let belief = this.beliefsWithout.get(key);
    if (!belief) {
      belief = this.believe(
        this.known.filter((seen) => seen.kind !== 'reading' || setUpKey(seen) !== key),
      );
      this.beliefsWithout.set(key, belief);
    }
    return belief;
  }

  share(members: readonly number[], belief = this.belief): number {
    return members.reduce((sum, h) => sum + belief.shares[h]!, 0);
  }

  /** Parts of these hypotheses, likeliest first. */
  partsOf(members: readonly number[]): readonly string[] {
    const order = [...members].sort((a, b) => this.belief.shares[b]! - this.belief.shares[a]!);
    return [...new Set(order.flatMap((h) => this.hypotheses[h]!.fault?.part ?? []))];
  }

  row(pair: Pick<Candidate, 'red' | 'black' | 'function' | 'state'>): readonly Prediction[] {
    return this.predictions.readings(pair.state, { ...pair, ohms: this.request.meter.ohms });
  }

  /** What every hypothesis would have shown to the meter that took this reading. */
  rowOf(reading: ReadingObservation): readonly Prediction[] {
    return this.predictions.readings(reading.state, { ...reading, ohms: reading.meter.ohms });
  }

  /** Neighbouring predictions that the meter does not tell apart share a group; lowest volts first. */
  groups(candidate: Candidate): readonly Group[] {
    const row = this.row(candidate);
    const order = [...row.keys()]
      .filter((h) => this.belief.shares[h]! > WORTH_AN_OUTCOME)
      .sort((a, b) => row[a]!.volts - row[b]!.volts);
    const groups: { from: number; to: number; share: number; members: number[] }[] = [];
    let last: Prediction | undefined;
    for (const h of order) {
      const { volts } = row[h]!;
      // Without the spread: a grid of resistances would chain everything from none to full.
      if (!last || this.apart({ ...last, spread: 0 }, { ...row[h]!, spread: 0 })) {
        groups.push({ from: volts, to: volts, share: 0, members: [] });
      }
      const group = groups.at(-1)!;
      group.share += this.belief.shares[h]!;
      group.members.push(h);
      group.to = volts;
      last = row[h]!;
    }
    return groups;
  }

  /** Bits that the reading is expected to tell. */
  bits(groups: readonly Group[]): number {
    return groups.reduce(
      (sum, { share }) => (share > 0 && share < 1 ? sum - share * Math.log2(share) : sum),
      0,
    );
  }

  /** Whether the meter tells these two predictions apart. */
  apart(a: Prediction, b: Prediction): boolean {
    // A floating point may show anything up to its most: only what lies above is told from it.
    if (a.floating && b.floating) return false;
    if (a.floating || b.floating) {
      const other = Math.abs(a.floating ? b.volts : a.volts);
      const most = FLOATING_MOST * this.circuit.nominalVolts;
      return other - most > APART * deviationOf(other, this.request.meter);
    }
    const wider = Math.max(Math.abs(a.volts), Math.abs(b.volts));
    const deviation = Math.hypot(deviationOf(wider, this.request.meter), a.spread, b.spread);
    return Math.abs(a.volts - b.volts) > APART * deviation;
  }

  /** Hypotheses that no candidate tells from the class's likeliest member; likeliest class first. */
  private classesOf(): readonly (readonly number[])[] {
    const rows = this.candidates.map((candidate) => this.row(candidate));
    const order = [...this.belief.shares.keys()]
      .filter((h) => this.belief.shares[h]! > WORTH_A_CLASS)
      .sort((a, b) => this.belief.shares[b]! - this.belief.shares[a]! || a - b);
    const classes: number[][] = [];
    for (const h of order) {
      const own = classes.find(
        ([first]) =>
          (first === 0) === (h === 0) && !rows.some((row) => this.apart(row[first!]!, row[h]!)),
      );
      if (own) own.push(h);
      else classes.push([h]);
    }
    return classes.sort((a, b) => this.share(b) - this.share(a));
  }
}
