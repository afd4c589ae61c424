import argon2 from 'argon2';
import { Refusal } from './refusal';

/** security.md: argon2id with at least these; `memoryCost` in KiB. */
const PARAMETERS = { memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;
/** Hashes at work at a time: each takes 19 MiB and a thread of the four that Node has. */
const MOST_AT_WORK = 3;
/** Hashes that wait for one at work; at some 25 ms each the last one waits a third of a second. */
const MOST_WAITING = 40;

let atWork = 0;
const waiting: (() => void)[] = [];

async function inTurn<T>(hash: () => Promise<T>): Promise<T> {
  if (atWork >= MOST_AT_WORK) {
    if (waiting.length >= MOST_WAITING) throw new Refusal('busy', { retryAfter: 1 });
    await new Promise<void>((resolve) => waiting.push(resolve));
  } else {
    atWork++;
  }
  try {
    return await hash();
  } finally {
    // The place is handed on, not given up: nobody can slip in between.
    const next = waiting.shift();
    if (next) next();
    else atWork--;
  }
}

export const hashPassword = (password: string): Promise<string> =>
  inTurn(() => argon2.hash(password, { type: argon2.argon2id, ...PARAMETERS }));

/** Nobody's password: an unknown account costs the same work as a known one. */
let nobody: Promise<string> | undefined;
const hashOfNobody = () => (nobody ??= hashPassword('nobody signs in with this one'));

/**
 * @param stored undefined for an unknown account: the same work, then false
 * @throws Refusal `busy` when too many hashes wait
 */
export async function isPassword(password: string, stored: string | undefined): Promise<boolean> {
  const against = stored ?? (await hashOfNobody());
  const fits = await inTurn(() => argon2.verify(against, password));
  return fits && stored !== undefined;
}

/** Done before the first request, so that the first unknown account takes no longer than others. */
export const warmUp = async (): Promise<void> => void (await hashOfNobody());

/** Whether the stored hash was made with weaker parameters than today's. */
export const isOutdated = (stored: string): boolean => argon2.needsRehash(stored, PARAMETERS);
