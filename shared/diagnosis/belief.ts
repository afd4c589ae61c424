import type { Circuit } from '../circuit';
import { NOT_DESCRIBED_PRIOR, type Hypothesis } from './hypotheses';
import { anywhere, readingLikelihood, relayLikelihood } from './likelihood';
import type { Observation, ReadingObservation } from './observation';
import type { Predictions } from './predictions';

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

/** The same text for readings that a persistent slip would repeat: pair, function and meter. */
export function setUpKey({ red, black, function: range, meter }: ReadingObservation): string {
  return [red, black, range, meter.kind, meter.ohms].join(' ');
}

/**
 * What to believe after the observations, with the supply's volts unknown and learnt: every hypothesis is
 * weighed at every supply factor, and the factors are summed out. Slips are half persistent: a repeat of
 * a set-up is counted once, by its latest value, so that agreement with oneself proves nothing.
 */
export function beliefOf(
  circuit: Circuit,
  hypotheses: readonly Hypothesis[],
  predictions: Predictions,
  observations: readonly Observation[],
): Belief {
  const scale = Math.max(circuit.nominalVolts, 1);
  const width = SUPPLY_FACTORS.length;
  const before = SUPPLY_FACTORS.map((factor) => -0.5 * ((factor - 1) / SUPPLY_DEVIATION) ** 2);
  const evidence = before.reduce((sum, log) => sum + Math.exp(log), 0);
  const logs = new Float64Array(hypotheses.length * width);
  hypotheses.forEach(({ prior }, h) => {
    before.forEach((log, s) => (logs[h * width + s] = Math.log(prior / evidence) + log));
  });
  let other = Math.log(NOT_DESCRIBED_PRIOR);
  for (const seen of latest(observations)) {
    if (seen.kind === 'reading') {
      const row = predictions.readings(seen.state, { ...seen, ohms: seen.meter.ohms });
      row.forEach((predicted, h) => {
        SUPPLY_FACTORS.forEach((factor, s) => {
          const scaled = { ...predicted, volts: predicted.volts * factor };
          const likelihood = readingLikelihood(seen.volts, scaled, seen.meter, scale);
          logs[h * width + s]! += Math.log(likelihood);
        });
      });
      other += Math.log(anywhere(scale));
    } else if (seen.kind === 'relay') {
      predictions.relay(seen.state, seen.relay).forEach((position, h) => {
        const log = Math.log(relayLikelihood(seen.position, position));
        for (let s = 0; s < width; s++) logs[h * width + s]! += log;
      });
      other += Math.log(0.5);
    }
  }
  return normalised(logs, other, hypotheses.length);
}

function normalised(logs: Float64Array, other: number, size: number): Belief {
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

function latest(observations: readonly Observation[]): readonly Observation[] {
  const kept = new Map<string, Observation>();
  for (const seen of observations) {
    const state = JSON.stringify(seen.state);
    if (seen.kind === 'reading') kept.set(`${setUpKey(seen)} ${state}`, seen);
    else if (seen.kind === 'relay') kept.set(`relay ${seen.relay} ${state}`, seen);
  }
  return [...kept.values()];
}
