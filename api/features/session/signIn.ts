import type { SignIn } from '@shared/contract';
import { appendAudit } from '../../platform/db/audit';
import { Refusal } from '../../platform/refusal';
import type { Services } from '../../platform/services';
import { countGuess } from './guessing';
import { hashPassword, isOutdated, isPassword } from '../../platform/password';
import { accountByEmail, savePasswordHash, startSession, type SessionKey } from './repository';
import { digestOfToken, markDevice, newToken } from './secrets';

/** A session that has begun or goes on: what the cookies are made of. */
export interface LiveSession extends SessionKey {
  readonly refreshToken: string;
}

export interface SignedIn extends LiveSession {
  readonly deviceMark: string;
}

/**
 * @param address where the request comes from
 * @param deviceMark of an earlier sign-in on this device
 * @throws Refusal `wrong_credentials` (the same for an unknown, a disabled and a mistyped account),
 *   `too_many_attempts`, `busy`
 */
export async function signIn(
  services: Services,
  { email, password }: SignIn,
  address: string,
  deviceMark: string | undefined,
): Promise<SignedIn> {
  const { database, clock, ids, config } = services;
  const account = email.toLowerCase();
  const takeBack = await countGuess(services, account, address, deviceMark);
  const known = await database.beforeSignIn((door) => accountByEmail(door, email));
  const right = await isPassword(password, known?.passwordHash);
  if (!known || !right || known.disabled) throw new Refusal('wrong_credentials');
  await takeBack();

  const { organisationId, personId } = known;
  const stronger = isOutdated(known.passwordHash) ? await hashPassword(password) : undefined;
  const sessionId = ids();
  const refreshToken = newToken();
  const now = clock();
  await database.inOrganisation(organisationId, personId, async (org) => {
    if (stronger !== undefined) await savePasswordHash(org, stronger);
    await startSession(org, sessionId, digestOfToken(refreshToken), now);
    await appendAudit(org, {
      action: 'sign in',
      subject: `session ${sessionId}`,
      outcome: 'done',
      at: now,
    });
  });
  return {
    organisationId,
    personId,
    sessionId,
    refreshToken,
    deviceMark: markDevice(account, config.secret),
  };
}
