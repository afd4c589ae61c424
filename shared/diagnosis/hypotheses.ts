import { singleFaults, type Circuit, type Fault } from '../circuit';

/** Belief before any reading that nothing is wrong now (judgement). */
export const NOTHING_WRONG_PRIOR = 0.02;
/** Belief before any reading that the circuit as drawn does not describe the fault (judgement). */
export const NOT_DESCRIBED_PRIOR = 0.005;

/** What may be the matter. `fault` is absent where nothing is wrong. */
export interface Hypothesis {
  readonly fault?: Fault;
  readonly prior: number;
}

/** Every single fault and *nothing wrong*; with *not described* the priors add up to 1. */
export function hypothesesOf(circuit: Circuit): readonly Hypothesis[] {
  const faults = singleFaults(circuit);
  const sum = faults.reduce((total, { weight }) => total + weight, 0);
  const share = (1 - NOTHING_WRONG_PRIOR - NOT_DESCRIBED_PRIOR) / sum;
  return [
    { prior: NOTHING_WRONG_PRIOR },
    ...faults.map(({ fault, weight }) => ({ fault, prior: weight * share })),
  ];
}
