import type { Observation } from '../diagnosis';
import type { CaseState, SeenInCase } from './caseState';

/** What was seen in a stage of the case, in order, as the engine takes it. */
export function observationsForEngine(
  state: CaseState,
  stage: SeenInCase['stage'] = 'finding',
): readonly Observation[] {
  return state.seen.filter((seen) => seen.stage === stage).map(({ observation }) => observation);
}
