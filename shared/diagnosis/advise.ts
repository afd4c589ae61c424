import { finestSections, type Circuit, type Fault, type RelayPosition } from '../circuit';
import type {
  Advice,
  AdviceRequest,
  Danger,
  Reason,
  Step,
  Stopping,
  Suggestion,
  Suspect,
} from './advice';
import { beliefOf, setUpKey, type Belief } from './belief';
import { candidatesOf, functionOf, type Candidate } from './candidates';
import { dangersOf } from './danger';
import { hypothesesOf, type Hypothesis } from './hypotheses';
import { deviationOf } from './likelihood';
import type { Observation, ReadingObservation } from './observation';
import { Predictions, type Prediction } from './predictions';

/** Version of the engine, kept with the advice that was shown. */
export const ENGINE = '1';
/** Condition (b) of the stopping rule. */
export const BELIEVED = 0.95;
/** Condition (c): what stays with any one set-up left out. */
export const WITHOUT_ONE_PAIR = 0.9;
/** Condition (d): the most that may be believed of *not described*. */
export const MOST_NOT_DESCRIBED = 0.02;
/** Two predictions this many deviations apart are told apart. */
export const APART = 3;
/** Smallest ranges of a usual meter, volts. */
const RANGES = [2, 20, 200, 600, 1000];
const MOST_SUSPECTS = 10;
const MOST_LEFT = 6;

export interface Engine {
  /** The same answer to the same request. */
  advise(request: AdviceRequest): Advice;
}

export function createEngine(circuit: Circuit): Engine {
  const hypotheses = hypothesesOf(circuit);
  const predictions = new Predictions(circuit, hypotheses);
  return {
    advise: (request) => new Consultation(circuit, hypotheses, predictions, request).advice(),
  };
}

const reason = (code: string, more: Partial<Reason> = {}): Reason => ({
  code,
  tags: [],
  parts: [],
  numbers: {},
  observations: [],
  ...more,
});

/** One request's working: belief, classes, and the step that follows. */
class Consultation {
  private readonly candidates: readonly Candidate[];
  private readonly belief: Belief;
  private readonly dangers: readonly Danger[];
  private readonly readings: readonly ReadingObservation[];
  private readonly classes: readonly (readonly number[])[];

  constructor(
    private readonly circuit: Circuit,
    private readonly hypotheses: readonly Hypothesis[],
    private readonly predictions: Predictions,
    private readonly request: AdviceRequest,
  ) {
    this.candidates = candidatesOf(circuit, request);
    this.belief = this.believe(request.observations);
    this.dangers = dangersOf(circuit, request.observations);
    this.readings = request.observations.filter((seen) => seen.kind === 'reading');
    this.classes = this.classesOf();
  }

  advice(): Advice {
    const suspects = this.suspects();
    const stopping = this.stopping();
    return {
      engine: ENGINE,
      step: this.step(stopping),
      stopping,
      suspects,
      cleared: [],
      sections: this.sections(),
      notDescribed: this.belief.notDescribed,
      nothingWrong: this.belief.shares[0]!,
      supplyVolts: { mean: this.circuit.nominalVolts, deviation: this.circuit.nominalVolts * 0.1 },
    };
  }

  private believe(observations: readonly Observation[]): Belief {
    return beliefOf(this.circuit, this.hypotheses, this.predictions, observations);
  }

  private row(pair: Candidate): readonly Prediction[] {
    return this.predictions.readings(this.request.state, {
      ...pair,
      ohms: this.request.meter.ohms,
    });
  }

  private apart(a: Prediction, b: Prediction): boolean {
    if (a.floating || b.floating) return false;
    const wider = Math.max(Math.abs(a.volts), Math.abs(b.volts));
    return Math.abs(a.volts - b.volts) > APART * deviationOf(wider, this.request.meter);
  }

  /** Hypotheses worth a thousandth that no candidate tells from the class's likeliest member. */
  private classesOf(): readonly (readonly number[])[] {
    const rows = this.candidates.map((candidate) => this.row(candidate));
    const order = [...this.belief.shares.keys()]
      .filter((h) => this.belief.shares[h]! > 1e-3)
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
    const weight = (members: readonly number[]) => this.share(this.belief, members);
    return classes.sort((a, b) => weight(b) - weight(a));
  }

