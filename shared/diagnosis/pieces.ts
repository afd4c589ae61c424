import {
  completeState,
  liftStateKey,
  type Circuit,
  type LiftState,
  type RelayPosition,
} from '../circuit';
import { setUpKey } from './belief';
import { deviationOf } from './likelihood';
import type { Meter, MeterFunction, Observation, ReadingObservation } from './observation';

/** What one set-up showed in one lift state, its repeats taken together. */
export interface ReadingPiece {
  readonly kind: 'reading';
  readonly red: string;
  readonly black: string;
  readonly function: MeterFunction;
  readonly meter: Meter;
  readonly state: LiftState;
  /** The middle one of the values that agree. */
  readonly volts: number;
  /** How many values agree. */
  readonly times: number;
}

export interface RelayPiece {
  readonly kind: 'relay';
  readonly relay: string;
  readonly position: RelayPosition;
  readonly state: LiftState;
}

/** Two values of one set-up this many deviations apart do not agree. */
const DISAGREE = 3 * Math.SQRT2;

/**
 * What the observations say, each thing once and in no order: the same for any order of observations.
 * Lift states are complete, so that an unsaid condition is the same as one said to be at rest.
 */
export function pieces(
  circuit: Circuit,
  observations: readonly Observation[],
): readonly (ReadingPiece | RelayPiece)[] {
  const readings = new Map<string, ReadingObservation[]>();
  const relays = new Map<string, RelayPiece>();
  for (const seen of observations) {
    const at = liftStateKey(circuit, seen.state);
    if (seen.kind === 'reading') {
      const key = `${setUpKey(seen)} ${at}`;
      readings.set(key, [...(readings.get(key) ?? []), oneWayRound(seen)]);
    } else if (seen.kind === 'relay') {
      const { kind, relay, position } = seen;
      const state = completeState(circuit, seen.state);
      relays.set(`${relay} ${position} ${at}`, { kind, relay, position, state });
    }
  }
  return [
    ...[...readings.values()].flatMap((repeats) => agreeing(circuit, repeats)),
    ...relays.values(),
  ];
}

/** Red on the tag that comes first in the alphabet, so that a pair is one pair. */
function oneWayRound(seen: ReadingObservation): ReadingObservation {
  const { red, black, volts } = seen;
  if (red <= black) return seen;
  return { ...seen, red: black, black: red, volts: seen.function === 'dc volts' ? -volts : volts };
}

function agreeing(
  circuit: Circuit,
  repeats: readonly ReadingObservation[],
): readonly ReadingPiece[] {
  const { kind, red, black, function: range, meter, state } = repeats[0]!;
  const sorted = repeats.map(({ volts }) => volts).sort((a, b) => a - b);
  const together: number[][] = [];
  for (const volts of sorted) {
    const last = together.at(-1)?.at(-1);
    const apart = last === undefined || volts - last > DISAGREE * deviationOf(volts, meter);
    if (apart) together.push([volts]);
    else together.at(-1)!.push(volts);
  }
  return together.map((values) => ({
    kind,
    red,
    black,
    function: range,
    meter,
    state: completeState(circuit, state),
    volts: middleOf(values),
    times: values.length,
  }));
}

function middleOf(sorted: readonly number[]): number {
  const half = sorted.length / 2;
  return (sorted[Math.ceil(half) - 1]! + sorted[Math.floor(half)]!) / 2;
}
