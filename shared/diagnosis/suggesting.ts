import type { LiftState, RelayPosition } from '../circuit';
import type { Suggestion } from './advice';
import { candidatesOf, type Candidate } from './candidates';
import { cautionsOf } from './cautions';
import type { Consultation, Group } from './consultation';
import { forbidden } from './forbidden';
import { outcomesOf } from './outcomes';
import { setUpKey } from './belief';
import { reason } from './reasons';
import { pillarsOf } from './stopping';

/** Smallest ranges of a usual meter, volts. */
const RANGES = [2, 20, 200, 600, 1000];
/** Room over the expected volts on the range. */
const HEADROOM = 1.2;
/** A reading that tells less, in bits, is not worth a walk. */
const LEAST_BITS = 1e-4;
/** Share of the rivals that a different reading must tell from the finding, at least and enough. */
const LEAST_TOLD = 0.05;
const ENOUGH_TOLD = 0.9;
/** Belief in an open return from which on the return is treated as live. */
const DOUBTFUL = 0.05;

/** A candidate with what it would tell and the minutes it leads to. */
interface Scored {
  readonly candidate: Candidate;
  readonly groups: readonly Group[];
  /** Expected minutes to a confirmed finding when this is read next. */
  readonly minutes: number;
}

/** Makes suggestions out of what one consultation knows. */
export class Suggesting {
  constructor(private readonly about: Consultation) {}

  /** A free look first, then the supply and the return; undefined once they are proven. */
  proof(): Suggestion | undefined {
    const { circuit, candidates, readings, request } = this.about;
    const seen = new Set(
      request.observations.map((each) => (each.kind === 'relay' ? each.relay : '')),
    );
    const unseen = circuit.parts.find(
      ({ kind, name }) => kind === 'coil' && !seen.has(name) && !request.unreachable.includes(name),
    );
    if (unseen) return this.look(unseen.name);
    const line = circuit.strings[0]!;
    const taken = (black: string) =>
      readings.some(
        (each) =>
          (each.red === line.from && each.black === black) ||
          (each.black === line.from && each.red === black),
      );
    for (const black of [line.return, line.supplyReturn]) {
      const candidate = candidates.find((c) => c.red === line.from && c.black === black);
      if (taken(black) || !candidate) continue;
      const purpose = black === line.return ? 'prove supply' : 'prove return';
      return this.suggestion(candidate, purpose);
    }
    return undefined;
  }

  /** The reading after which the least minutes are expected; undefined where none would tell anything. */
  next(): { suggestion: Suggestion; minutes: number } | undefined {
    const { circuit, request } = this.about;
    const here = this.best(this.fresh(this.about.candidates));
    const best =
      here ??
      this.best(
        this.otherStates().flatMap((state) => this.fresh(candidatesOf(circuit, request, state))),
      );
    return best && { suggestion: this.suggestion(best.candidate, 'locate'), minutes: best.minutes };
  }

  /**
   * The cheapest different reading that would bear the finding without its pillar: it tells the finding's
   * class from most of what would be believed if the pillar were left out.
   */
  different(top: readonly number[]): Suggestion | undefined {
    const [pillar] = pillarsOf(this.about, top);
    if (!pillar) return undefined;
    const rivals = this.about.without(setUpKey(pillar)).shares;
    const inTop = new Set(top);
    const all = rivals.reduce((sum, share, h) => (inTop.has(h) ? sum : sum + share), 0);
    let best: { candidate: Candidate; told: number } | undefined;
    for (const candidate of this.fresh(this.about.candidates)) {
      const row = this.about.row(candidate);
      const told =
        rivals.reduce(
          (sum, share, h) =>
            !inTop.has(h) && this.about.apart(row[top[0]!]!, row[h]!) ? sum + share : sum,
          0,
        ) / all;
      if (told < LEAST_TOLD) continue;
      const rate = (each: { candidate: Candidate; told: number }) =>
        Math.min(each.told, ENOUGH_TOLD) / each.candidate.minutes;
      if (!best || rate({ candidate, told }) > rate(best)) best = { candidate, told };
    }
    return best && this.suggestion(best.candidate, 'different');
  }

  /** The cheapest reading across a part of these hypotheses that was not measured yet. */
  across(members: readonly number[]): Suggestion | undefined {
    const parts = new Set(this.about.partsOf(members));
    const ends = this.fresh(this.about.candidates)
      .filter(({ across }) => across.some((part) => parts.has(part)))
      .sort((a, b) => a.minutes - b.minutes);
    return ends[0] && this.suggestion(ends[0], 'confirm');
  }

  /** The same two probes once more. */
  repeat(red: string, black: string): Suggestion | undefined {
    const candidate = this.about.candidates.find((c) => c.red === red && c.black === black);
    return candidate && this.suggestion(candidate, 'repeat');
  }

  private fresh(candidates: readonly Candidate[]): readonly Candidate[] {
    const key = (state: LiftState) => JSON.stringify(state);
    return candidates.filter(
      ({ red, black, function: range, state }) =>
        !this.about.readings.some(
          (r) =>
            ((r.red === red && r.black === black) || (r.red === black && r.black === red)) &&
            r.function === range &&
            key({ ...state, ...r.state }) === key(state),
        ),
    );
  }

