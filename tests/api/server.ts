import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Express } from 'express';
import type { Logger } from 'pino';
import supertest, { type Test } from 'supertest';
import { v7 } from 'uuid';
import { createApp } from '../../api/app';
import type { Config } from '../../api/config';
import { asOwner, openDatabase, type AsOwner, type Database } from '../../api/platform/db/doors';
import { accessTokens } from '../../api/platform/http/accessToken';
import { ACCESS_COOKIE, REFRESH_COOKIE } from '../../api/platform/http/cookies';
import { createLogger } from '../../api/platform/logger';
import type { Services } from '../../api/platform/services';
import type { Role, Route } from '../../shared/contract';
import {
  storeFixtures,
  type FixtureOrganisation,
  type FixturePerson,
  type Fixtures,
} from './fixtures';
import { freshDatabase } from './freshDatabase';

/** Of every unsafe request that comes from our own pages. */
export const ourHeaders = { 'X-Lampline': '1', 'Sec-Fetch-Site': 'same-origin' } as const;

export interface Sending {
  /** Sent as `If-Match: "n"`. */
  readonly ifMatch?: number;
  /** Idempotency key; made where the method writes and none is given. */
  readonly key?: string;
  readonly headers?: Readonly<Record<string, string>>;
}

type Send = (path: string, body?: object | string, sending?: Sending) => Test;

/** Requests as one person, or as nobody. */
export interface Visitor {
  readonly get: (path: string, headers?: Readonly<Record<string, string>>) => Test;
  readonly post: Send;
  readonly patch: Send;
  readonly put: Send;
  readonly delete: Send;
}

export interface TestServer {
  readonly url: string;
  readonly config: Config;
  readonly services: Services;
  readonly database: Database;
  readonly mounted: readonly Route[];
  /** Express itself, for what its router holds. */
  readonly app: Express;
  /** Two organisations (`ours`, `theirs`) with one person of each role and a running session each. */
  readonly fixtures: Fixtures;
  /** Moves the server's clock on, milliseconds; access tokens keep to the real one. */
  advance(milliseconds: number): void;
  asOwner<T>(work: (owner: AsOwner) => Promise<T>): Promise<T>;
  /** `Cookie` header of a fixture's session. Supertest's agent drops Secure cookies, so it is passed. */
  cookies(person: FixturePerson): string;
  /** Requests with a fixture token: no sign-in, no hash. */
  as(role: Role, organisation?: FixtureOrganisation): Visitor;
  /** Requests without any cookie. */
  readonly nobody: Visitor;
  /** Requests with this `Cookie` header. */
  withCookies(cookie: string): Visitor;
  stop(): Promise<void>;
}

/** The real application on a free port, over a database of its own with the fixtures in it. */
export async function startTestServer(
  logger: Logger = createLogger('silent'),
): Promise<TestServer> {
  const fresh = await freshDatabase();
  const fixtures = await asOwner(fresh.ownerUrl, storeFixtures);
  const clientFolder = mkdtempSync(join(tmpdir(), 'lampline-client-'));
  writeFileSync(join(clientFolder, 'index.html'), '<!doctype html><title>Lampline</title>');
  writeFileSync(join(clientFolder, 'main-ABCDEFGH.js'), 'void 0;');
  const config: Config = {
    port: 0,
    databaseUrl: fresh.applicationUrl,
    secret: Buffer.alloc(32, 7),
    logLevel: 'silent',
    clientFolder,
    build: 'test',
    trustedProxies: undefined,
  };
  const database = openDatabase(fresh.applicationUrl);
  let ahead = 0;
  const services: Services = {
    config,
    database,
    clock: () => new Date(Date.now() + ahead),
    ids: () => v7(),
    logger,
  };
  const { app, mounted } = createApp(services);
  const server = createServer(app);
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const url = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  const tokens = accessTokens(config.secret);
  const cookies = (person: FixturePerson) =>
    `${ACCESS_COOKIE}=${tokens.issue(person, new Date()).token}; ${REFRESH_COOKIE}=${person.refreshToken}`;

  return {
    url,
    config,
    services,
    database,
    mounted,
    app,
    fixtures,
    advance: (milliseconds) => (ahead += milliseconds),
    asOwner: (work) => asOwner(fresh.ownerUrl, work),
    cookies,
    as: (role, organisation = 'ours') => visitor(url, cookies(fixtures[organisation][role])),
    nobody: visitor(url),
    withCookies: (cookie) => visitor(url, cookie),
    async stop() {
      server.closeAllConnections();
      await new Promise<void>((resolve) => server.close(() => resolve()));
      await database.close();
      await fresh.drop();
      rmSync(clientFolder, { recursive: true, force: true });
    },
  };
}

function visitor(url: string, cookie?: string): Visitor {
  const signed = cookie === undefined ? {} : { Cookie: cookie };
  const send =
    (method: 'post' | 'patch' | 'put' | 'delete'): Send =>
    (path, body, { ifMatch, key, headers } = {}) => {
      const test = supertest(url)
        [method](path)
        .set({ ...signed, ...ourHeaders, 'Idempotency-Key': key ?? v7() });
      if (ifMatch !== undefined) void test.set('If-Match', `"${ifMatch}"`);
      if (body !== undefined) void test.set('Content-Type', 'application/json');
      if (headers) void test.set(headers);
      return body === undefined ? test : test.send(body);
    };
  return {
    get: (path, headers = {}) =>
      supertest(url)
        .get(path)
        .set({ ...signed, ...headers }),
    post: send('post'),
    patch: send('patch'),
    put: send('put'),
    delete: send('delete'),
  };
}
