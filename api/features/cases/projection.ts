import { foldCase, riskOf, weaknessesOf, type CaseState } from '@shared/cases';
import type { InOrganisation } from '../../platform/db/doors';
import { deleteCaseRows, eventsByCase, saveCaseRow, type CaseRowValues } from './repository';

/** The line of a case, folded from its events. */
export function rowOf(state: CaseState): CaseRowValues {
  const ended = state.status !== 'open';
  return {
    id: state.id,
    liftId: state.liftId,
    circuitId: state.circuitId,
    circuitRevision: state.circuitRevision,
    status: state.status,
    complaint: state.complaint,
    device: state.finding?.device ?? null,
    cause: state.finding?.cause ?? null,
    outcome: state.outcome ?? null,
    practice: state.practice,
    openedAt: new Date(state.openedAt),
    closedAt: state.closedAt === undefined ? null : new Date(state.closedAt),
    openedBy: state.openedBy!,
    readings: state.seen.filter(({ observation }) => observation.kind === 'reading').length,
    dangers: state.dangers.length,
    weaknesses: ended ? weaknessesOf(state).map((weakness) => ({ ...weakness })) : [],
    risk: ended ? riskOf(state) : 0,
    version: state.version,
  };
}

/** Brings the line up to its events; in the transaction that adds them, before the counter. */
export const saveProjection = (org: InOrganisation, state: CaseState): Promise<void> =>
  saveCaseRow(org, rowOf(state));

/** Drops every line and folds the log anew. @returns how many cases there are */
export async function rebuildProjections(org: InOrganisation): Promise<number> {
  const logs = await eventsByCase(org);
  await deleteCaseRows(org);
  let cases = 0;
  for (const events of logs.values()) {
    const state = foldCase(events);
    if (!state) continue;
    await saveCaseRow(org, rowOf(state));
    cases += 1;
  }
  return cases;
}
