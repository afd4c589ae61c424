import { foldCase, type CaseState } from '@shared/cases';
import { caseLine } from '../../platform/db/caseLine';
import type { InOrganisation } from '../../platform/db/doors';
import { deleteCaseRows, eventsByCase, saveCaseRow } from './repository';

/** Brings the line up to its events; in the transaction that adds them, before the counter. */
export const saveProjection = (org: InOrganisation, state: CaseState): Promise<void> =>
  saveCaseRow(org, caseLine(state));

/** Drops every line and folds the log anew. @returns how many cases there are */
export async function rebuildProjections(org: InOrganisation): Promise<number> {
  const logs = await eventsByCase(org);
  await deleteCaseRows(org);
  let cases = 0;
  for (const events of logs.values()) {
    const state = foldCase(events);
    if (!state) continue;
    await saveCaseRow(org, caseLine(state));
    cases += 1;
  }
  return cases;
}
