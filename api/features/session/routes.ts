import type { Request, Response } from 'express';
import { routes, type Session } from '@shared/contract';
import { ACCESS_SECONDS, type AccessTokens } from '../../platform/http/accessToken';
import {
  ACCESS_COOKIE,
  clearCookie,
  DEVICE_COOKIE,
  readCookie,
  REFRESH_COOKIE,
  setCookie,
} from '../../platform/http/cookies';
import type { Mount } from '../../platform/http/mount';
import type { Services } from '../../platform/services';
import { currentSession } from './currentSession';
import { IDLE_LIMIT, refreshSession } from './refreshSession';
import { signIn, type LiveSession } from './signIn';
import { signOut } from './signOut';
import type { Standing } from './standing';

/** A device stays known for a year after its last sign-in, milliseconds. */
const DEVICE_KNOWN = 365 * 24 * 3600 * 1000;

export function sessionRoutes(
  mount: Mount,
  services: Services,
  tokens: AccessTokens,
  standing: Standing,
): void {
  /** Sets the cookies of a session and says whose it is. */
  const hand = async (response: Response, live: LiveSession): Promise<Session> => {
    const { token, until } = tokens.issue(live, services.clock());
    setCookie(response, ACCESS_COOKIE, token, ACCESS_SECONDS * 1000);
    setCookie(response, REFRESH_COOKIE, live.refreshToken, IDLE_LIMIT);
    return services.database.inOrganisation(live.organisationId, live.personId, (org) =>
      currentSession(org, until),
    );
  };

  mount(routes.signIn, async ({ body, request, response }) => {
    const mark = readCookie(request, DEVICE_COOKIE);
    const signedIn = await signIn(services, body, addressOf(request), mark);
    setCookie(response, DEVICE_COOKIE, signedIn.deviceMark, DEVICE_KNOWN);
    return hand(response, signedIn);
  });

  mount(routes.refreshSession, async ({ request, response }) => {
    return hand(response, await refreshSession(services, readCookie(request, REFRESH_COOKIE)));
  });

  mount(routes.session, ({ caller, inside }) => inside((org) => currentSession(org, caller.until)));

  mount(routes.signOut, async ({ request, response }) => {
    const claims = await tokens.read(request);
    const ended = await signOut(services, readCookie(request, REFRESH_COOKIE), claims);
    if (ended) standing.forget(ended);
    clearCookie(response, ACCESS_COOKIE);
    clearCookie(response, REFRESH_COOKIE);
  });
}

/** Behind a trusted proxy the client's address, else the peer's. */
const addressOf = (request: Request): string => request.ip ?? 'unknown';
