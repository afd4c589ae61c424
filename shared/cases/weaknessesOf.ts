import type { CaseState } from './caseState';
import { pointsToReadAgain, readAgain } from './pointsToReadAgain';
import type { EvidenceWeakness, Say } from './weakness';
import { weaknessesOfFinding } from './weaknessesOfFinding';
import { weaknessesOfTimes } from './weaknessesOfTimes';

/** Runs in both directions after a repair: fewer show little (common practice). */
const FEW_RUNS = 2;

/** Weaknesses of the evidence of a closed case, grave ones first (trade.md 4.3, common practice). */
export function weaknessesOf(state: CaseState): readonly EvidenceWeakness[] {
  const found: EvidenceWeakness[] = [];
  const say: Say = (weight, code, when, details = {}) => {
    if (when) found.push({ code, weight, details });
  };
  for (const { code, part } of state.dangers) {
    say('grave', 'danger', true, { danger: code, part: part ?? '' });
  }
  weaknessesOfArrival(state, say);
  if (state.outcome === 'repaired') {
    weaknessesOfFinding(state, say);
    weaknessesOfReturn(state, say);
  }
  weaknessesOfLinks(state, say);
  weaknessesOfTimes(state, say);
  return found.sort((a, b) => Number(b.weight === 'grave') - Number(a.weight === 'grave'));
}

function weaknessesOfArrival({ arrival, outcome }: CaseState, say: Say): void {
  say('grave', 'no-arrival', !arrival && outcome !== 'no access');
  say('grave', 'people-not-safe', arrival?.peopleSafe === false);
  say('note', 'notices-not-up', arrival?.noticesUp === false);
  say('note', 'meter-not-proven', arrival?.meterProven === false);
}

/** What was shown between the repair and the closing. */
function weaknessesOfReturn(state: CaseState, say: Say): void {
  for (const { device, result } of state.proven) {
    say('grave', 'device-did-not-stop', result === 'did not stop', { device });
    say('grave', 'device-not-provable', result === 'not possible', { device });
  }
  const unread = pointsToReadAgain(state).filter((point) => !readAgain(state, point));
  say('grave', 'not-read-again', unread.length > 0, { points: unread.length });
  const { service } = state;
  const runs = service?.runs ?? 0;
  say('grave', 'no-runs', runs === 0);
  say('note', 'few-runs', runs > 0 && runs < FEW_RUNS, { runs });
  say('note', 'covers-off', service?.coversOn === false);
  const replaced = state.repairs.some(({ parts }) => parts.length > 0);
  const onlyReset = !replaced && state.repairs.every(({ what }) => ONLY_RESET.test(what));
  say('note', 'reset-only', state.repairs.length > 0 && onlyReset);
}

/** A repair whose few words are about a reset: *reset and left* is no repair. */
const ONLY_RESET = /^\W*(?:\w+\W+){0,4}reset\b(?:\W+\w+){0,3}\W*$/i;

function weaknessesOfLinks({ links, arrival }: CaseState, say: Say): void {
  const fitted = links.filter(({ found }) => !found).length;
  const found = links.length - fitted;
  say('note', 'link-used', fitted > 0, { links: fitted });
  say('grave', 'link-found', found > 0, { links: found });
  say('note', 'links-miscounted', (arrival?.linksFound ?? 0) !== found);
}

/** Dangers and grave weaknesses weigh most, then notes; practice cases least. Larger is first. */
export function riskOf(state: CaseState): number {
  const weaknesses = weaknessesOf(state);
  const grave = weaknesses.filter(({ weight }) => weight === 'grave').length;
  const notes = weaknesses.length - grave;
  return (
    (state.dangers.length * RISK.danger + grave * RISK.grave + notes * RISK.note) *
    (state.practice ? RISK.practice : 1)
  );
}

/** Weights of the queue's order (judgement: one danger before any number of notes). */
const RISK = { danger: 100, grave: 10, note: 1, practice: 0.1 } as const;
