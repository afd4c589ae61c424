import type { ReadingObservation } from '../diagnosis';
import type { CaseState } from './caseState';
import type { Say } from './weakness';

/** Fewer readings than this before a finding are worth a question (two prove supply and return). */
const FEW_READINGS = 3;
/** A cause in fewer characters says no more than the device's name. */
const SHORT_CAUSE = 12;
/** A reading above this share of the largest is live. */
const LIVE_SHARE = 0.5;
/** Different volts that are all multiples of {@link ROUND_VOLTS}: from memory, not from a display. */
const ROUND_NUMBERS = 3;
const ROUND_VOLTS = 10;
/** Cautions of places where people die; each has to be read before its reading. */
const OF_PLACES: ReadonlySet<string> = new Set(['shaft entry', 'car top', 'pit', 'landing door']);

/** How well a finding rests on its readings. */
export function weaknessesOfFinding(state: CaseState, say: Say): void {
  const { finding } = state;
  const readings = state.seen.flatMap(({ observation, stage }) =>
    observation.kind === 'reading' && stage === 'finding' ? [observation] : [],
  );
  say('grave', 'not-measured', finding?.proof.kind === 'not possible');
  say('grave', 'seen-not-measured', finding?.proof.kind === 'seen');
  say('grave', 'no-readings', readings.length === 0);
  say('note', 'few-readings', readings.length > 0 && readings.length < FEW_READINGS, {
    readings: readings.length,
  });
  say('grave', 'supply-not-proven', !supplyProven(readings));
  say('note', 'rests-on-one-reading', finding?.restsOnOneReading === true);
  say('note', 'cause-not-said', (finding?.cause.length ?? 0) < SHORT_CAUSE);
  say('note', 'round-numbers', allRound(readings));
  say('note', 'differs-from-advice', differsFromAdvice(state));
  const unread = cautionsUnread(state);
  say('note', 'cautions-not-acknowledged', unread.length > 0, { places: unread.join(', ') });
}

/** A live reading was the first or second: else a dead reading may be a dead meter. */
function supplyProven(readings: readonly ReadingObservation[]): boolean {
  const largest = Math.max(0, ...readings.map(({ volts }) => Math.abs(volts)));
  return (
    largest > 0 && readings.slice(0, 2).some(({ volts }) => Math.abs(volts) > largest * LIVE_SHARE)
  );
}

function allRound(readings: readonly ReadingObservation[]): boolean {
  const volts = new Set(readings.map((reading) => Math.abs(reading.volts)).filter((v) => v > 0));
  return volts.size >= ROUND_NUMBERS && [...volts].every((each) => each % ROUND_VOLTS === 0);
}

/** Whether something was stated that the likeliest class of the last advice does not hold. */
function differsFromAdvice({ finding, advice }: CaseState): boolean {
  const shown = advice.at(-1)?.suspects[0];
  if (!finding || !shown) return false;
  const parts = new Set(shown.faults.map(({ part }) => part));
  return !finding.faults.some(({ part }) => parts.has(part));
}

/** Places where a suggested reading was taken without its caution having been read, once each. */
function cautionsUnread({ advice, seen, acknowledged }: CaseState): readonly string[] {
  const answered = new Set(seen.map(({ answers }) => answers));
  const places = advice.flatMap(({ id, step }) => {
    if (step.kind !== 'suggestion' || !answered.has(id)) return [];
    const { cautions, place } = step.suggestion;
    const unread = cautions.filter(
      (code) => OF_PLACES.has(code) && !acknowledged.some((read) => read.code === code),
    );
    return unread.length > 0 ? [place] : [];
  });
  return [...new Set(places)];
}
