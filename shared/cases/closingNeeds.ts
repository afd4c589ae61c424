import type { CaseState, ClosingNeed } from './caseState';
import type { OutcomeOfCase } from './payloads';
import { pointKey, pointsToReadAgain, readAgain } from './pointsToReadAgain';

/** Devices that a repair touched and that were not operated since, in the order touched. */
export function devicesToProve(state: CaseState): readonly string[] {
  const touched = new Set(state.repairs.flatMap(({ devices }) => devices));
  if (state.finding && state.repairs.length > 0) touched.add(state.finding.device);
  const proven = new Set(state.proven.map(({ device }) => device));
  return [...touched].filter((device) => !proven.has(device));
}

const linksOut = (state: CaseState) => state.links.filter(({ removedAt }) => !removedAt);

/** Links that were there on arrival and stand in the register. */
const entered = (state: CaseState): number => state.links.filter(({ found }) => found).length;

/** A measured finding whose reading was taken back rests on nothing. */
function proofStands({ finding, seen }: CaseState): boolean {
  const proof = finding?.proof;
  return (
    proof?.kind !== 'measured' || seen.some(({ observation }) => observation.id === proof.reading)
  );
}

/**
 * What still stands between this case and its closing with an outcome (records.md, *Outcomes*).
 * Empty: it may be closed.
 */
export function closingNeeds(state: CaseState, outcome: OutcomeOfCase): readonly ClosingNeed[] {
  const needs: ClosingNeed[] = [];
  const need = (code: ClosingNeed['code'], what: readonly string[]) => {
    if (what.length > 0) needs.push({ code, what });
  };
  const missing = (code: ClosingNeed['code'], present: boolean) => {
    if (!present) needs.push({ code, what: [] });
  };

  if (outcome !== 'no access') missing('arrival missing', state.arrival !== undefined);
  need(
    'links out',
    linksOut(state).map(({ mark }) => mark),
  );
  missing('found links not entered', entered(state) >= (state.arrival?.linksFound ?? 0));
  need(
    'people in the shaft',
    state.people.filter(({ left }) => !left).map(({ who }) => who),
  );
  const disturbed = state.disturbed.filter(({ restoredAt }) => !restoredAt).map(({ what }) => what);
  const dangers = state.dangers.map(({ part, code }) => part ?? code);
  if (outcome === 'left isolated') {
    missing(
      'isolation not proven',
      Boolean(state.isolated?.provenDead && state.isolated.noticeFitted && state.isolated.told),
    );
    const named = state.isolated?.left ?? [];
    missing('nothing named as left', disturbed.length + dangers.length === 0 || named.length > 0);
  } else {
    need('things disturbed', disturbed);
    need('danger unreleased', dangers);
  }
  if (outcome === 'repaired') {
    missing('finding missing', state.finding !== undefined);
    missing('proof missing', proofStands(state));
    missing('still isolated', state.isolated === undefined);
    missing('repair missing', state.repairs.length > 0);
    if (state.repairs.length > 0) {
      need(
        'points not read again',
        pointsToReadAgain(state)
          .filter((point) => !readAgain(state, point))
          .map(pointKey),
      );
      need('devices not proven', devicesToProve(state));
    }
    missing('not returned to service', state.service !== undefined);
  }
  return needs;
}
