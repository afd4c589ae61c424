import { appendAudit } from '../../platform/db/audit';
import type { Services } from '../../platform/services';
import { endSession, sessionByToken, type SessionKey } from './repository';
import { digestOfToken } from './secrets';

/** Ends the session of the refresh token, else that of the access token; without either nothing. */
export async function signOut(
  { database, clock }: Services,
  token: string | undefined,
  byAccess: SessionKey | undefined,
): Promise<SessionKey | undefined> {
  const byToken =
    token === undefined
      ? undefined
      : await database.beforeSignIn((door) => sessionByToken(door, digestOfToken(token)));
  const key = byToken ?? byAccess;
  if (!key) return undefined;
  const now = clock();
  await database.inOrganisation(key.organisationId, key.personId, async (org) => {
    if (!(await endSession(org, key.sessionId, 'signed out', now))) return;
    await appendAudit(org, {
      action: 'sign out',
      subject: `session ${key.sessionId}`,
      outcome: 'done',
      at: now,
    });
  });
  return key;
}
