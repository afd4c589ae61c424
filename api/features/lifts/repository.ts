import { and, asc, eq } from 'drizzle-orm';
import type { Lift, LiftChange, Site } from '@shared/contract';
import type { InOrganisation } from '../../platform/db/doors';
import { lift, site } from '../../platform/db/schema';

const columns = {
  id: lift.id,
  siteId: lift.siteId,
  name: lift.name,
  label: lift.label,
  maker: lift.maker,
  controller: lift.controller,
  landings: lift.landings,
  hazards: lift.hazards,
  notes: lift.notes,
  circuitId: lift.circuitId,
  circuitRevision: lift.circuitRevision,
  practiceFaults: lift.practiceFaults,
  version: lift.version,
};

export function listSites({ db, organisationId }: InOrganisation): Promise<Site[]> {
  return db
    .select({ id: site.id, name: site.name, address: site.address })
    .from(site)
    .where(eq(site.organisationId, organisationId))
    .orderBy(asc(site.name));
}

export function listLifts({ db, organisationId }: InOrganisation, label?: string): Promise<Lift[]> {
  return db
    .select(columns)
    .from(lift)
    .where(
      and(
        eq(lift.organisationId, organisationId),
        label === undefined ? undefined : eq(lift.label, label),
      ),
    )
    .orderBy(asc(lift.name));
}

export async function liftById(
  { db, organisationId }: InOrganisation,
  id: string,
): Promise<Lift | undefined> {
  const [row] = await db
    .select(columns)
    .from(lift)
    .where(and(eq(lift.organisationId, organisationId), eq(lift.id, id)));
  return row;
}

/** Changes the row if its version is still the one that was seen. */
export async function saveLift(
  { db, organisationId }: InOrganisation,
  id: string,
  version: number,
  change: LiftChange,
): Promise<boolean> {
  const saved = await db
    .update(lift)
    .set({ ...change, version: version + 1 })
    .where(and(eq(lift.organisationId, organisationId), eq(lift.id, id), eq(lift.version, version)))
    .returning({ id: lift.id });
  return saved.length > 0;
}
