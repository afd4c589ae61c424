import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { roles, routes, type Route } from '../../shared/contract';
import { startTestServer, type TestServer, type Visitor } from '../api/server';

// S12: headers, content policy and cookies on every route, errors included.
let server: TestServer;
beforeAll(async () => void (server = await startTestServer()));
afterAll(() => server.stop());

const all: readonly (readonly [string, Route])[] = Object.entries(routes);
type Headers = Readonly<Record<string, string | undefined>>;

function expectProtected(headers: Headers, where: string): void {
  expect(headers['x-content-type-options'], where).toBe('nosniff');
  expect(headers['x-frame-options'], where).toBe('DENY');
  expect(headers['referrer-policy'], where).toBe('no-referrer');
  expect(headers['strict-transport-security'], where).toMatch(/max-age=31536000/);
  expect(headers['cross-origin-resource-policy'], where).toBe('same-origin');
  expect(headers['x-request-id'], where).toBeTruthy();
  expect(headers['x-powered-by'], where).toBeUndefined();
  expect(headers['server'], where).toBeUndefined();
  expect(headers['access-control-allow-origin'], where).toBeUndefined();
}

const expectOfApi = (headers: Headers, where: string): void => {
  expectProtected(headers, where);
  expect(headers['cache-control'], where).toBe('no-store');
  expect(headers['content-security-policy'], where).toBe(
    "default-src 'none';frame-ancestors 'none'",
  );
};

const ask = (visitor: Visitor, { method, path }: Route) => {
  const address = path.replace(/:\w+/g, 'not-there');
  return method === 'get' ? visitor.get(address) : visitor[method](address, {});
};

describe.each(all)('%s', (name, route) => {
  it('has the headers of the API, for every role and for nobody', async () => {
    const visitors = [server.nobody, ...roles.map((role) => server.as(role))];
    for (const visitor of visitors) {
      // Signing out would end the fixtures' sessions.
      if (name === 'signOut' && visitor !== server.nobody) continue;
      const { headers, status } = await ask(visitor, route);
      expectOfApi(headers as Headers, `${name} ${status}`);
      expect(status, name).toBeLessThan(500);
    }
  });
});

describe('What is no route', () => {
  it('has the headers of the API too', async () => {
    for (const path of ['/api', '/api/nothing', '/api/people/../../x']) {
      const { headers, status } = await server.nobody.get(path);
      if (status !== 200) expectProtected(headers as Headers, path);
    }
    const refused = await server.nobody.post(
      '/api/session',
      {},
      { headers: { 'X-Lampline': '0' } },
    );
    expect(refused.status).toBe(403);
    expectOfApi(refused.headers as Headers, 'cross-site');
  });
});

describe('Documents and assets', () => {
  const policy =
    "default-src 'none';base-uri 'self';script-src 'self';style-src 'self' 'unsafe-inline';" +
    "img-src 'self' data: blob:;font-src 'self';connect-src 'self';worker-src 'self';" +
    "manifest-src 'self';object-src 'none';frame-ancestors 'none';form-action 'self';" +
    "require-trusted-types-for 'script';trusted-types angular angular#components dompurify default";

  it.each(['/', '/lifts', '/main-ABCDEFGH.js', '/missing.js'])('%s', async (path) => {
    const { headers } = await server.nobody.get(path);
    expectProtected(headers as Headers, path);
    expect((headers as Headers)['content-security-policy']).toBe(policy);
  });
});

describe('Cookies', () => {
  it('are set by the session’s routes only', async () => {
    for (const [name, route] of all) {
      if (route.path.startsWith('/api/session')) continue;
      const { headers } = await ask(server.as('technician'), route);
      expect((headers as Headers)['set-cookie'], name).toBeUndefined();
    }
  });
});
