import type { CaseState } from '@shared/cases';
import { tagsOf, type Circuit } from '@shared/circuit';
import type { ReadingObservation } from '@shared/diagnosis';

/** The latest reading before the repair with both probes on the part's own terminals. */
export function directReading(
  circuit: Circuit,
  state: CaseState,
  partName: string,
): ReadingObservation | undefined {
  const part = circuit.parts.find(({ name }) => name === partName);
  if (!part) return undefined;
  const tags = tagsOf(part);
  const last = state.seen.findLast(
    ({ observation, stage }) =>
      observation.kind === 'reading' &&
      stage === 'finding' &&
      tags.includes(observation.red) &&
      tags.includes(observation.black),
  )?.observation;
  return last?.kind === 'reading' ? last : undefined;
}
