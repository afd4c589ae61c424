import type { Lift, LiftChange } from '@shared/contract';
import { appendAudit } from '../../platform/db/audit';
import type { InOrganisation } from '../../platform/db/doors';
import { found, Refusal } from '../../platform/refusal';
import { liftById, saveLift } from './repository';

/** @throws Refusal `not_found`, `version_conflict` with the row as it is now */
export async function changeLift(
  org: InOrganisation,
  id: string,
  version: number,
  change: LiftChange,
  now: Date,
): Promise<Lift> {
  const current = found(await liftById(org, id));
  if (current.version !== version || !(await saveLift(org, id, version, change))) {
    throw new Refusal('version_conflict', { current: found(await liftById(org, id)) });
  }
  await appendAudit(org, {
    action: 'lift changed',
    subject: `lift ${id}`,
    outcome: 'done',
    at: now,
  });
  return found(await liftById(org, id));
}