  private share(belief: Belief, members: readonly number[]): number {
    return members.reduce((sum, h) => sum + belief.shares[h]!, 0);
  }

  private suspectOf(members: readonly number[]): Suspect {
    const faults = members
      .map((h) => this.hypotheses[h]!.fault)
      .filter((fault): fault is Fault => fault !== undefined);
    const observations = this.readings.map(({ id }) => id);
    return {
      faults,
      probability: this.share(this.belief, members),
      because: [reason('fits the readings', { observations })],
    };
  }

  private suspects(): Suspect[] {
    return this.classes
      .filter(([first]) => first !== 0)
      .slice(0, MOST_SUSPECTS)
      .map((members) => this.suspectOf(members));
  }

  private stopping(): Stopping {
    const top = this.classes[0] ?? [];
    const without = [...new Set(this.readings.map(setUpKey))].map((key) =>
      this.believe(
        this.request.observations.filter(
          (seen) => seen.kind !== 'reading' || setUpKey(seen) !== key,
        ),
      ),
    );
    return {
      direct: this.direct(top) !== undefined,
      believed: this.share(this.belief, top) >= BELIEVED,
      withoutAnyOnePair: without.every((belief) => this.share(belief, top) >= WITHOUT_ONE_PAIR),
      described: this.belief.notDescribed < MOST_NOT_DESCRIBED,
      noDanger: this.dangers.length === 0,
    };
  }

  /** A reading with both probes on a suspected part's own ends. */
  private direct(members: readonly number[]): string | undefined {
    const parts = new Set(members.map((h) => this.hypotheses[h]!.fault?.part));
    return this.readings.find(({ red, black }) =>
      this.circuit.parts.some(
        (part) =>
          parts.has(part.name) &&
          'between' in part &&
          part.between.includes(red as never) &&
          part.between.includes(black as never),
      ),
    )?.id;
  }

  private step(stopping: Stopping): Step {
    if (this.dangers.length > 0) return { kind: 'stop', dangers: [...this.dangers] };
    const proof = this.proof();
    if (proof) return { kind: 'suggestion', suggestion: proof };
    const top = this.classes[0] ?? [];
    const sure = stopping.believed && stopping.described;
    if (sure && top[0] === 0 && stopping.withoutAnyOnePair) {
      return { kind: 'nothing wrong', because: [reason('all readings are healthy')] };
    }
    const next = this.best(sure ? top : undefined);
    const direct = this.direct(top);
    if (sure && direct !== undefined && (stopping.withoutAnyOnePair || !next)) {
      return {
        kind: 'finding',
        suspect: this.suspectOf(top),
        restsOnOneReading: !stopping.withoutAnyOnePair,
        directObservation: direct,
      };
    }
    return next
      ? { kind: 'suggestion', suggestion: next }
      : { kind: 'exhausted', because: [reason('no reading tells more')] };
  }

  /** A free look first, then the supply and the return. */
  private proof(): Suggestion | undefined {
    const { observations, unreachable, state } = this.request;
    const seen = new Set(observations.map((each) => (each.kind === 'relay' ? each.relay : '')));
    const unseen = this.circuit.parts.find(
      ({ kind, name }) => kind === 'coil' && !seen.has(name) && !unreachable.includes(name),
    );
    if (unseen) return this.look(unseen.name);
    const line = this.circuit.strings[0]!;
    const taken = (black: string) =>
      this.readings.some((each) => each.red === line.from && each.black === black);
    for (const black of [line.return, line.supplyReturn]) {
      const candidate = this.candidates.find((c) => c.red === line.from && c.black === black);
      if (taken(black) || !candidate) continue;
      const purpose = black === line.return ? 'prove supply' : 'prove return';
      return this.suggestion(candidate, purpose, state);
    }
    return undefined;
  }

  private look(relay: string): Suggestion {
    const positions = this.predictions.relay(this.request.state, relay);
    const chance = (wanted: RelayPosition) =>
      positions.reduce((sum, p, h) => sum + (p === wanted ? this.belief.shares[h]! : 0), 0);
    return {
      kind: 'relay',
      purpose: 'locate',
      place: this.request.place,
      relay,
      state: this.request.state,
      minutes: 0,
      outcomes: (['in', 'out'] as const).map((band) => ({
        band,
        probability: chance(band),
        leaves: [],
      })),
      because: [reason('looking is free', { parts: [relay] })],
      cautions: [],
    };
  }

