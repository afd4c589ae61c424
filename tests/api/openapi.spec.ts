import { afterAll, beforeAll, expect, it } from 'vitest';
import { startTestServer, type TestServer } from './server';

let server: TestServer;
beforeAll(async () => void (server = await startTestServer()));
afterAll(() => server.stop());

it('describes every route that is mounted, and no other', async () => {
  const { body } = await server.nobody.get('/api/openapi.json').expect(200);
  const document = body as { openapi: string; paths: Record<string, Record<string, unknown>> };
  expect(document.openapi).toMatch(/^3\.1/);
  const described = Object.entries(document.paths).flatMap(([path, operations]) =>
    Object.keys(operations).map((method) => `${method} ${path}`),
  );
  const mounted = server.mounted.map(
    ({ method, path }) => `${method} ${path.replace(/:(\w+)/g, '{$1}')}`,
  );
  expect(described.sort()).toEqual([...new Set(mounted)].sort());
});
