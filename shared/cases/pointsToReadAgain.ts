import type { LiftState } from '../circuit';
import type { ReadingObservation } from '../diagnosis';
import type { CaseState, PointToReadAgain } from './caseState';

/** A reading under this share of the largest one before the repair counts as dead. */
const DEAD_SHARE = 0.5;

/** `red black`, as closing names a point. */
export const pointKey = ({ red, black }: Pick<ReadingObservation, 'red' | 'black'>): string =>
  `${red} ${black}`;

const sameState = (a: LiftState, b: LiftState): boolean =>
  [...new Set([...Object.keys(a), ...Object.keys(b)])].every((name) => a[name] === b[name]);

const samePoint = (a: PointToReadAgain, b: PointToReadAgain): boolean =>
  a.function === b.function &&
  sameState(a.state, b.state) &&
  ((a.red === b.red && a.black === b.black) || (a.red === b.black && a.black === b.red));

/**
 * The points that show whether the repair holds: those that read dead, the one measured directly on
 * the part, and the supply proof (the largest reading). Points that were healthy say nothing new.
 */
export function pointsToReadAgain(state: CaseState): readonly PointToReadAgain[] {
  const before = state.seen
    .filter(({ stage }) => stage === 'finding')
    .map(({ observation }) => observation)
    .filter((observation) => observation.kind === 'reading');
  const largest = Math.max(0, ...before.map(({ volts }) => Math.abs(volts)));
  const proof = state.finding?.proof;
  const direct = proof?.kind === 'measured' ? proof.reading : undefined;
  const supply = before.find(({ volts }) => Math.abs(volts) === largest);
  const points: PointToReadAgain[] = [];
  for (const reading of before) {
    const { id, red, black, function: meterFunction, state: lift, volts } = reading;
    const dead = Math.abs(volts) < DEAD_SHARE * largest;
    if (!dead && id !== direct && reading !== supply) continue;
    const point = { red, black, function: meterFunction, state: lift };
    if (state.unreachable.includes(red) || state.unreachable.includes(black)) continue;
    if (!points.some((other) => samePoint(other, point))) points.push(point);
  }
  return points;
}

/** Whether the point was read since the last repair. */
export function readAgain(state: CaseState, point: PointToReadAgain): boolean {
  const last = state.repairs.at(-1);
  if (!last) return false;
  const lastRepairAt = state.log.findLastIndex(({ type }) => type === 'repair done');
  const since = new Set(state.log.slice(lastRepairAt).map(({ id }) => id));
  return state.seen.some(
    ({ observation }) =>
      observation.kind === 'reading' && since.has(observation.id) && samePoint(observation, point),
  );
}
