import { sql } from 'drizzle-orm';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { createLogger } from '../../api/platform/logger';
import { PASSWORD } from './fixtures';
import { startTestServer, type TestServer } from './server';

let server: TestServer;
let lines: string[] = [];
beforeAll(async () => {
  server = await startTestServer(createLogger('debug', { write: (line) => void lines.push(line) }));
});
afterAll(() => server.stop());

it('Every line is JSON with the request’s id, and holds nothing secret', async () => {
  const { email, refreshToken } = server.fixtures.ours.technician;
  const signedIn = await server.nobody.post('/api/session', { email, password: PASSWORD });
  const cookies = (signedIn.headers['set-cookie'] as unknown as string[]).join('; ');
  await server.as('technician').get('/api/session?secret=in-the-query', {
    'X-Request-Id': 'log-line-0001',
  });
  const written = lines.map((line) => JSON.parse(line) as { req?: { id: string; path: string } });
  expect(written.find(({ req }) => req?.id === 'log-line-0001')?.req?.path).toBe('/api/session');
  const all = lines.join('');
  const values = [...cookies.matchAll(/=([\w.-]{20,})/g)].map(([, value]) => value!);
  expect(values.length).toBe(3);
  for (const secret of [PASSWORD, refreshToken, email, 'in-the-query', ...values]) {
    expect(all).not.toContain(secret);
  }
});

it('A failed query is logged without its values, and answered without any of it', async () => {
  lines = [];
  await server.asOwner(({ db }) => db.execute(sql`drop function door.person_by_email(text)`));
  const answer = await server.nobody.post('/api/session', {
    email: 'private@ours.example',
    password: 'words that nobody may read',
  });
  expect(answer.status).toBe(500);
  expect(JSON.stringify(answer.body)).not.toMatch(/door|select|at /);
  const all = lines.join('');
  expect(all).toContain('query failed');
  expect(all).not.toMatch(/private@ours|nobody may read/);
});
