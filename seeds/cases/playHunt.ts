import {
  CONTROLLER,
  restingState,
  type Circuit,
  type Fault,
  type LiftState,
} from '../../shared/circuit';
import {
  createEngine,
  USUAL_METER,
  type Advice,
  type Observation,
  type Suggestion,
} from '../../shared/diagnosis';
import { solve } from '../../shared/solver';

/** One thing that the engine asked for and what the lift with its fault answered. */
export interface PlayedStep {
  readonly advice: Advice;
  readonly suggestion: Suggestion;
  readonly observation: Observation;
}

export interface PlayedHunt {
  readonly steps: readonly PlayedStep[];
  /** The advice that ended it. */
  readonly end: Advice;
  readonly minutes: number;
}

/** More steps than any sensible hunt: what loops, ends here. */
const MOST_STEPS = 40;
/** The display's digits. */
const shown = (volts: number): number => Number(volts.toFixed(1)) || 0;

/**
 * The engine asks, the solver answers with the lift's faults put in, until a finding or another end.
 * @param ids makes the id of each observation
 */
export function playHunt(
  circuit: Circuit,
  faults: readonly Fault[],
  ids: (step: number) => string,
): PlayedHunt {
  const engine = createEngine(circuit);
  const steps: PlayedStep[] = [];
  const observations: Observation[] = [];
  let place = CONTROLLER;
  let state: LiftState = restingState(circuit);
  let minutes = 0;
  for (;;) {
    const advice = engine.advise({
      observations,
      place,
      state,
      unreachable: [],
      declined: [],
      meter: USUAL_METER,
    });
    const { step } = advice;
    const suggestion =
      step.kind === 'suggestion' || step.kind === 'contradiction' ? step.suggestion : undefined;
    if (!suggestion || steps.length === MOST_STEPS) return { steps, end: advice, minutes };
    state = { ...state, ...suggestion.state };
    place = suggestion.place;
    minutes += suggestion.minutes;
    const observation = answer(circuit, faults, state, suggestion, ids(steps.length));
    observations.push(observation);
    steps.push({ advice, suggestion, observation });
  }
}

function answer(
  circuit: Circuit,
  faults: readonly Fault[],
  state: LiftState,
  suggestion: Suggestion,
  id: string,
): Observation {
  const solution = solve(circuit, state, faults);
  if (suggestion.kind === 'relay') {
    const relay = suggestion.relay!;
    return { kind: 'relay', id, relay, position: solution.relays[relay]!, state };
  }
  const { red, black, place } = suggestion;
  const { mean, ripple } = solution.read({
    red: red!,
    black: black!,
    meterOhms: USUAL_METER.ohms,
  });
  const meterFunction = suggestion.function!;
  return {
    kind: 'reading',
    id,
    red: red!,
    black: black!,
    function: meterFunction,
    volts: shown(meterFunction === 'dc volts' ? mean : ripple),
    meter: USUAL_METER,
    state,
    place,
  };
}
