import { and, eq, inArray } from 'drizzle-orm';
import type { CircuitRevision } from '@shared/contract';
import type { InOrganisation } from '../../platform/db/doors';
import { circuitRevision } from '../../platform/db/schema';

type Row = typeof circuitRevision.$inferSelect;

const asRevision = ({ circuitId, revision, issuedAt, circuit }: Row): CircuitRevision => ({
  circuitId,
  revision,
  issuedAt: issuedAt.toISOString(),
  circuit,
});

export async function revisionOf(
  { db, organisationId }: InOrganisation,
  circuitId: string,
  revision: number,
): Promise<CircuitRevision | undefined> {
  const [row] = await db
    .select()
    .from(circuitRevision)
    .where(
      and(
        eq(circuitRevision.organisationId, organisationId),
        eq(circuitRevision.circuitId, circuitId),
        eq(circuitRevision.revision, revision),
      ),
    );
  return row && asRevision(row);
}

/** Every issued revision of these circuits. */
export async function revisionsOf(
  { db, organisationId }: InOrganisation,
  circuitIds: readonly string[],
): Promise<CircuitRevision[]> {
  if (circuitIds.length === 0) return [];
  const rows = await db
    .select()
    .from(circuitRevision)
    .where(
      and(
        eq(circuitRevision.organisationId, organisationId),
        inArray(circuitRevision.circuitId, [...new Set(circuitIds)]),
      ),
    );
  return rows.map(asRevision);
}
