import { ApiError } from '../session/api-error';

/** When to try again after a failed sending. Plain functions: chance and time come from outside. */

/** First wait, milliseconds. */
export const FIRST_WAIT = 1_000;
/** Longest wait between two tries, milliseconds. */
export const LONGEST_WAIT = 60_000;
/** Longest `Retry-After` that is believed, milliseconds. */
export const LONGEST_BELIEVED = 10 * 60_000;

/** Why nothing was delivered. None of them ever counts as delivered. */
export type SendFailure =
  /** No answer: no signal, or the server is gone. */
  | { readonly kind: 'unreachable' }
  /** The sign-in has ended: nothing is tried until someone signs in. */
  | { readonly kind: 'signed out' }
  /** The request was too large for the server or for something on the way. */
  | { readonly kind: 'too large' }
  | { readonly kind: 'answered'; readonly status: number; readonly retryAfterSeconds?: number }
  /** Something broke on this phone. */
  | { readonly kind: 'broken'; readonly message: string };

const UNAUTHENTICATED = 401;
const TOO_LARGE = 413;

export function failureOf(error: unknown): SendFailure {
  if (!(error instanceof ApiError)) {
    return { kind: 'broken', message: error instanceof Error ? error.message : String(error) };
  }
  const { status, retryAfterSeconds } = error;
  if (status === 0) return { kind: 'unreachable' };
  if (status === UNAUTHENTICATED) return { kind: 'signed out' };
  if (status === TOO_LARGE) return { kind: 'too large' };
  return { kind: 'answered', status, retryAfterSeconds };
}

/** How long the server asked for quiet, as far as that is believed; milliseconds. */
export function believed(failure: SendFailure): number {
  const seconds = failure.kind === 'answered' ? (failure.retryAfterSeconds ?? 0) : 0;
  return Math.min(LONGEST_BELIEVED, seconds * 1000);
}

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
  return Math.max(spread, believed(failure));
}
