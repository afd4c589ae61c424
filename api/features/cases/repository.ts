import { and, asc, desc, eq, inArray, lt, sql } from 'drizzle-orm';
import type { StoredEvent } from '@shared/cases';
import type { CaseSummary, QueueEntry } from '@shared/contract';
import type { CaseLine } from '../../platform/db/caseLine';
import type { InOrganisation } from '../../platform/db/doors';
import { caseEvent, caseRow, lift, personDetails, site } from '../../platform/db/schema';
import { storedEvent } from '../../platform/db/storedEvent';

type CaseStatus = CaseSummary['status'];

export async function saveCaseRow(
  { db, organisationId }: InOrganisation,
  values: CaseLine,
): Promise<void> {
  await db
    .insert(caseRow)
    .values({ ...values, organisationId })
    .onConflictDoUpdate({ target: [caseRow.organisationId, caseRow.id], set: values });
}

export async function deleteCaseRows({ db, organisationId }: InOrganisation): Promise<void> {
  await db.delete(caseRow).where(eq(caseRow.organisationId, organisationId));
}

/** Every event of the organisation, by case, in the case's order. */
export async function eventsByCase({
  db,
  organisationId,
}: InOrganisation): Promise<Map<string, StoredEvent[]>> {
  const rows = await db
    .select()
    .from(caseEvent)
    .where(eq(caseEvent.organisationId, organisationId))
    .orderBy(asc(caseEvent.position));
  const logs = new Map<string, StoredEvent[]>();
  for (const row of rows) {
    const log = logs.get(row.caseId) ?? [];
    log.push(storedEvent(row));
    logs.set(row.caseId, log);
  }
  return logs;
}

const selection = (db: InOrganisation['db']) =>
  db
    .select({
      row: caseRow,
      liftName: lift.name,
      siteName: site.name,
      openedBy: personDetails.name,
    })
    .from(caseRow)
    .innerJoin(
      lift,
      and(eq(lift.organisationId, caseRow.organisationId), eq(lift.id, caseRow.liftId)),
    )
    .innerJoin(site, and(eq(site.organisationId, lift.organisationId), eq(site.id, lift.siteId)))
    .leftJoin(
      personDetails,
      and(
        eq(personDetails.organisationId, caseRow.organisationId),
        eq(personDetails.personId, caseRow.openedBy),
      ),
    );

type Selected = Awaited<ReturnType<typeof selection>>[number];

const entryOf = ({ row, liftName, siteName, openedBy }: Selected): QueueEntry => ({
  id: row.id,
  liftId: row.liftId,
  liftName,
  siteName,
  status: row.status,
  complaint: row.complaint,
  device: row.device,
  cause: row.cause,
  outcome: row.outcome,
  practice: row.practice,
  openedAt: row.openedAt.toISOString(),
  closedAt: row.closedAt?.toISOString() ?? null,
  openedBy: openedBy ?? '',
  readings: row.readings,
  dangers: row.dangers,
  version: row.version,
  weaknesses: row.weaknesses,
  risk: row.risk,
});

export interface CaseFilter {
  readonly liftId?: string;
  readonly status?: CaseStatus;
  readonly before?: string;
  readonly limit: number;
}

export async function listCases(
  { db, organisationId }: InOrganisation,
  { liftId, status, before, limit }: CaseFilter,
): Promise<CaseSummary[]> {
  const rows = await selection(db)
    .where(
      and(
        eq(caseRow.organisationId, organisationId),
        liftId === undefined ? undefined : eq(caseRow.liftId, liftId),
        status === undefined ? undefined : eq(caseRow.status, status),
        before === undefined ? undefined : lt(caseRow.openedAt, new Date(before)),
      ),
    )
    .orderBy(desc(caseRow.openedAt), desc(caseRow.id))
    .limit(limit);
  return rows.map(entryOf);
}

export async function caseById(
  { db, organisationId }: InOrganisation,
  id: string,
): Promise<QueueEntry | undefined> {
  const [row] = await selection(db).where(
    and(eq(caseRow.organisationId, organisationId), eq(caseRow.id, id)),
  );
  return row && entryOf(row);
}

/** Closed cases that nobody has reviewed; most risk first, then the oldest. */
export async function casesToReview({ db, organisationId }: InOrganisation): Promise<QueueEntry[]> {
  const rows = await selection(db)
    .where(and(eq(caseRow.organisationId, organisationId), eq(caseRow.status, 'closed')))
    .orderBy(desc(caseRow.risk), asc(caseRow.closedAt), asc(caseRow.id))
    .limit(200);
  return rows.map(entryOf);
}

/** Every case that is not accepted yet, and the last accepted ones of each lift. */
export async function casesForPhones(
  { db, organisationId }: InOrganisation,
  accepted: number,
): Promise<{ readonly id: string; readonly circuitId: string }[]> {
  const ranked = db
    .select({
      id: caseRow.id,
      circuitId: caseRow.circuitId,
      status: caseRow.status,
      rank: sql<number>`row_number() over (partition by ${caseRow.liftId}, ${caseRow.status} order by ${caseRow.openedAt} desc)`.as(
        'rank',
      ),
    })
    .from(caseRow)
    .where(eq(caseRow.organisationId, organisationId))
    .as('ranked');
  return db
    .select({ id: ranked.id, circuitId: ranked.circuitId })
    .from(ranked)
    .where(
      sql`${inArray(ranked.status, ['open', 'returned', 'closed'])} or ${ranked.rank} <= ${accepted}`,
    );
}
