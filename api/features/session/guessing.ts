import { Refusal } from '../../platform/refusal';
import type { Services } from '../../platform/services';
import { giveBackGuess, sweepGuesses, takeGuess, type Bucket } from './repository';
import { bucketOf, knownDevice } from './secrets';

/** Guesses at one account from one address. */
const ACCOUNT_AND_ADDRESS = { capacity: 8, secondsPerGuess: 30 };
/** Guesses at one account from everywhere. */
const ACCOUNT = { capacity: 25, secondsPerGuess: 120 };
/** Guesses from one address at all accounts; a right password does not count. */
const ADDRESS = { capacity: 40, secondsPerGuess: 60 };
/** Guesses on a device where the account has signed in before: its own, no stranger fills it. */
const KNOWN_DEVICE = { capacity: 10, secondsPerGuess: 60 };
/** After this long every bucket has run dry, milliseconds. */
const DRY_AFTER = 24 * 3600 * 1000;

/** What a sign-in is counted under. */
function bucketsFor(
  secret: Buffer,
  account: string,
  address: string,
  deviceMark: string | undefined,
): Bucket[] {
  const device = knownDevice(deviceMark, account, secret);
  if (device !== undefined) return [{ name: bucketOf('device', device), ...KNOWN_DEVICE }];
  return [
    { name: bucketOf('account and address', account, address), ...ACCOUNT_AND_ADDRESS },
    { name: bucketOf('address', address), ...ADDRESS },
    { name: bucketOf('account', account), ...ACCOUNT },
  ];
}

/**
 * Counts a guess before it is verified.
 * @returns what takes it back when the password was right
 * @throws Refusal `too_many_attempts` with `retryAfter` in seconds
 */
export async function countGuess(
  { database, config, clock }: Services,
  account: string,
  address: string,
  deviceMark: string | undefined,
): Promise<() => Promise<void>> {
  const buckets = bucketsFor(config.secret, account, address, deviceMark);
  const now = clock();
  const wait = await database.beforeSignIn(async (door) => {
    // Cheapest to fill first, and no further once one is full: a refused guess fills nothing else.
    for (const bucket of buckets) {
      const seconds = await takeGuess(door, bucket, now);
      if (seconds > 0) return Math.ceil(seconds);
    }
    return 0;
  });
  if (wait > 0) throw new Refusal('too_many_attempts', { retryAfter: wait });
  return () =>
    database.beforeSignIn(async (door) => {
      for (const bucket of buckets) await giveBackGuess(door, bucket);
      await sweepGuesses(door, new Date(now.getTime() - DRY_AFTER));
    });
}
