import type { CaseState } from '@shared/cases';

export type Stage = 'arrive' | 'find' | 'repair' | 'prove' | 'close';
export const stages: readonly Stage[] = ['arrive', 'find', 'repair', 'prove', 'close'];

/** Which stages are behind the technician. */
export function stagesDone(state: CaseState): ReadonlySet<Stage> {
  const done = new Set<Stage>();
  if (state.arrival) done.add('arrive');
  if (state.finding) done.add('find');
  if (state.repairs.length > 0) done.add('repair');
  if (state.service) done.add('prove');
  if (state.status === 'closed' || state.status === 'accepted') done.add('close');
  return done;
}

/** Where a case goes on when it is opened: the first stage that is not done. */
export function stageNow(state: CaseState): Stage {
  if (state.status !== 'open') return 'close';
  const done = stagesDone(state);
  return stages.find((stage) => !done.has(stage)) ?? 'close';
}
