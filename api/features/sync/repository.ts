import { and, asc, desc, eq, gt, inArray, max, or, sql } from 'drizzle-orm';
import type { CaseEvent, StoredEvent } from '@shared/cases';
import type { InOrganisation } from '../../platform/db/doors';
import { caseEvent, caseRow, counter, quarantine } from '../../platform/db/schema';
import { storedEvent } from '../../platform/db/storedEvent';

type EventRow = typeof caseEvent.$inferSelect;
type NewEventRow = typeof caseEvent.$inferInsert;

/** Locks the case's line until the commit: two devices on one case take turns. */
export async function lockCase({ db, organisationId }: InOrganisation, caseId: string) {
  const [row] = await db
    .select({ id: caseRow.id })
    .from(caseRow)
    .where(and(eq(caseRow.organisationId, organisationId), eq(caseRow.id, caseId)))
    .for('update');
  return row;
}

export async function eventsOfCase(
  { db, organisationId }: InOrganisation,
  caseId: string,
): Promise<StoredEvent[]> {
  const rows = await db
    .select()
    .from(caseEvent)
    .where(and(eq(caseEvent.organisationId, organisationId), eq(caseEvent.caseId, caseId)))
    .orderBy(asc(caseEvent.caseVersion));
  return rows.map(storedEvent);
}

/** Stored events that share an id or a (device, sequence) with those sent. */
export async function eventsLike(
  { db, organisationId }: InOrganisation,
  device: string,
  events: readonly CaseEvent[],
): Promise<EventRow[]> {
  return db
    .select()
    .from(caseEvent)
    .where(
      and(
        eq(caseEvent.organisationId, organisationId),
        or(
          inArray(
            caseEvent.id,
            events.map(({ id }) => id),
          ),
          and(
            eq(caseEvent.device, device),
            inArray(
              caseEvent.sequence,
              events.map(({ sequence }) => sequence),
            ),
          ),
        ),
      ),
    );
}

/** Whose device it is, by its latest event, and its largest sequence in the log. */
export async function deviceStanding(
  { db, organisationId }: InOrganisation,
  device: string,
): Promise<{ readonly actor: string; readonly sequence: number } | undefined> {
  const [row] = await db
    .select({ actor: caseEvent.actor, sequence: caseEvent.sequence })
    .from(caseEvent)
    .where(and(eq(caseEvent.organisationId, organisationId), eq(caseEvent.device, device)))
    .orderBy(desc(caseEvent.sequence))
    .limit(1);
  return row;
}

/**
 * Takes `events` positions; the counter row stays locked until the commit, so positions are seen in the
 * order of commits and without gaps. Locked last but for the audit chain.
 * @returns the last position before these
 */
export async function takePositions(
  { db, organisationId }: InOrganisation,
  events: number,
): Promise<number> {
  const [row] = await db
    .update(counter)
    .set({ position: sql`${counter.position} + ${events}` })
    .where(eq(counter.organisationId, organisationId))
    .returning({ position: counter.position });
  if (!row) throw new Error(`Organisation ${organisationId} has no counter.`);
  return row.position - events;
}

export async function insertEvents(
  { db, organisationId }: InOrganisation,
  rows: readonly Omit<NewEventRow, 'organisationId'>[],
): Promise<void> {
  await db.insert(caseEvent).values(rows.map((row) => ({ ...row, organisationId })));
}

export interface Refused {
  readonly eventId: string | null;
  readonly device: string;
  readonly code: string;
  readonly details: Record<string, unknown>;
  readonly event: unknown;
  readonly sentDigest: Buffer;
}

/** Keeps what was refused; the same thing sent again is kept once. */
export async function setAside(
  { db, organisationId, personId }: InOrganisation,
  { id, receivedAt, ...refused }: Refused & { readonly id: string; readonly receivedAt: Date },
): Promise<void> {
  await db
    .insert(quarantine)
    .values({ ...refused, organisationId, personId, id, receivedAt })
    .onConflictDoNothing();
}

export async function currentPosition({ db, organisationId }: InOrganisation): Promise<number> {
  const [row] = await db
    .select({ position: counter.position })
    .from(counter)
    .where(eq(counter.organisationId, organisationId));
  return row?.position ?? 0;
}

export async function eventsAfter(
  { db, organisationId }: InOrganisation,
  position: number,
  limit: number,
): Promise<StoredEvent[]> {
  const rows = await db
    .select()
    .from(caseEvent)
    .where(and(eq(caseEvent.organisationId, organisationId), gt(caseEvent.position, position)))
    .orderBy(asc(caseEvent.position))
    .limit(limit);
  return rows.map(storedEvent);
}

export async function eventsOfCases(
  { db, organisationId }: InOrganisation,
  caseIds: readonly string[],
): Promise<StoredEvent[]> {
  if (caseIds.length === 0) return [];
  const rows = await db
    .select()
    .from(caseEvent)
    .where(
      and(eq(caseEvent.organisationId, organisationId), inArray(caseEvent.caseId, [...caseIds])),
    )
    .orderBy(asc(caseEvent.position));
  return rows.map(storedEvent);
}

export const largestVersion = async (
  { db, organisationId }: InOrganisation,
  caseId: string,
): Promise<number> => {
  const [row] = await db
    .select({ version: max(caseEvent.caseVersion) })
    .from(caseEvent)
    .where(and(eq(caseEvent.organisationId, organisationId), eq(caseEvent.caseId, caseId)));
  return row?.version ?? 0;
};
