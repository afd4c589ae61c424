/** When to try again after a failed sending. Plain functions: chance and time come from outside. */

/** First wait, milliseconds. */
export const FIRST_WAIT = 1_000;
/** Longest wait between two tries, milliseconds. */
export const LONGEST_WAIT = 60_000;
/** Longest `Retry-After` that is believed, milliseconds. */
export const LONGEST_BELIEVED = 10 * 60_000;

export type SendFailure =
  /** No answer: no signal, or the server is gone. */
  | { readonly kind: 'unreachable' }
  /** The sign-in has ended: nothing is tried until someone signs in. */
  | { readonly kind: 'signed out' }
  | { readonly kind: 'answered'; readonly status: number; readonly retryAfterSeconds?: number };

/**
 * Milliseconds to wait before the next try; undefined where trying again by itself is of no use.
 * @param failures in a row, this one included
 * @param chance 0 to 1, spreads the devices that regain signal at once
 */
export function waitAfter(
  failure: SendFailure,
  failures: number,
  chance: number,
): number | undefined {
  if (failure.kind === 'signed out') return undefined;
  const doubled = Math.min(LONGEST_WAIT, FIRST_WAIT * 2 ** Math.max(0, failures - 1));
  const spread = doubled / 2 + (doubled / 2) * chance;
  if (failure.kind === 'answered' && failure.retryAfterSeconds !== undefined) {
    return Math.min(LONGEST_BELIEVED, Math.max(spread, failure.retryAfterSeconds * 1000));
  }
  return spread;
}
