import type { Stopping } from './advice';
import { setUpKey } from './belief';
import type { Consultation } from './consultation';
import { directReading } from './directProof';
import type { ReadingObservation } from './observation';

/** Condition (b) of the stopping rule. */
export const BELIEVED = 0.95;
/** Condition (c): what stays with any one set-up left out. */
export const WITHOUT_ONE_PAIR = 0.9;
/** Condition (d): the most that may be believed of *not described*. */
export const MOST_NOT_DESCRIBED = 0.02;

/** The set-ups without which the class would no longer be believed. */
export function pillarsOf(
  about: Consultation,
  members: readonly number[],
): readonly ReadingObservation[] {
  const seen = new Set<string>();
  return about.readings.filter((reading) => {
    const key = setUpKey(reading);
    if (seen.has(key)) return false;
    seen.add(key);
    return about.share(members, about.without(key)) < WITHOUT_ONE_PAIR;
  });
}

export function stoppingOf(about: Consultation, members: readonly number[]): Stopping {
  return {
    direct: directReading(about, members) !== undefined,
    believed: about.share(members) >= BELIEVED,
    withoutAnyOnePair: pillarsOf(about, members).length === 0,
    described: about.belief.notDescribed < MOST_NOT_DESCRIBED,
    noDanger: about.dangers.length === 0,
  };
}
