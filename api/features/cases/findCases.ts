import type { CaseDetail, CaseSummary, QueueEntry } from '@shared/contract';
import type { InOrganisation } from '../../platform/db/doors';
import { found } from '../../platform/refusal';
import { namesOf } from '../people/repository';
import { eventsOfCase } from '../sync/repository';
import { caseById, listCases, type CaseFilter } from './repository';

export const findCases = async (
  org: InOrganisation,
  filter: CaseFilter,
): Promise<{ cases: CaseSummary[] }> => ({ cases: await listCases(org, filter) });

/** One case with all its events, the names in it, and how its evidence is weak. */
export async function findCase(org: InOrganisation, id: string): Promise<CaseDetail> {
  const entry: QueueEntry = found(await caseById(org, id));
  const events = await eventsOfCase(org, id);
  const names = await namesOf(
    org,
    events.map(({ actor }) => actor),
  );
  return { summary: entry, events, names, weaknesses: entry.weaknesses };
}
