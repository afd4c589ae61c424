import type { Circuit } from '../circuit';
import { NOT_DESCRIBED_PRIOR, type Hypothesis } from './hypotheses';
import { anywhere, readingLikelihood, relayLikelihood } from './likelihood';
import type { Observation, ReadingObservation } from './observation';
import type { Predictions } from './predictions';

export interface Belief {
  /** In the order of the hypotheses; with `notDescribed` they add up to 1. */
  readonly shares: readonly number[];
  readonly notDescribed: number;
}

/** The same text for readings that a persistent slip would repeat: pair, function and meter. */
export function setUpKey({ red, black, function: range, meter }: ReadingObservation): string {
  return [red, black, range, meter.kind, meter.ohms].join(' ');
}

/**
 * What to believe after the observations. Slips are half persistent: a repeat of a set-up is counted
 * once, by its latest value, so that agreement with oneself proves nothing.
 */
export function beliefOf(
  circuit: Circuit,
  hypotheses: readonly Hypothesis[],
  predictions: Predictions,
  observations: readonly Observation[],
): Belief {
  const scale = Math.max(circuit.nominalVolts, 1);
  const logs = hypotheses.map(({ prior }) => Math.log(prior));
  let other = Math.log(NOT_DESCRIBED_PRIOR);
  for (const seen of latest(observations)) {
    if (seen.kind === 'reading') {
      const row = predictions.readings(seen.state, { ...seen, ohms: seen.meter.ohms });
      row.forEach((predicted, h) => {
        logs[h]! += Math.log(readingLikelihood(seen.volts, predicted, seen.meter, scale));
      });
      other += Math.log(anywhere(scale));
    } else if (seen.kind === 'relay') {
      predictions.relay(seen.state, seen.relay).forEach((position, h) => {
        logs[h]! += Math.log(relayLikelihood(seen.position, position));
      });
      other += Math.log(0.5);
    }
  }
  const top = Math.max(other, ...logs);
  const weights = logs.map((log) => Math.exp(log - top));
  const rest = Math.exp(other - top);
  const sum = weights.reduce((total, weight) => total + weight, rest);
  return { shares: weights.map((weight) => weight / sum), notDescribed: rest / sum };
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
