import { tagsOf } from '../circuit';
import type { Stopping } from './advice';
import { setUpKey } from './belief';
import type { Consultation } from './consultation';
import type { ReadingObservation } from './observation';

/** Condition (b) of the stopping rule. */
export const BELIEVED = 0.95;
/** Condition (c): what stays with any one set-up left out. */
export const WITHOUT_ONE_PAIR = 0.9;
/** Condition (d): the most that may be believed of *not described*. */
export const MOST_NOT_DESCRIBED = 0.02;

/** The reading that measured a part of the class directly: both probes on its own terminals. */
export function directReading(
  about: Consultation,
  members: readonly number[],
): ReadingObservation | undefined {
  const parts = new Set(about.partsOf(members));
  return about.readings.find(({ red, black }) =>
    about.circuit.parts.some((part) => {
      const tags = tagsOf(part);
      return parts.has(part.name) && tags.includes(red) && tags.includes(black) && red !== black;
    }),
  );
}

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
