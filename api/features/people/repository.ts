import { and, asc, count, eq, inArray } from 'drizzle-orm';
import type { Person, PersonChange, Role } from '@shared/contract';
import type { InOrganisation } from '../../platform/db/doors';
import { person, personDetails } from '../../platform/db/schema';

const columns = {
  id: person.id,
  name: personDetails.name,
  email: personDetails.email,
  role: person.role,
  disabled: person.disabled,
  version: person.version,
};

const ofPerson = and(
  eq(personDetails.organisationId, person.organisationId),
  eq(personDetails.personId, person.id),
);

export function listPeople({ db, organisationId }: InOrganisation): Promise<Person[]> {
  return db
    .select(columns)
    .from(person)
    .innerJoin(personDetails, ofPerson)
    .where(eq(person.organisationId, organisationId))
    .orderBy(asc(personDetails.name));
}

export async function personById(
  { db, organisationId }: InOrganisation,
  id: string,
): Promise<Person | undefined> {
  const [row] = await db
    .select(columns)
    .from(person)
    .innerJoin(personDetails, ofPerson)
    .where(and(eq(person.organisationId, organisationId), eq(person.id, id)));
  return row;
}

/** Locks everyone of a role: two administrators can't take each other's role at the same moment. */
export async function countActive(
  { db, organisationId }: InOrganisation,
  role: Role,
): Promise<number> {
  await db
    .select({ id: person.id })
    .from(person)
    .where(and(eq(person.organisationId, organisationId), eq(person.role, role)))
    .orderBy(asc(person.id))
    .for('update');
  const [row] = await db
    .select({ people: count() })
    .from(person)
    .where(
      and(
        eq(person.organisationId, organisationId),
        eq(person.role, role),
        eq(person.disabled, false),
      ),
    );
  return row?.people ?? 0;
}

/** Changes the row if its version is still the one that was seen. */
export async function savePerson(
  { db, organisationId }: InOrganisation,
  id: string,
  version: number,
  { name, role, disabled }: PersonChange,
): Promise<boolean> {
  const saved = await db
    .update(person)
    .set({ role, disabled, version: version + 1 })
    .where(
      and(
        eq(person.organisationId, organisationId),
        eq(person.id, id),
        eq(person.version, version),
      ),
    )
    .returning({ id: person.id });
  if (saved.length === 0) return false;
  if (name !== undefined) {
    await db
      .update(personDetails)
      .set({ name })
      .where(and(eq(personDetails.organisationId, organisationId), eq(personDetails.personId, id)));
  }
  return true;
}

/** Names by person id; an erased person has none. */
export async function namesOf(
  { db, organisationId }: InOrganisation,
  ids: readonly string[],
): Promise<Record<string, string>> {
  if (ids.length === 0) return {};
  const rows = await db
    .select({ id: personDetails.personId, name: personDetails.name })
    .from(personDetails)
    .where(
      and(
        eq(personDetails.organisationId, organisationId),
        inArray(personDetails.personId, [...new Set(ids)]),
      ),
    );
  return Object.fromEntries(rows.map(({ id, name }) => [id, name]));
}
