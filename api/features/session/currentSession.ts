import type { Session } from '@shared/contract';
import { found } from '../../platform/refusal';
import type { InOrganisation } from '../../platform/db/doors';
import { whoIs } from './repository';

/** Who is signed in, as the device keeps it. */
export async function currentSession(org: InOrganisation, until: Date): Promise<Session> {
  return { ...found(await whoIs(org)), until: until.toISOString() };
}
