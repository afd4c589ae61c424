import type { Person, PersonChange } from '@shared/contract';
import { appendAudit } from '../../platform/db/audit';
import type { InOrganisation } from '../../platform/db/doors';
import { found, Refusal } from '../../platform/refusal';
import { countActive, personById, savePerson } from './repository';

/**
 * Changes name, role or disabling.
 * @throws Refusal `not_found`, `version_conflict`, `people.own_role`, `people.last_administrator`
 */
export async function changePerson(
  org: InOrganisation,
  id: string,
  version: number,
  change: PersonChange,
  now: Date,
): Promise<Person> {
  const current = found(await personById(org, id));
  if (current.version !== version) throw new Refusal('version_conflict', { current });
  const powerChanges =
    (change.role !== undefined && change.role !== current.role) ||
    (change.disabled !== undefined && change.disabled !== current.disabled);
  if (powerChanges && id === org.personId) throw new Refusal('people.own_role');
  if (powerChanges && current.role === 'administrator' && !current.disabled) {
    if ((await countActive(org, 'administrator')) <= 1) {
      throw new Refusal('people.last_administrator');
    }
  }
  if (!(await savePerson(org, id, version, change))) {
    throw new Refusal('version_conflict', { current: found(await personById(org, id)) });
  }
  await appendAudit(org, {
    action: powerChanges ? 'person power changed' : 'person changed',
    subject: `person ${id}`,
    outcome: 'done',
    at: now,
  });
  return found(await personById(org, id));
}
