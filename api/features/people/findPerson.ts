import type { Person, Role } from '@shared/contract';
import type { InOrganisation } from '../../platform/db/doors';
import { found, Refusal } from '../../platform/refusal';
import { listPeople, personById } from './repository';

const LOOKS_AT_OTHERS: ReadonlySet<Role> = new Set(['supervisor', 'administrator']);

/** Everyone of the organisation. */
export const everyone = async (org: InOrganisation): Promise<{ people: Person[] }> => ({
  people: await listPeople(org),
});

/** Oneself, or anyone for supervisors and administrators; else the same answer as for nobody. */
export async function findPerson(org: InOrganisation, id: string, role: Role): Promise<Person> {
  if (id !== org.personId && !LOOKS_AT_OTHERS.has(role)) throw new Refusal('not_found');
  return found(await personById(org, id));
}
