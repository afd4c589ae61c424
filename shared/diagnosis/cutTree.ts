/** A plan of cuts: its expected cost with weights as given, and where it cuts first (parts before it). */
export interface CutPlan {
  readonly cost: number;
  readonly first: number;
}

/**
 * The best order of cuts of one string, without travel and without confirmation. A cut after part k
 * tells whether the culprit is before or behind it: C(i,j) = min over k of c(k)·W(i,j) + C(i,k) + C(k,j).
 * `costs[k - 1]` is the cost of the cut after k parts; by default each costs 1. O(n³).
 */
export function bestCuts(weights: readonly number[], costs?: readonly number[]): CutPlan {
  const size = weights.length;
  const upTo = [0];
  for (const weight of weights) upTo.push(upTo.at(-1)! + weight);
  const best = Array.from({ length: size + 1 }, () => new Float64Array(size + 1));
  let first = 0;
  for (let length = 2; length <= size; length++) {
    for (let i = 0; i + length <= size; i++) {
      const j = i + length;
      let least = Infinity;
      for (let k = i + 1; k < j; k++) {
        const cost = (costs?.[k - 1] ?? 1) * (upTo[j]! - upTo[i]!) + best[i]![k]! + best[k]![j]!;
        if (cost < least) [least, first] = [cost, k];
      }
      best[i]![j] = least;
    }
  }
  return { cost: size > 0 ? best[0]![size]! : 0, first };
}
