import express from 'express';
import { request } from 'node:http';
import supertest from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { z } from 'zod';
import { mounting } from '../../api/platform/http/mount';
import { problemOf, translateErrors } from '../../api/platform/http/problem';
import { Refusal } from '../../api/platform/refusal';
import { problemSchema, routes } from '../../shared/contract';
import { startTestServer, type TestServer } from './server';

let server: TestServer;
beforeAll(async () => void (server = await startTestServer()));
afterAll(() => server.stop());

const codeOf = (answer: { body: unknown }) => problemSchema.parse(answer.body).code;
const signIn = { email: 'nobody@ours.example', password: 'x' };

describe('Unsafe requests', () => {
  const from = (headers: Record<string, string>) => {
    const all: Record<string, string | undefined> = {
      'X-Lampline': '1',
      'Sec-Fetch-Site': undefined,
      ...headers,
    };
    return new Promise<number>((resolve, reject) => {
      const set = Object.fromEntries(
        Object.entries(all).filter(([, value]) => value !== undefined),
      );
      const sent = request(
        `${server.url}/api/session`,
        { method: 'POST', headers: { 'Content-Type': 'application/json', ...set } as never },
        (answer) => {
          answer.resume();
          resolve(answer.statusCode ?? 0);
        },
      );
      sent.on('error', reject);
      sent.end(JSON.stringify(signIn));
    });
  };

  it('are let in from our own pages only', async () => {
    expect(await from({ 'Sec-Fetch-Site': 'same-origin' })).toBe(401);
    expect(await from({ Origin: server.url })).toBe(401);
    for (const site of ['cross-site', 'same-site', 'none']) {
      expect(await from({ 'Sec-Fetch-Site': site }), site).toBe(403);
    }
    expect(await from({ Origin: 'https://elsewhere.example' })).toBe(403);
    expect(await from({ Origin: 'null' })).toBe(403);
    expect(await from({})).toBe(403);
    expect(await from({ 'Sec-Fetch-Site': 'same-origin', 'X-Lampline': '0' })).toBe(403);
  });

  it('are JSON, well formed and not too large', async () => {
    const { nobody } = server;
    const form = await nobody.post('/api/session', 'email=a', {
      headers: { 'Content-Type': 'application/x-www-form-urlencoded' },
    });
    expect([form.status, codeOf(form)]).toEqual([415, 'unsupported_media_type']);
    const broken = await nobody.post('/api/session', '{"email":');
    expect([broken.status, codeOf(broken)]).toEqual([400, 'malformed_json']);
    const large = await nobody.post('/api/session', { ...signIn, more: 'x'.repeat(300_000) });
    expect([large.status, codeOf(large)]).toEqual([413, 'body_too_large']);
  });
});

describe('Every answer', () => {
  it('carries the request id that came, or a new one', async () => {
    const given = await server.nobody.get('/api/health', { 'X-Request-Id': 'from-the-browser-1' });
    expect(given.headers['x-request-id']).toBe('from-the-browser-1');
    const forged = await server.nobody.get('/api/health', { 'X-Request-Id': 'a b {"level":60}' });
    expect(forged.headers['x-request-id']).toMatch(/^[0-9a-f-]{36}$/);
    const missing = await server.nobody.get('/api/nothing', { 'X-Request-Id': 'missing-0001' });
    expect(problemSchema.parse(missing.body)).toMatchObject({
      status: 404,
      code: 'not_found',
      requestId: 'missing-0001',
    });
  });

  it('is a problem where nobody is signed in', async () => {
    const session = await server.nobody.get('/api/session');
    expect([session.status, codeOf(session)]).toEqual([401, 'not_signed_in']);
  });
});

describe('The translator', () => {
  it('takes any thrown value and lets nothing of it out', () => {
    const thrown = [new Error('secret words'), 'text', undefined, null, 42, { status: 'odd' }, []];
    for (const value of thrown) {
      const problem = problemOf(value);
      expect(problemSchema.parse(problem)).toMatchObject({ status: 500, code: 'internal' });
      expect(JSON.stringify(problem)).not.toContain('secret');
    }
  });

  it('knows when the database is away, and a feature that refuses', () => {
    const away = new Error('x', { cause: Object.assign(new Error(), { code: '57P01' }) });
    expect(problemOf(away)).toMatchObject({ status: 503, code: 'unavailable' });
    expect(problemOf(new Refusal('people.last'))).toMatchObject({ status: 422 });
  });
});

