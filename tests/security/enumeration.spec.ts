import { afterAll, beforeAll, expect, it } from 'vitest';
import { warmUp } from '../../api/platform/password';
import { amount } from '../amount';
import { startTestServer, type TestServer } from '../api/server';

// S9: how long a refused sign-in takes does not tell whether the account is there.
let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
  await warmUp();
});
afterAll(() => server.stop());

/** Largest difference of the medians, milliseconds (security.md). */
const MOST_APART = 5;
/** Longer than every bucket of guesses needs to run dry, milliseconds. */
const BUCKETS_DRY = 2 * 3600 * 1000;

const median = (values: number[]) =>
  values.sort((a, b) => a - b)[Math.floor(values.length / 2)] ?? NaN;

it('A known and an unknown account are refused in the same time', async () => {
  const time = async (email: string) => {
    server.advance(BUCKETS_DRY);
    const begun = performance.now();
    await server.nobody.post('/api/session', { email, password: 'not this one' }).expect(401);
    return performance.now() - begun;
  };
  const known: number[] = [];
  const unknown: number[] = [];
  // In turns: what else the machine does falls on both alike.
  for (let n = 0; n < amount(40, 400); n++) {
    known.push(await time('technician@ours.example'));
    unknown.push(await time(`nobody${n}@ours.example`));
  }
  expect(Math.abs(median(known) - median(unknown))).toBeLessThan(MOST_APART);
});
