import { observationsForEngine, type CaseState, type SeenInCase } from '@shared/cases';
import { CONTROLLER, restingState, type Circuit } from '@shared/circuit';
import { USUAL_METER, type AdviceRequest, type Meter } from '@shared/diagnosis';

/** What the engine is asked about a case as it stands. */
export function adviceRequest(
  circuit: Circuit,
  state: CaseState,
  meter: Meter = USUAL_METER,
): AdviceRequest {
  return {
    observations: observationsForEngine(state, stageOf(state)),
    place: placeOf(state),
    state: { ...restingState(circuit), ...state.state },
    unreachable: state.unreachable,
    declined: state.declined,
    meter,
  };
}

/** What was read before a repair says nothing about the lift after it. */
export const stageOf = (state: CaseState): SeenInCase['stage'] =>
  state.repairs.length > 0 ? 'after repair' : 'finding';

export const placeOf = (state: CaseState): string => state.place ?? CONTROLLER;

/** The proven supply: the latest live reading from the string's first tag to the return. */
export function provenSupply(
  circuit: Circuit,
  state: CaseState,
): { readonly tag: string; readonly volts: number } | undefined {
  const line = circuit.strings[0]!;
  const reading = state.seen
    .map(({ observation }) => observation)
    .findLast(
      (seen) => seen.kind === 'reading' && seen.red === line.from && seen.black === line.return,
    );
  return reading?.kind === 'reading' && Math.abs(reading.volts) > circuit.nominalVolts / 2
    ? { tag: line.from, volts: reading.volts }
    : undefined;
}
