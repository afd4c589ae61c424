import type { Lift, Site } from '@shared/contract';
import type { InOrganisation } from '../../platform/db/doors';
import { found } from '../../platform/refusal';
import { liftById, listLifts, listSites } from './repository';

/** All lifts with their sites, or the one with a label. */
export async function findLifts(
  org: InOrganisation,
  label?: string,
): Promise<{ sites: Site[]; lifts: Lift[] }> {
  const lifts = await listLifts(org, label?.trim().toUpperCase());
  const sites = await listSites(org);
  const wanted = new Set(lifts.map(({ siteId }) => siteId));
  return { sites: label === undefined ? sites : sites.filter(({ id }) => wanted.has(id)), lifts };
}

export const findLift = async (org: InOrganisation, id: string): Promise<Lift> =>
  found(await liftById(org, id));
