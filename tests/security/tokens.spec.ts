import { createHmac, generateKeyPairSync } from 'node:crypto';
import fc from 'fast-check';
import jwt from 'jsonwebtoken';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { accessTokens } from '../../api/platform/http/accessToken';
import { ACCESS_COOKIE } from '../../api/platform/http/cookies';
import { amount } from '../amount';
import { startTestServer, type TestServer } from '../api/server';

// S6: what is not a token of ours is not accepted, whatever it looks like.
let server: TestServer;
beforeAll(async () => void (server = await startTestServer()));
afterAll(() => server.stop());

const statusOf = async (token: string) =>
  (await server.withCookies(`${ACCESS_COOKIE}=${token}`).get('/api/session')).status;

const encode = (value: unknown) => Buffer.from(JSON.stringify(value)).toString('base64url');
const signed = (header: object, payload: object, key: Buffer | string) => {
  const text = `${encode(header)}.${encode(payload)}`;
  return `${text}.${createHmac('sha256', key).update(text).digest('base64url')}`;
};

const header = { alg: 'HS256', typ: 'at+jwt' };
const now = () => Math.floor(Date.now() / 1000);
function payload(): Record<string, unknown> {
  const { organisationId, personId, sessionId } = server.fixtures.ours.technician;
  return {
    ...{ org: organisationId, sid: sessionId, sub: personId, iss: 'lampline' },
    ...{ aud: 'lampline-api', iat: now(), exp: now() + 600 },
  };
}

describe('An access token', () => {
  it('of ours is accepted, so that the refusals below mean something', async () => {
    expect(await statusOf(signed(header, payload(), server.config.secret))).toBe(200);
  });

  it('with another header is refused', async () => {
    const { secret } = server.config;
    const headers: object[] = [
      { alg: 'HS256' },
      { alg: 'HS256', typ: 'JWT' },
      { alg: 'HS256', typ: 'rt+jwt' },
      { ...header, kid: '../../dev/null' },
      { ...header, kid: "x' union select 'key" },
      { ...header, jku: 'https://elsewhere.example/keys' },
      { ...header, x5u: 'https://elsewhere.example/cert' },
      { ...header, jwk: { kty: 'oct', k: 'AA' } },
      { ...header, crit: ['exp'] },
      { ...header, b64: false },
      { ...header, alg: 'HS384' },
      { ...header, alg: 'HS512' },
      { ...header, alg: 'hs256' },
      { ...header, alg: '' },
      { ...header, alg: null },
      { ...header, alg: ['HS256'] },
      { typ: 'at+jwt' },
    ];
    for (const one of headers) {
      expect(await statusOf(signed(one, payload(), secret)), JSON.stringify(one)).toBe(401);
    }
  });

  it('without a signature, or with another key or algorithm, is refused', async () => {
    const { secret } = server.config;
    const { privateKey, publicKey } = generateKeyPairSync('rsa', { modulusLength: 2048 });
    const publicText = publicKey.export({ type: 'spki', format: 'pem' }).toString();
    const tokens = [
      ...['none', 'None', 'NONE', 'nOnE'].map((alg) => {
        return `${encode({ ...header, alg })}.${encode(payload())}.`;
      }),
      `${encode(header)}.${encode(payload())}.`,
      `${encode(header)}.${encode(payload())}`,
      signed(header, payload(), Buffer.alloc(0)),
      signed(header, payload(), Buffer.alloc(32)),
      signed(header, payload(), secret.toString('base64url')),
      signed(header, payload(), 'secret'),
      signed(header, payload(), publicText),
      jwt.sign(payload(), privateKey, {
        algorithm: 'RS256',
        header: { alg: 'RS256', typ: 'at+jwt' },
      }),
      jwt.sign(payload(), secret, { algorithm: 'HS512', header: { alg: 'HS512', typ: 'at+jwt' } }),
    ];
    for (const token of tokens) expect(await statusOf(token), token.slice(0, 60)).toBe(401);
  });

  it('with other claims is refused', async () => {
    const { secret } = server.config;
    const { theirs } = server.fixtures;
    const changes: Record<string, unknown>[] = [
      { exp: now() - 1 },
      { exp: undefined },
      { exp: 'later' },
      { iat: now() - 601 },
      { iat: undefined },
      { nbf: now() + 60 },
      { nbf: now() - 60 },
      { iss: 'another' },
      { iss: undefined },
      { iss: ['lampline'] },
      { aud: 'another' },
      { aud: undefined },
      { aud: ['another', 'lampline-api'] },
      { sub: undefined },
      { sub: 'administrator' },
      { sub: theirs.administrator.personId },
      { org: theirs.administrator.organisationId },
      { org: undefined },
      { org: '' },
      { org: "' or true --" },
      { sid: theirs.administrator.sessionId },
      { sid: server.fixtures.ours.administrator.sessionId },
      { sid: undefined },
      { role: 'administrator' },
      { admin: true },
      { __proto__: { sub: 'x' }, constructor: 'x' },
    ];
    for (const change of changes) {
      const token = signed(header, { ...payload(), ...change }, secret);
      expect(await statusOf(token), JSON.stringify(change)).toBe(401);
    }
  });

  it('is no refresh token, and a refresh token is no access token', async () => {
    const { refreshToken } = server.fixtures.ours.technician;
    expect(await statusOf(refreshToken)).toBe(401);
    const access = signed(header, payload(), server.config.secret);
    await server
      .withCookies(`__Secure-lampline-refresh=${access}`)
      .post('/api/session/refresh')
      .expect(401);
  });

  it('given twice is refused: a planted cookie does not win', async () => {
    const good = signed(header, payload(), server.config.secret);
    await server
      .withCookies(`${ACCESS_COOKIE}=x; ${ACCESS_COOKIE}=${good}`)
      .get('/api/session')
      .expect(401);
  });

  it('with any bit flipped is refused', async () => {
    const tokens = accessTokens(server.config.secret);
    const good = tokens.issue(server.fixtures.ours.technician, new Date()).token;
    const bytes = Buffer.from(good, 'latin1');
    // The last character's two lowest bits are padding: other spellings of the same signature.
    const spelling = (token: string) =>
      token
        .split('.')
        .map((part) => Buffer.from(part, 'base64url').toString('base64url'))
        .join('.');
    await fc.assert(
      fc.asyncProperty(fc.nat(bytes.length * 8 - 1), async (bit) => {
        const flipped = Buffer.from(bytes);
        flipped[bit >> 3]! ^= 1 << (bit & 7);
        const token = flipped.toString('latin1');
        if (spelling(token) === good) return;
        const asked = { get: () => `${ACCESS_COOKIE}=${token}` };
        expect(await tokens.read(asked as never)).toBeUndefined();
      }),
      { numRuns: amount(2_000, 10_000), seed: 6 },
    );
  });
});
