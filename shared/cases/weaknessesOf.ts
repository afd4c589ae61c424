import type { CaseState } from './caseState';
import { pointsToReadAgain, readAgain } from './pointsToReadAgain';

/** What a supervisor should look at before accepting; sentences: `weakness.<code>`. */
export interface EvidenceWeakness {
  readonly code: string;
  readonly weight: 'grave' | 'note';
  readonly details: Readonly<Record<string, string | number>>;
}

/** Fewer readings than this before a finding are worth a question (two prove supply and return). */
const FEW_READINGS = 3;
/** A cause in fewer characters says no more than the device's name. */
const SHORT_CAUSE = 12;
/** A case from opening to closing in less is worth a question, minutes. */
const HASTY_MINUTES = 4;
const FEW_RUNS = 2;

/** Weaknesses of the evidence of a closed case, grave ones first (trade.md 4.3, common practice). */
export function weaknessesOf(state: CaseState): readonly EvidenceWeakness[] {
  const found: EvidenceWeakness[] = [];
  const say = (
    weight: EvidenceWeakness['weight'],
    code: string,
    when: boolean,
    details: EvidenceWeakness['details'] = {},
  ) => {
    if (when) found.push({ code, weight, details });
  };
  const readings = state.seen.flatMap(({ observation, stage }) =>
    observation.kind === 'reading' ? [{ ...observation, stage }] : [],
  );
  const before = readings.filter(({ stage }) => stage === 'finding');
  const repaired = state.outcome === 'repaired';

  for (const { code, part } of state.dangers)
    say('grave', 'danger', true, { danger: code, part: part ?? '' });
  for (const { device, result } of state.proven) {
    say('grave', 'device-did-not-stop', result === 'did not stop', { device });
    say('grave', 'device-not-provable', result === 'not possible', { device });
  }
  say('grave', 'no-arrival', !state.arrival && state.outcome !== 'no access');
  say('grave', 'people-not-safe', state.arrival?.peopleSafe === false);
  say('note', 'notices-not-up', state.arrival?.noticesUp === false);
  if (repaired) {
    say('grave', 'not-measured', state.finding?.proof.kind === 'not possible');
    say('grave', 'seen-not-measured', state.finding?.proof.kind === 'seen');
    say('grave', 'no-readings', before.length === 0);
    say('note', 'few-readings', before.length > 0 && before.length < FEW_READINGS, {
      readings: before.length,
    });
    say('grave', 'supply-not-proven', !supplyProven(before));
    say('note', 'rests-on-one-reading', state.finding?.restsOnOneReading === true);
    say('note', 'cause-not-said', (state.finding?.cause.length ?? 0) < SHORT_CAUSE);
    say(
      'grave',
      'not-read-again',
      pointsToReadAgain(state).some((point) => !readAgain(state, point)),
    );
    say('note', 'few-runs', (state.service?.runs ?? 0) < FEW_RUNS, {
      runs: state.service?.runs ?? 0,
    });
    say('note', 'covers-off', state.service?.coversOn === false);
    say('note', 'hasty', minutesOnSite(state) < HASTY_MINUTES, {
      minutes: Math.round(minutesOnSite(state)),
    });
  }
  say(
    'note',
    'link-used',
    state.links.some(({ found }) => !found),
    { links: state.links.length },
  );
  say(
    'grave',
    'link-found',
    state.links.some(({ found: foundThere }) => foundThere),
  );
  say(
    'note',
    'links-miscounted',
    (state.arrival?.linksFound ?? 0) !== state.links.filter((link) => link.found).length,
  );
  return found.sort((a, b) => Number(b.weight === 'grave') - Number(a.weight === 'grave'));
}

/** A live reading was the first or second: else a dead reading may be a dead meter. */
function supplyProven(readings: readonly { readonly volts: number }[]): boolean {
  const largest = Math.max(0, ...readings.map(({ volts }) => Math.abs(volts)));
  return largest > 0 && readings.slice(0, 2).some(({ volts }) => Math.abs(volts) > largest / 2);
}

function minutesOnSite({ openedAt, closedAt }: CaseState): number {
  return closedAt ? (Date.parse(closedAt) - Date.parse(openedAt)) / 60_000 : 0;
}

/** Dangers and grave weaknesses weigh most, then notes; practice cases least. Larger is first. */
export function riskOf(state: CaseState): number {
  const weaknesses = weaknessesOf(state);
  const grave = weaknesses.filter(({ weight }) => weight === 'grave').length;
  const notes = weaknesses.length - grave;
  return (state.dangers.length * 100 + grave * 10 + notes) * (state.practice ? 0.1 : 1);
}
