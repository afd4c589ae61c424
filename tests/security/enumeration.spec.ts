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

async function time(email: string): Promise<number> {
  server.advance(BUCKETS_DRY);
  const begun = performance.now();
  await server.nobody.post('/api/session', { email, password: 'not this one' }).expect(401);
  return performance.now() - begun;
}

/** Difference of the medians of `pairs` refusals of each kind, milliseconds. */
async function differenceOf(pairs: number): Promise<number> {
  const known: number[] = [];
  const unknown: number[] = [];
  const takeKnown = async () => known.push(await time('technician@ours.example'));
  const takeUnknown = async (n: number) => unknown.push(await time(`nobody${n}@ours.example`));
  // In turns, and each first every other time: what else the machine does falls on both alike.
  for (let n = 0; n < pairs; n++) {
    if (n % 2 === 0) await takeKnown();
    await takeUnknown(n);
    if (n % 2 === 1) await takeKnown();
  }
  return Math.abs(median(known) - median(unknown));
}

/**
 * A machine that is busy with other things blurs a round; a path that is really shorter shows in every
 * one. So the clearest of a few rounds is judged.
 */
const MOST_ROUNDS = 10;

it('A known and an unknown account are refused in the same time', async () => {
  let clearest = Infinity;
  for (let round = 0; round < MOST_ROUNDS && clearest >= MOST_APART; round++) {
    clearest = Math.min(clearest, await differenceOf(amount(25, 400)));
  }
  expect(clearest).toBeLessThan(MOST_APART);
});
