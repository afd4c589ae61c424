import { completeState, liftStateKey, type Circuit, type Fault, type LiftState } from '../circuit';
import { answerable } from './answerable';
import { setUpKey, type Belief } from './belief';
import { Evidence } from './evidence';
import { deviationOf, deviationsOff } from './likelihood';
import type { MeterFunction, Observation, ReadingObservation } from './observation';
import { Predictions } from './predictions';

/** What a point that was read before the repair should read now. */
export interface PointAfterRepair {
  readonly red: string;
  readonly black: string;
  readonly function: MeterFunction;
  readonly state: LiftState;
  /** Id of the latest reading of it before the repair, and its volts. */
  readonly observation: string;
  readonly before: number;
  /** Volts on a string that is whole, with the supply as the readings made it. */
  readonly volts: number;
  /** What still counts as that, volts. */
  readonly fromVolts: number;
  readonly toVolts: number;
  /** It must change: reading it again tells whether the repair holds. */
  readonly changes: boolean;
  /** Decided by leakage, as a point beyond an open contact is: no value proves anything. */
  readonly floating: boolean;
}

/** So many deviations around the value count as the value; beyond, as another. */
const WITHIN = 3;

/**
 * The points read before a repair with what they should read now that the finding is mended: the belief
 * in the supply that the readings make under the finding, carried over to a healthy lift.
 * Observations that the circuit can't answer are left out; never throws.
 */
export function afterRepair(
  circuit: Circuit,
  observations: readonly Observation[],
  finding: Fault,
): readonly PointAfterRepair[] {
  const hypotheses = [{ fault: finding, prior: 1 }];
  const known = answerable(circuit, observations);
  const predictions = new Predictions(circuit, hypotheses);
  const { supply } = new Evidence(circuit, hypotheses, predictions).belief(known);
  const healthy = new Predictions(circuit, [{ prior: 1 }]);
  const latest = new Map<string, ReadingObservation>();
  for (const seen of known) {
    if (seen.kind !== 'reading') continue;
    latest.set(`${setUpKey(seen)} ${liftStateKey(circuit, seen.state)}`, seen);
  }
  return [...latest.values()].map((reading) => pointOf(circuit, reading, healthy, supply));
}

function pointOf(
  circuit: Circuit,
  reading: ReadingObservation,
  healthy: Predictions,
  supply: Belief['supply'],
): PointAfterRepair {
  const { red, black, function: range, state, meter } = reading;
  const predicted = healthy.readings(state, { red, black, function: range, ohms: meter.ohms })[0]!;
  const volts = predicted.volts * supply.mean;
  const deviation = Math.hypot(deviationOf(volts, meter), predicted.volts * supply.deviation);
  return {
    red,
    black,
    function: range,
    state: completeState(circuit, state),
    observation: reading.id,
    before: reading.volts,
    volts,
    fromVolts: volts - WITHIN * deviation,
    toVolts: volts + WITHIN * deviation,
    changes: !predicted.floating && deviationsOff(reading.volts, volts, meter) > WITHIN,
    floating: predicted.floating,
  };
}
