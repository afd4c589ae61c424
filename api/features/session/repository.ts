import { and, eq, isNull, sql } from 'drizzle-orm';
import type { Role } from '@shared/contract';
import type { BeforeSignIn, InOrganisation } from '../../platform/db/doors';
import {
  organisation,
  person,
  personDetails,
  refreshToken,
  session,
} from '../../platform/db/schema';

export interface Account {
  readonly organisationId: string;
  readonly personId: string;
  readonly passwordHash: string;
  readonly disabled: boolean;
}

export async function accountByEmail(
  { db }: BeforeSignIn,
  email: string,
): Promise<Account | undefined> {
  const { rows } = await db.execute<{
    organisation_id: string;
    person_id: string;
    password_hash: string;
    disabled: boolean;
  }>(sql`select * from door.person_by_email(${email})`);
  const [row] = rows;
  return (
    row && {
      organisationId: row.organisation_id,
      personId: row.person_id,
      passwordHash: row.password_hash,
      disabled: row.disabled,
    }
  );
}

export interface SessionKey {
  readonly organisationId: string;
  readonly sessionId: string;
  readonly personId: string;
}

export async function sessionByToken(
  { db }: BeforeSignIn,
  digest: Buffer,
): Promise<SessionKey | undefined> {
  const { rows } = await db.execute<{
    organisation_id: string;
    session_id: string;
    person_id: string;
  }>(sql`select * from door.session_by_token(${digest})`);
  const [row] = rows;
  return (
    row && {
      organisationId: row.organisation_id,
      sessionId: row.session_id,
      personId: row.person_id,
    }
  );
}

/** A leaky bucket of guesses. */
export interface Bucket {
  readonly name: string;
  /** Guesses at once. */
  readonly capacity: number;
  /** Seconds after which one more is allowed. */
  readonly secondsPerGuess: number;
}

/** @returns seconds to wait; 0 when the guess was counted and is allowed */
export async function takeGuess({ db }: BeforeSignIn, bucket: Bucket, now: Date): Promise<number> {
  const { rows } = await db.execute<{ wait: number }>(
    sql`select door.take_guess(${bucket.name}, ${bucket.capacity}::float8, ${1 / bucket.secondsPerGuess}::float8, ${now.toISOString()}::timestamptz) as wait`,
  );
  return rows[0]?.wait ?? 0;
}

export async function giveBackGuess({ db }: BeforeSignIn, bucket: Bucket): Promise<void> {
  await db.execute(sql`select door.give_back_guess(${bucket.name})`);
}

export async function sweepGuesses({ db }: BeforeSignIn, olderThan: Date): Promise<void> {
  await db.execute(sql`select door.sweep_guesses(${olderThan.toISOString()}::timestamptz)`);
}

/** The session with its person, locked: two refreshes of one family take turns. */
export async function lockSession({ db, organisationId }: InOrganisation, sessionId: string) {
  const [row] = await db
    .select({ session, disabled: person.disabled })
    .from(session)
    .innerJoin(
      person,
      and(eq(person.organisationId, session.organisationId), eq(person.id, session.personId)),
    )
    .where(and(eq(session.organisationId, organisationId), eq(session.id, sessionId)))
    .for('update', { of: session });
  return row;
}

export async function findToken({ db, organisationId }: InOrganisation, digest: Buffer) {
  const [row] = await db
    .select()
    .from(refreshToken)
    .where(and(eq(refreshToken.organisationId, organisationId), eq(refreshToken.digest, digest)));
  return row;
}

export async function startSession(
  { db, organisationId, personId }: InOrganisation,
  id: string,
  digest: Buffer,
  now: Date,
): Promise<void> {
  await db
    .insert(session)
    .values({ organisationId, id, personId, startedAt: now, refreshedAt: now });
  await db.insert(refreshToken).values({ organisationId, digest, sessionId: id, issuedAt: now });
}

/** Marks a token used and stores its successor's digest. */
export async function rotateToken(
  { db, organisationId }: InOrganisation,
  sessionId: string,
  used: Buffer,
  successor: Buffer,
  now: Date,
): Promise<void> {
  await db
    .update(refreshToken)
    .set({ usedAt: now })
    .where(and(eq(refreshToken.organisationId, organisationId), eq(refreshToken.digest, used)));
  await db
    .insert(refreshToken)
    .values({ organisationId, digest: successor, sessionId, issuedAt: now });
  await db
    .update(session)
    .set({ refreshedAt: now })
    .where(and(eq(session.organisationId, organisationId), eq(session.id, sessionId)));
}

/** Ends a session that has not ended; says whether it did. */
export async function endSession(
  { db, organisationId }: InOrganisation,
  id: string,
  because: 'signed out' | 'reuse' | 'disabled',
  now: Date,
): Promise<boolean> {
  const ended = await db
    .update(session)
    .set({ endedAt: now, endedBecause: because })
    .where(
      and(eq(session.organisationId, organisationId), eq(session.id, id), isNull(session.endedAt)),
    )
    .returning({ id: session.id });
  return ended.length > 0;
}

/** The role of the person whose session this is; undefined when session or person are no longer good. */
export async function standingOf(
  { db, organisationId, personId }: InOrganisation,
  sessionId: string,
): Promise<Role | undefined> {
  const [row] = await db
    .select({ role: person.role })
    .from(session)
    .innerJoin(
      person,
      and(eq(person.organisationId, session.organisationId), eq(person.id, session.personId)),
    )
    .where(
      and(
        eq(session.organisationId, organisationId),
        eq(session.id, sessionId),
        eq(session.personId, personId),
        isNull(session.endedAt),
        eq(person.disabled, false),
      ),
    );
  return row?.role;
}

/** What a device keeps of who is signed in. */
export async function whoIs({ db, organisationId, personId }: InOrganisation) {
  const [row] = await db
    .select({
      person: { id: person.id, name: personDetails.name, role: person.role },
      organisation: {
        id: organisation.organisationId,
        name: organisation.name,
        timeZone: organisation.timeZone,
      },
    })
    .from(person)
    .innerJoin(
      personDetails,
      and(
        eq(personDetails.organisationId, person.organisationId),
        eq(personDetails.personId, person.id),
      ),
    )
    .innerJoin(organisation, eq(organisation.organisationId, person.organisationId))
    .where(and(eq(person.organisationId, organisationId), eq(person.id, personId)));
  return row;
}

export async function savePasswordHash(
  { db, organisationId, personId }: InOrganisation,
  passwordHash: string,
): Promise<void> {
  await db
    .update(personDetails)
    .set({ passwordHash })
    .where(
      and(eq(personDetails.organisationId, organisationId), eq(personDetails.personId, personId)),
    );
}
