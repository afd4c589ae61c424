import { appendAudit } from '../../platform/db/audit';
import type { InOrganisation } from '../../platform/db/doors';
import { Refusal } from '../../platform/refusal';
import type { Services } from '../../platform/services';
import { endSession, findToken, lockSession, rotateToken, sessionByToken } from './repository';
import { digestOfToken, successorOf } from './secrets';
import type { LiveSession } from './signIn';

/** Two tabs that ask with one token are not a thief: for this long the same successor is given, ms. */
export const GRACE = 30_000;
/** A family that nobody refreshed for so long has ended, milliseconds. */
export const IDLE_LIMIT = 60 * 24 * 3600 * 1000;

/** @throws Refusal `not_signed_in` for a token that is unknown, ended, too old or used before */
export async function refreshSession(
  { database, clock, config }: Services,
  token: string | undefined,
): Promise<LiveSession> {
  if (!token) throw new Refusal('not_signed_in');
  const key = await database.beforeSignIn((door) => sessionByToken(door, digestOfToken(token)));
  if (!key) throw new Refusal('not_signed_in');
  const successor = successorOf(token, config.secret);
  // A refusal must not roll back the end of a family: it is thrown after the commit.
  const good = await database.inOrganisation(key.organisationId, key.personId, (org) =>
    rotate(org, key.sessionId, digestOfToken(token), digestOfToken(successor), clock()),
  );
  if (!good) throw new Refusal('not_signed_in');
  return { ...key, refreshToken: successor };
}

async function rotate(
  org: InOrganisation,
  sessionId: string,
  presented: Buffer,
  successor: Buffer,
  now: Date,
): Promise<boolean> {
  const locked = await lockSession(org, sessionId);
  if (!locked || locked.session.endedAt) return false;
  if (locked.disabled) {
    await endSession(org, sessionId, 'disabled', now);
    return false;
  }
  if (now.getTime() - locked.session.refreshedAt.getTime() > IDLE_LIMIT) return false;
  const token = await findToken(org, presented);
  if (!token) return false;
  if (!token.usedAt) {
    await rotateToken(org, sessionId, presented, successor, now);
    return true;
  }
  if (now.getTime() - token.usedAt.getTime() <= GRACE) return true;
  await endSession(org, sessionId, 'reuse', now);
  await appendAudit(org, {
    action: 'refresh',
    subject: `session ${sessionId}`,
    outcome: 'family ended: a used token came again',
    at: now,
  });
  return false;
}
