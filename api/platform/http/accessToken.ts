import type { Request } from 'express';
import jwt from 'jsonwebtoken';
import { Passport } from 'passport';
import { Strategy, type VerifiedCallback } from 'passport-jwt';
import { z } from 'zod';
import { ACCESS_COOKIE, readCookie } from './cookies';

/** How long an access token is good, seconds. */
export const ACCESS_SECONDS = 600;

const ALGORITHM = 'HS256';
const TYPE = 'at+jwt';
const ISSUER = 'lampline';
const AUDIENCE = 'lampline-api';

/** Whom a token names. Whether session and person are still good is asked of the database. */
export interface TokenClaims {
  readonly organisationId: string;
  readonly personId: string;
  readonly sessionId: string;
}

/** Claims that were checked, with the end of the token. */
export interface ReadToken extends TokenClaims {
  readonly until: Date;
}

/** Exactly these: a header that names a key, a link to keys or anything else is not one of ours. */
const tokenSchema = z.object({
  header: z.strictObject({ alg: z.literal(ALGORITHM), typ: z.literal(TYPE) }),
  payload: z.strictObject({
    sub: z.uuid(),
    org: z.uuid(),
    sid: z.uuid(),
    iat: z.int(),
    exp: z.int(),
    iss: z.literal(ISSUER),
    aud: z.literal(AUDIENCE),
  }),
  signature: z.string(),
});

export interface AccessTokens {
  issue(claims: TokenClaims, now: Date): { readonly token: string; readonly until: Date };
  /** The claims of the request's cookie; undefined for a token that is missing or not good. */
  read(request: Request): Promise<ReadToken | undefined>;
}

/** passport-jwt, wrapped: nothing else in the product knows it. */
export function accessTokens(secret: Buffer): AccessTokens {
  const passport = new Passport();
  passport.use(
    new Strategy(
      {
        jwtFromRequest: (request: Request) => readCookie(request, ACCESS_COOKIE) ?? null,
        secretOrKey: secret,
        algorithms: [ALGORITHM],
        issuer: ISSUER,
        audience: AUDIENCE,
        jsonWebTokenOptions: { maxAge: ACCESS_SECONDS, complete: true },
      },
      (token: unknown, done: VerifiedCallback) => {
        const read = tokenSchema.safeParse(token);
        if (!read.success) return done(null, false);
        const { sub, org, sid, exp } = read.data.payload;
        const until = new Date(exp * 1000);
        return done(null, { organisationId: org, personId: sub, sessionId: sid, until });
      },
    ),
  );
  return {
    issue({ organisationId, personId, sessionId }, now) {
      const iat = Math.floor(now.getTime() / 1000);
      const exp = iat + ACCESS_SECONDS;
      const token = jwt.sign({ org: organisationId, sid: sessionId, iat, exp }, secret, {
        algorithm: ALGORITHM,
        header: { alg: ALGORITHM, typ: TYPE },
        subject: personId,
        issuer: ISSUER,
        audience: AUDIENCE,
      });
      return { token, until: new Date(exp * 1000) };
    },
    read: (request) =>
      new Promise((resolve, reject) => {
        const answer = (error: unknown, claims: ReadToken | false | null) => {
          if (error) reject(error as Error);
          else resolve(claims || undefined);
        };
        const authenticate = passport.authenticate('jwt', { session: false }, answer) as (
          request: Request,
          response: unknown,
          next: (error?: unknown) => void,
        ) => void;
        authenticate(request, undefined, (error) => reject(error as Error));
      }),
  };
}
