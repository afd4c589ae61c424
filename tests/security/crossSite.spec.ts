import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { problemSchema, routes } from '../../shared/contract';
import { startTestServer, type TestServer } from '../api/server';

// S8: each unsafe route refuses what another site's form or fetch can send with the person's cookies.
let server: TestServer;
beforeAll(async () => void (server = await startTestServer()));
afterAll(() => server.stop());

const unsafe = Object.entries(routes).filter(([, { method }]) => method !== 'get');
const attacks: Record<string, string>[] = [
  { 'Sec-Fetch-Site': 'cross-site' },
  { 'Sec-Fetch-Site': 'same-site' },
  { 'Sec-Fetch-Site': 'cross-site', Origin: 'https://elsewhere.example' },
  { 'X-Lampline': '' },
  { 'X-Lampline': '', 'Content-Type': 'text/plain' },
  { 'X-Lampline': '', 'Content-Type': 'application/x-www-form-urlencoded' },
  { 'X-Lampline': '', 'Content-Type': 'multipart/form-data; boundary=x' },
  { 'Sec-Fetch-Site': 'none' },
];

describe.each(unsafe)('%s', (_name, { method, path }) => {
  it('refuses every cross-site request', async () => {
    const visitor = server.as('administrator');
    const address = path.replace(/:\w+/g, server.fixtures.ours.technician.personId);
    const send = method === 'get' ? undefined : visitor[method];
    for (const headers of attacks) {
      const answer = await send!(address, '{}', { headers, ifMatch: 1 });
      expect(answer.status, JSON.stringify(headers)).toBe(403);
      expect(problemSchema.parse(answer.body).code).toBe('cross_site');
    }
  });
});
