import type { CaseState } from './caseState';
import type { Say } from './weakness';

const MINUTE = 60_000;
/** A repaired case from opening to closing in less is worth a question, minutes. */
const HASTY_MINUTES = 4;
/** The device's clock was set back by more than this between two entries, minutes. */
const SET_BACK_MINUTES = 2;

/** Times of the device's clock that can't be as they are written. */
export function weaknessesOfTimes(state: CaseState, say: Say): void {
  const { openedAt, closedAt, outcome } = state;
  const minutes = closedAt ? (Date.parse(closedAt) - Date.parse(openedAt)) / MINUTE : undefined;
  say('note', 'hasty', outcome === 'repaired' && minutes !== undefined && minutes < HASTY_MINUTES, {
    minutes: Math.max(0, Math.round(minutes ?? 0)),
  });
  say('note', 'clock-set-back', clockSetBack(state));
}

/** Per device: two devices' clocks may differ. */
function clockSetBack({ log }: CaseState): boolean {
  const last = new Map<string, number>();
  return log.some(({ device, recordedAt }) => {
    const at = Date.parse(recordedAt);
    const before = last.get(device) ?? at;
    last.set(device, at);
    return before - at > SET_BACK_MINUTES * MINUTE;
  });
}
