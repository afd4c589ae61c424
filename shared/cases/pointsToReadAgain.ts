import type { LiftState } from '../circuit';
import type { ReadingObservation } from '../diagnosis';
import type { CaseState, PointToReadAgain } from './caseState';

/** A reading under this share of the supply proof was not healthy; healthy ones are above 0.95. */
const HEALTHY_SHARE = 0.8;

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
 * The points that show whether the repair holds: those that read less than the supply, the one measured
 * directly on the part, and the supply proof. Points that were healthy say nothing new.
 *
 * The fold knows no circuit. Its reference is where the black probe rested first; the supply proof is
 * the largest reading that touches it. Only readings against the reference, or against the supply
 * proof's own black tag, can be *dead*: across a closed contact 0 V is healthy.
 */
export function pointsToReadAgain(state: CaseState): readonly PointToReadAgain[] {
  const before = state.seen
    .filter(({ stage }) => stage === 'finding')
    .map(({ observation }) => observation)
    .filter((observation) => observation.kind === 'reading');
  const supply = supplyProof(before);
  const references = new Set([before[0]?.black, supply?.black]);
  const touches = ({ red, black }: ReadingObservation) =>
    references.has(red) || references.has(black);
  const proof = state.finding?.proof;
  const direct = proof?.kind === 'measured' ? proof.reading : undefined;
  const points: PointToReadAgain[] = [];
  for (const reading of before) {
    const { id, red, black, function: meterFunction, state: lift, volts } = reading;
    const dead = touches(reading) && Math.abs(volts) < HEALTHY_SHARE * Math.abs(supply?.volts ?? 0);
    if (!dead && id !== direct && reading !== supply) continue;
    const point = { red, black, function: meterFunction, state: lift };
    if (state.unreachable.includes(red) || state.unreachable.includes(black)) continue;
    if (!points.some((other) => samePoint(other, point))) points.push(point);
  }
  return points;
}

function supplyProof(before: readonly ReadingObservation[]): ReadingObservation | undefined {
  const reference = before[0]?.black;
  const touching = before.filter(({ red, black }) => red === reference || black === reference);
  const largest = Math.max(...touching.map(({ volts }) => Math.abs(volts)));
  return touching.find(({ volts }) => Math.abs(volts) === largest);
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
