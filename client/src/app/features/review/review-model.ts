import { foldCase, type CaseState, type StoredEvent } from '@shared/cases';
import type { Circuit } from '@shared/circuit';
import type { ReadingObservation } from '@shared/diagnosis';
import { levelOf, type LampLevel } from '../../ui/line-model';

/** One row of the table of readings. */
export interface ReviewReading {
  readonly id: string;
  readonly at: string;
  readonly red: string;
  readonly black: string;
  readonly volts: string;
  readonly level: LampLevel;
  readonly place: string;
  readonly state: string;
  /** The part that it was measured on, if it was. */
  readonly across: string | undefined;
  readonly stage: 'finding' | 'after repair';
  readonly proves: boolean;
}

export function reviewReadings(state: CaseState, circuit: Circuit): readonly ReviewReading[] {
  const proof = state.finding?.proof;
  return state.seen.flatMap(({ observation, recordedAt, stage }) => {
    if (observation.kind !== 'reading') return [];
    const { id, red, black, volts, place } = observation;
    return [
      {
        id,
        at: recordedAt,
        red,
        black,
        volts: volts.toFixed(1),
        level: levelOf(volts, circuit.nominalVolts),
        place,
        state: stateWords(observation),
        across: partBetween(circuit, observation),
        stage,
        proves: proof?.kind === 'measured' && proof.reading === id,
      },
    ];
  });
}

const stateWords = ({ state }: ReadingObservation): string =>
  Object.entries(state)
    .map(([name, value]) => `${name}: ${value}`)
    .join(', ');

function partBetween(circuit: Circuit, { red, black }: ReadingObservation): string | undefined {
  return circuit.parts.find(
    (part) =>
      'between' in part &&
      part.between.length === 2 &&
      ((part.between[0] === red && part.between[1] === black) ||
        (part.between[0] === black && part.between[1] === red)),
  )?.name;
}

/** How sure the readings made it, reading by reading: one line for each of the likeliest parts. */
export interface BeliefLine {
  readonly part: string;
  /** One value for each advice shown, 0 to 1. */
  readonly values: readonly number[];
}

/** Lines in the chart; more can't be told apart. */
const MOST_LINES = 3;

export function beliefLines(state: CaseState): readonly BeliefLine[] {
  const shares = state.advice.map(({ suspects }) => {
    const byPart = new Map<string, number>();
    for (const { faults, probability } of suspects) {
      const part = faults[0]!.part;
      byPart.set(part, (byPart.get(part) ?? 0) + probability);
    }
    return byPart;
  });
  // The parts that were likeliest at any time, the finding's own first.
  const found = state.finding?.faults[0]?.part;
  const peaks = new Map<string, number>();
  for (const byPart of shares) {
    for (const [part, share] of byPart) peaks.set(part, Math.max(peaks.get(part) ?? 0, share));
  }
  const parts = [...peaks.keys()].sort(
    (a, b) => Number(b === found) - Number(a === found) || peaks.get(b)! - peaks.get(a)!,
  );
  return parts
    .slice(0, MOST_LINES)
    .map((part) => ({ part, values: shares.map((byPart) => byPart.get(part) ?? 0) }));
}

/** The case as the server's log has it. */
export const caseOf = (events: readonly StoredEvent[]): CaseState | undefined => foldCase(events);

/** Whole minutes between two moments; undefined if one is missing. */
export function minutesBetween(
  from: string | undefined,
  to: string | undefined,
): number | undefined {
  return from && to ? Math.round((Date.parse(to) - Date.parse(from)) / 60_000) : undefined;
}