  /** The most bits for a minute; once sure, the cheapest reading across a suspect, or a different one. */
  private best(sure: readonly number[] | undefined): Suggestion | undefined {
    const range = functionOf(this.circuit);
    const fresh = this.candidates.filter(
      ({ red, black }) =>
        !this.readings.some((r) => r.red === red && r.black === black && r.function === range),
    );
    if (sure && this.direct(sure) === undefined) {
      const ends = fresh.filter((candidate) => candidate.across && this.touches(candidate, sure));
      const cheapest = ends.sort((a, b) => a.minutes - b.minutes)[0];
      if (cheapest) return this.suggestion(cheapest, 'confirm', this.request.state);
    }
    let best: Candidate | undefined;
    let most = 0;
    for (const candidate of fresh) {
      const rate = this.bits(candidate) / Math.max(candidate.minutes, 0.1);
      if (rate > most * (1 + 1e-9)) [best, most] = [candidate, rate];
    }
    if (!best || most < 1e-4) return undefined;
    return this.suggestion(best, sure ? 'different' : 'locate', this.request.state);
  }

  private touches({ red, black }: Candidate, members: readonly number[]): boolean {
    const names = new Set(members.map((h) => this.hypotheses[h]!.fault?.part));
    return this.circuit.parts.some(
      (part) =>
        names.has(part.name) &&
        'between' in part &&
        part.between[0] === red &&
        part.between[1] === black,
    );
  }

  private groups(
    candidate: Candidate,
  ): readonly { volts: number; share: number; members: number[] }[] {
    const row = this.row(candidate);
    const order = [...row.keys()]
      .filter((h) => !row[h]!.floating && this.belief.shares[h]! > 1e-6)
      .sort((a, b) => row[a]!.volts - row[b]!.volts);
    const groups: { volts: number; share: number; members: number[] }[] = [];
    let last: Prediction | undefined;
    for (const h of order) {
      if (!last || this.apart(last, row[h]!))
        groups.push({ volts: row[h]!.volts, share: 0, members: [] });
      const group = groups.at(-1)!;
      group.share += this.belief.shares[h]!;
      group.members.push(h);
      last = row[h]!;
    }
    return groups;
  }

  private bits(candidate: Candidate): number {
    return this.groups(candidate).reduce(
      (sum, { share }) => (share > 0 && share < 1 ? sum - share * Math.log2(share) : sum),
      0,
    );
  }

  private suggestion(
    candidate: Candidate,
    purpose: Suggestion['purpose'],
    state: Suggestion['state'],
  ): Suggestion {
    const { red, black, place, minutes } = candidate;
    const full = this.circuit.nominalVolts;
    const shaft = this.circuit.places.find(({ name }) => name === place)?.shaft ?? false;
    return {
      kind: 'reading',
      purpose,
      place,
      red,
      black,
      function: candidate.function,
      rangeVolts: RANGES.find((range) => range >= full * 1.2) ?? RANGES.at(-1),
      state,
      minutes,
      outcomes: this.groups(candidate).map(({ volts, share, members }) => ({
        band:
          Math.abs(volts) > 0.85 * full
            ? 'full'
            : Math.abs(volts) < 0.05 * full
              ? 'none'
              : 'between',
        probability: share,
        leaves: [...new Set(members.flatMap((h) => this.hypotheses[h]!.fault?.part ?? []))].slice(
          0,
          MOST_LEFT,
        ),
      })),
      because: [
        reason(purpose, { tags: [red, black], numbers: { bits: this.bits(candidate), minutes } }),
      ],
      cautions: [
        'live terminals',
        'may start when cleared',
        ...(shaft ? (['shaft entry'] as const) : []),
      ],
    };
  }

  private sections(): Advice['sections'] {
    return this.circuit.strings.flatMap((line) =>
      finestSections(this.circuit, line).map(({ from, to, parts }) => {
        const probability = this.belief.shares.reduce((sum, share, h) => {
          const part = this.hypotheses[h]!.fault?.part;
          return part !== undefined && parts.includes(part) ? sum + share : sum;
        }, 0);
        const state = probability > 0.2 ? 'suspected' : probability < 0.001 ? 'cleared' : 'unknown';
        return { from, to, parts: [...parts], probability, state };
      }),
    );
  }
}