  /** States that differ from the present one in one condition. */
  private otherStates(): readonly LiftState[] {
    const { circuit, request } = this.about;
    return circuit.conditions.flatMap(({ name, values }) =>
      values
        .filter((value) => value !== request.state[name])
        .map((value) => ({ ...request.state, [name]: value })),
    );
  }

  /** Of the plan's tests; where those tell nothing more, of any part measured by itself. */
  private best(candidates: readonly Candidate[]): Scored | undefined {
    const all = [...this.about.hypotheses.keys()];
    const ofPlan = ({ across }: Candidate) =>
      across.every((part) => this.about.plan.tests(part, all));
    return (
      this.bestOf(candidates.filter(ofPlan)) ??
      this.bestOf(candidates.filter((candidate) => !ofPlan(candidate)))
    );
  }

  private bestOf(candidates: readonly Candidate[]): Scored | undefined {
    let best: Scored | undefined;
    for (const candidate of candidates) {
      const groups = this.about.groups(candidate);
      if (this.about.bits(groups) < LEAST_BITS) continue;
      const minutes = this.minutesOf(candidate, groups);
      if (!best || minutes < best.minutes - 1e-9) best = { candidate, groups, minutes };
    }
    return best;
  }

  /** This reading's minutes and, for each outcome, what the plan expects from there. */
  private minutesOf(candidate: Candidate, groups: readonly Group[]): number {
    const { plan } = this.about;
    const none = new Set<string>();
    const total = groups.reduce((sum, { share }) => sum + share, 0);
    const togo = groups.reduce((sum, { members, from, to }) => {
      // Volts across a part, where they can only come from its own fault, measure it directly.
      const parts = this.about.partsOf(members);
      const live = Math.abs(from + to) / 2 > this.about.circuit.nominalVolts / 2;
      const measured =
        live && parts.length > 0 && parts.every((part) => candidate.across.includes(part));
      return sum + plan.cost(members, candidate.place, measured ? new Set(parts) : none);
    }, 0);
    return candidate.minutes + (total > 0 ? togo / total : 0);
  }

  private look(relay: string): Suggestion {
    const { belief, predictions, request } = this.about;
    const positions = predictions.relay(request.state, relay);
    const members = (wanted: RelayPosition) =>
      [...positions.keys()].filter((h) => positions[h] === wanted && belief.shares[h]! > 0);
    return {
      kind: 'relay',
      purpose: 'locate',
      place: request.place,
      relay,
      state: { ...request.state },
      minutes: 0,
      outcomes: (['in', 'out'] as const).map((band) => {
        const inside = members(band);
        const stretch = this.about.plan.stretchOf(inside);
        return {
          band,
          probability: this.about.share(inside),
          leaves: this.about.partsOf(inside).slice(0, 6),
          ...(stretch ? { stretch: [stretch[0], stretch[1]] as [string, string] } : {}),
        };
      }),
      because: [reason('looking is free', { parts: [relay] })],
      cautions: [],
    };
  }

  private suggestion(candidate: Candidate, purpose: Suggestion['purpose']): Suggestion {
    const { circuit, request } = this.about;
    const { red, black, place, minutes, state } = candidate;
    const groups = this.about.groups(candidate);
    const outcomes = outcomesOf(this.about, groups);
    const changed = circuit.conditions.filter(({ name }) => state[name] !== request.state[name]);
    const suggestion: Suggestion = {
      kind: 'reading',
      purpose,
      place,
      red,
      black,
      function: candidate.function,
      rangeVolts: this.rangeOf(candidate),
      state: { ...state },
      minutes,
      outcomes,
      because: [
        ...this.halves(purpose, groups),
        reason(purpose, {
          tags: [red, black],
          numbers: { bits: this.about.bits(groups), minutes },
        }),
        ...changed.map(({ name }) => reason('condition', { parts: [`${name}: ${state[name]}`] })),
      ],
      cautions: cautionsOf(circuit, candidate, {
        changesState: changed.length > 0,
        returnDoubtful: this.returnDoubtful(),
      }),
    };
    const broken = forbidden(circuit, request, suggestion);
    if (broken) throw new Error(`forbidden: ${broken}`);
    return suggestion;
  }

  /** The smallest range that takes what any hypothesis would show here, and the supply. */
  private rangeOf(candidate: Candidate): number {
    const shown = this.about.row(candidate).map(({ volts }) => Math.abs(volts));
    const most = shown.reduce((a, b) => Math.max(a, b), this.about.circuit.nominalVolts);
    return RANGES.find((range) => range >= most * HEADROOM) ?? RANGES.at(-1)!;
  }

  /** The two largest shares in 100, where the reading divides what is left. */
  private halves(purpose: Suggestion['purpose'], groups: readonly Group[]) {
    const shares = groups.map(({ share }) => Math.round(share * 100)).sort((a, b) => b - a);
    const [left = 0, right = 0] = shares;
    return purpose === 'locate' && right > 0
      ? [reason('halves what is left', { numbers: { left, right } })]
      : [];
  }

  private returnDoubtful(): boolean {
    const { circuit, hypotheses, belief } = this.about;
    const { return: back, supplyReturn } = circuit.strings[0]!;
    const wire = circuit.parts.find(
      (part) =>
        'between' in part &&
        part.between.includes(back as never) &&
        part.between.includes(supplyReturn as never),
    );
    return hypotheses.some(
      ({ fault }, h) =>
        fault?.part === wire?.name && fault?.mode === 'open' && belief.shares[h]! > DOUBTFUL,
    );
  }
}
