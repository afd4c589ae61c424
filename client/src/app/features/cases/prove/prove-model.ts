import {
  pointsToReadAgain,
  readAgain,
  type CaseState,
  type PointToReadAgain,
  type SeenInCase,
} from '@shared/cases';
import type { Circuit } from '@shared/circuit';
import type { ReadingObservation } from '@shared/diagnosis';
import { levelOf } from '../../../ui/line-model';

/** A point as the screen shows it: what it read before, what it reads now, and what it should. */
export interface PointRow {
  readonly point: PointToReadAgain;
  readonly done: boolean;
  readonly before?: ReadingObservation;
  readonly now?: ReadingObservation;
  /** On a string that is whole: the string's volts, or none (across a closed part). */
  readonly should: 'live' | 'none';
  /** Read since the repair, and not as it should be: there is more. */
  readonly unsound: boolean;
}

/** The points to read after the repair, in the order in which they were read before. */
export function pointRows(circuit: Circuit, state: CaseState): readonly PointRow[] {
  return pointsToReadAgain(state).map((point) => {
    const done = readAgain(state, point);
    const now = done ? lastReading(state, point, 'after repair') : undefined;
    const should = shouldRead(circuit, point);
    return {
      point,
      done,
      before: lastReading(state, point, 'finding'),
      now,
      should,
      unsound: now !== undefined && levelOf(now.volts, circuit.nominalVolts) !== should,
    };
  });
}

/** Between a tag of the string and the return stand the string's volts; across anything else none. */
function shouldRead(circuit: Circuit, { red, black }: PointToReadAgain): PointRow['should'] {
  const line = circuit.strings[0]!;
  const isReturn = (tag: string) => tag === line.return || tag === line.supplyReturn;
  return isReturn(red) !== isReturn(black) ? 'live' : 'none';
}

function lastReading(
  state: CaseState,
  { red, black }: PointToReadAgain,
  stage: SeenInCase['stage'],
): ReadingObservation | undefined {
  const last = state.seen.findLast(
    (seen) =>
      seen.stage === stage &&
      seen.observation.kind === 'reading' &&
      ((seen.observation.red === red && seen.observation.black === black) ||
        (seen.observation.red === black && seen.observation.black === red)),
  )?.observation;
  return last?.kind === 'reading' ? last : undefined;
}
