import type { ReadingObservation } from './observation';

export interface Belief {
  /** In the order of the hypotheses; with `notDescribed` they add up to 1. */
  readonly shares: readonly number[];
  readonly notDescribed: number;
  /** Supply over the supply as drawn, as the readings make it: mean and one standard deviation. */
  readonly supply: { readonly mean: number; readonly deviation: number };
}

/** Supply factors that are weighed: mains and taps differ from the drawing (judgement, 0.88 to 1.12). */
export const SUPPLY_FACTORS = Array.from({ length: 13 }, (_, k) => 0.88 + 0.02 * k);
/** One standard deviation of the supply factor before any reading (judgement). */
export const SUPPLY_DEVIATION = 0.05;

/**
 * The same text for readings that a persistent slip would repeat: pair of tags whichever way round,
 * function and meter.
 */
export function setUpKey({ red, black, function: range, meter }: ReadingObservation): string {
  return [...[red, black].sort(), range, meter.kind, meter.ohms].join(' ');
}

/**
 * The belief that unnormalised logarithms make: `logs[h · factors + s]` of hypothesis h at supply factor s,
 * `other` of *not described*.
 */
export function normalised(logs: Float64Array, other: number, size: number): Belief {
  const width = SUPPLY_FACTORS.length;
  const top = logs.reduce((most, log) => Math.max(most, log), other);
  const shares = new Array<number>(size).fill(0);
  const factors = new Array<number>(width).fill(0);
  logs.forEach((log, at) => {
    const weight = Math.exp(log - top);
    shares[Math.floor(at / width)]! += weight;
    factors[at % width]! += weight;
  });
  const rest = Math.exp(other - top);
  const described = shares.reduce((sum, weight) => sum + weight, 0);
  const sum = described + rest;
  return {
    shares: shares.map((weight) => weight / sum),
    notDescribed: rest / sum,
    supply: momentsOf(factors, described),
  };
}

/** Mean and deviation of the supply factor; as before any reading where nothing described is left. */
function momentsOf(factors: readonly number[], described: number): Belief['supply'] {
  if (!(described > 0)) return { mean: 1, deviation: SUPPLY_DEVIATION };
  const mean = factors.reduce((sum, w, s) => sum + w * SUPPLY_FACTORS[s]!, 0) / described;
  const square = factors.reduce((sum, w, s) => sum + w * (SUPPLY_FACTORS[s]! - mean) ** 2, 0);
  return { mean, deviation: Math.sqrt(square / described) };
}