describe('A versioned and keyed route', () => {
  let done = 0;
  const change = {
    method: 'patch',
    path: '/api/numbers/:id',
    summary: 'For this spec.',
    roles: ['engineer'],
    params: z.object({ id: z.coerce.number() }),
    body: z.object({ add: z.number() }),
    answer: z.object({ sum: z.number(), version: z.number() }),
    versioned: true,
    keyed: true,
  } as const;

  beforeAll(() => {
    // Mounted as the application mounts its own.
    const app = express();
    const person = server.fixtures.ours.engineer;
    const { mount } = mounting({
      app,
      services: server.services,
      callerOf: () => Promise.resolve({ ...person, until: new Date(), role: 'engineer' as const }),
    });
    mount(change, ({ params, body, ifMatch, inside }) =>
      inside(async () => {
        if (ifMatch !== 3) throw new Refusal('version_conflict', { current: { version: 3 } });
        done++;
        return { sum: params.id + body.add, version: 4, secret: 'not named by the schema' };
      }),
    );
    app.use(translateErrors(server.services.logger));
    send = (headers, body = { add: 2 }, id = '40') =>
      supertest(app).patch(`/api/numbers/${id}`).set(headers).send(body);
  });
  let send: (
    headers: Record<string, string>,
    body?: object,
    id?: string,
  ) => Promise<{ status: number; body: unknown; headers: Record<string, string> }>;

  it('is a problem where the path cannot be decoded', async () => {
    const answer = await send({}, {}, '%E0%A4%A');
    expect([answer.status, codeOf(answer)]).toEqual([400, 'invalid_request']);
  });

  it('asks for the version and the key', async () => {
    expect(codeOf(await send({ 'Idempotency-Key': 'key-00001' }))).toBe('version_missing');
    expect(codeOf(await send({ 'If-Match': '"3"' }))).toBe('key_missing');
    expect(codeOf(await send({ 'If-Match': '3', 'Idempotency-Key': 'key-00001' }))).toBe(
      'invalid_request',
    );
  });

  it('says what the row is now when the version has moved on', async () => {
    const answer = await send({ 'If-Match': '"2"', 'Idempotency-Key': 'key-00002' });
    expect(answer.status).toBe(412);
    expect(problemSchema.parse(answer.body)).toMatchObject({
      code: 'version_conflict',
      details: { current: { version: 3 } },
    });
  });

  it('is done once for a key, even when both come at once, and answers the same', async () => {
    const before = done;
    const headers = { 'If-Match': '"3"', 'Idempotency-Key': 'key-00003' };
    const answers = await Promise.all([send(headers), send(headers), send(headers)]);
    for (const { status, body, headers: got } of answers) {
      expect([status, body]).toEqual([200, { sum: 42, version: 4 }]);
      expect(got['etag']).toBe('"4"');
    }
    expect(done - before).toBe(1);
    const other = await send(headers, { add: 3 });
    expect([other.status, codeOf(other)]).toEqual([422, 'key_reused']);
  });
});

describe('GET /api/openapi.json', () => {
  it('describes every route of the contract', async () => {
    const { body } = await server.nobody.get('/api/openapi.json').expect(200);
    const { openapi, paths } = body as { openapi: string; paths: Record<string, object> };
    expect(openapi).toBe('3.1.0');
    for (const { method, path } of Object.values(routes)) {
      expect(paths[path.replace(/:(\w+)/g, '{$1}')], path).toHaveProperty(method);
    }
  });
});

describe('The client’s files', () => {
  it('answer pages for navigations and 404 for unknown assets', async () => {
    const page = await server.nobody.get('/lifts/some-lift').expect(200);
    expect(page.type).toBe('text/html');
    expect(page.headers['cache-control']).toBe('no-cache');
    expect(page.headers['content-security-policy']).toContain("script-src 'self';");
    await server.nobody.get('/main-12345678.js').expect(404);
    await server.nobody.get('/../../etc/passwd.txt').expect(404);
    await server.nobody.get('/api').expect(404);
  });

  it('are kept for ever when they are named by their content', async () => {
    const asset = await server.nobody.get('/main-ABCDEFGH.js').expect(200);
    expect(asset.headers['cache-control']).toBe('public, max-age=31536000, immutable');
  });
});
