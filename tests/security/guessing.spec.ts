import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { PASSWORD } from '../api/fixtures';
import { startTestServer, type TestServer } from '../api/server';
import { amount } from '../amount';

// S10: many guesses on one account, one guess on many accounts. A refused guess is never verified.
let server: TestServer;
beforeAll(async () => void (server = await startTestServer()));
afterAll(() => server.stop());

/** Most guesses of 10,000 that may reach the hash. */
const MOST_VERIFIED = 50;
const TOGETHER = 20;

async function guess(count: number, emailOf: (n: number) => string): Promise<Map<number, number>> {
  const statuses = new Map<number, number>();
  for (let n = 0; n < count; n += TOGETHER) {
    const answers = await Promise.all(
      Array.from({ length: TOGETHER }, (_, i) =>
        server.nobody.post('/api/session', { email: emailOf(n + i), password: `guess ${n + i}` }),
      ),
    );
    for (const { status } of answers) statuses.set(status, (statuses.get(status) ?? 0) + 1);
  }
  return statuses;
}

describe('Guesses', () => {
  it('on one account: few are verified, and its known device still gets in', async () => {
    const { email } = server.fixtures.ours.supervisor;
    const first = await server.nobody.post('/api/session', { email, password: PASSWORD });
    expect(first.status).toBe(200);
    const lines = first.headers['set-cookie'] as unknown as string[];
    const known = lines.map((line) => line.split(';', 1)[0]).join('; ');
    const statuses = await guess(amount(400, 10_000), () => email);
    expect(statuses.get(401)).toBeLessThanOrEqual(MOST_VERIFIED);
    expect([...statuses.keys()].sort()).toEqual([401, 429]);
    const again = await server
      .withCookies(known)
      .post('/api/session', { email, password: PASSWORD });
    expect(again.status).toBe(200);
  });

  it('on many accounts from one address: few are verified', async () => {
    const statuses = await guess(amount(400, 10_000), (n) => `person${n}@ours.example`);
    expect(statuses.get(401) ?? 0).toBeLessThanOrEqual(MOST_VERIFIED);
    expect([...statuses.keys()].sort()).toEqual([401, 429]);
  });
});
