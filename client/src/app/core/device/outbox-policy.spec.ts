import { ApiError } from '../session/api-error';
import {
  FIRST_WAIT,
  LONGEST_BELIEVED,
  LONGEST_WAIT,
  failureOf,
  waitAfter,
  type SendFailure,
} from './outbox-policy';

const unreachable: SendFailure = { kind: 'unreachable' };

describe('when to try again', () => {
  it('waits longer after each failure, up to a bound', () => {
    const waits = [1, 2, 3, 4].map((failures) => waitAfter(unreachable, failures, 1));
    expect(waits).toEqual([FIRST_WAIT, 2 * FIRST_WAIT, 4 * FIRST_WAIT, 8 * FIRST_WAIT]);
    expect(waitAfter(unreachable, 50, 1)).toBe(LONGEST_WAIT);
  });

  it('spreads phones that regain signal at once over half of the wait', () => {
    expect(waitAfter(unreachable, 1, 0)).toBe(FIRST_WAIT / 2);
    expect(waitAfter(unreachable, 1, 0.5)).toBe(FIRST_WAIT * 0.75);
  });

  it('obeys Retry-After, and does not believe every number', () => {
    const asked = (retryAfterSeconds: number): SendFailure => ({
      kind: 'answered',
      status: 429,
      retryAfterSeconds,
    });
    expect(waitAfter(asked(120), 1, 0)).toBe(120_000);
    expect(waitAfter(asked(1e9), 1, 0)).toBe(LONGEST_BELIEVED);
  });

  it('does not try by itself after the sign-in has ended', () => {
    expect(waitAfter({ kind: 'signed out' }, 1, 0)).toBeUndefined();
  });
});

describe('why nothing was delivered', () => {
  it.each([
    [0, 'unreachable'],
    [401, 'signed out'],
    [403, 'answered'],
    [409, 'answered'],
    [413, 'too large'],
    [429, 'answered'],
    [500, 'answered'],
    [503, 'answered'],
  ])('reads status %i as %s', (status, kind) => {
    expect(failureOf(new ApiError(status, 'any', '')).kind).toBe(kind);
  });

  it('takes any thrown value', () => {
    expect(failureOf(new TypeError('gone'))).toEqual({ kind: 'broken', message: 'gone' });
    expect(failureOf('gone').kind).toBe('broken');
  });
});
