import type { Circuit, Fault, LiftState } from '@shared/circuit';
import { solve } from '@shared/solver';
import type { PracticeReading } from './engine-port';

/** What the meter's display rounds to, volts. */
const DISPLAY_STEP = 0.1;
const shown = (volts: number): number => {
  const rounded = Math.round(volts / DISPLAY_STEP) * DISPLAY_STEP;
  // No "-0.0", and no digits that a display would not have.
  return Number((rounded + 0).toFixed(1)) || 0;
};

/** Solves the lift with its hidden faults and puts the probes on. */
export function practiceReading(
  circuit: Circuit,
  state: LiftState,
  faults: readonly Fault[],
  { red, black, ohms }: { readonly red: string; readonly black: string; readonly ohms: number },
): PracticeReading {
  const solution = solve(circuit, state, faults);
  const { mean, ripple } = solution.read({ red, black, meterOhms: ohms });
  return { dcVolts: shown(mean), acVolts: shown(ripple), relays: solution.relays };
}
