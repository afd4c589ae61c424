/** A string with one open, as the plan sees it: parts in the order wired, places by number. */
export interface PlanInput {
  /** Belief in each part, in any unit; parts in the order wired. */
  readonly weights: readonly number[];
  /** Places where the cut before part k can be read; entry 0 and the last are the string's ends. */
  readonly cuts: readonly (readonly number[])[];
  /** Places where part k can be measured across; empty: not at all. */
  readonly direct: readonly (readonly number[])[];
  /** From standing at one place to having read at another, minutes; `minutes[from][to]`. */
  readonly minutes: readonly (readonly number[])[];
  /** False: a part that is singled out needs no measurement of its own. */
  readonly confirming?: boolean;
  /** Charged where a part that must be confirmed can't be measured: isolate and measure dead. */
  readonly deadMinutes?: number;
}

export interface ConfirmPlan {
  /**
   * Expected minutes to a confirmed open among parts `from` to `to` (exclusive), standing at a place,
   * times the weight of these parts. Not divided: sums of outcomes need no care for zero.
   */
  cost(from: number, to: number, place: number): number;
  /** Weight of parts `from` to `to`. */
  weight(from: number, to: number): number;
  readonly parts: number;
}

/** A dead measurement after isolation, minutes (judgement: isolate, prove dead, measure, restore). */
export const DEAD_MINUTES = 15;

/**
 * The least expected minutes by cuts and direct measurements of an end part, with travel:
 *
 *     C(i,j,p) = min over tests at a place q of  t(p,q)·W(i,j) + what is left standing at q
 *
 * A cut leaves (i,k) or (k,j); measuring the first or the last part across leaves the rest, or nothing:
 * it splits and confirms at once. With one place, equal costs and no confirmation this is the optimal
 * alphabetic tree. Answers are worked out when asked for and kept: O(n³·places²) in all.
 */
export function confirmPlan(input: PlanInput): ConfirmPlan {
  const { weights, cuts, direct, minutes, confirming = true, deadMinutes = DEAD_MINUTES } = input;
  const size = weights.length;
  const places = minutes.length;
  const upTo = new Float64Array(size + 1);
  weights.forEach((weight, k) => (upTo[k + 1] = upTo[k]! + weight));
  const known = new Float64Array((size + 1) * (size + 1) * Math.max(1, places)).fill(-1);

  const cost = (i: number, j: number, place: number): number => {
    if (j - i < 1) return 0;
    const at = (i * (size + 1) + j) * places + place;
    if (known[at]! < 0) known[at] = j - i === 1 ? confirm(i, place) : divide(i, j, place);
    return known[at]!;
  };

  const confirm = (k: number, place: number): number => {
    if (!confirming) return 0;
    const weight = upTo[k + 1]! - upTo[k]!;
    const least = Math.min(...direct[k]!.map((q) => minutes[place]![q]!));
    return weight * (Number.isFinite(least) ? least : deadMinutes);
  };

  const divide = (i: number, j: number, place: number): number => {
    const whole = upTo[j]! - upTo[i]!;
    let least = Infinity;
    for (let k = i + 1; k < j; k++) {
      for (const q of cuts[k]!) {
        const first = minutes[place]![q]! * whole;
        // What follows costs at least nothing: a dear way there is not looked at further.
        if (first < least) least = Math.min(least, first + cost(i, k, q) + cost(k, j, q));
      }
    }
    if (confirming) {
      for (const q of direct[i]!) {
        const first = minutes[place]![q]! * whole;
        if (first < least) least = Math.min(least, first + cost(i + 1, j, q));
      }
      for (const q of direct[j - 1]!) {
        const first = minutes[place]![q]! * whole;
        if (first < least) least = Math.min(least, first + cost(i, j - 1, q));
      }
    }
    // Parts that no reading tells apart: measured dead, one after the other.
    return Number.isFinite(least) ? least : whole * deadMinutes;
  };

  return { cost, weight: (from, to) => upTo[to]! - upTo[from]!, parts: size };
}
