import type { Circuit } from '../circuit';
import type { AdviceRequest, Suggestion } from './advice';

/** Why something may never be suggested (engine.md, *Forbidden as candidates*). */
export type ForbiddenCode =
  | 'lamp or low impedance across a part'
  | 'condition that moves, without people and motion'
  | 'not reached together'
  | 'no caution for live terminals'
  | 'shaft entry without its caution';

const SHAFT_CAUTIONS = ['shaft entry', 'pit', 'car top'] as const;

/**
 * Whether a suggestion breaks a rule; undefined if it may be shown. Bridges, relays pushed in, moving the
 * lift with devices bypassed and ohms on live parts have no form in a suggestion at all; what a
 * suggestion can say is checked here, for every one that leaves the engine.
 */
export function forbidden(
  circuit: Circuit,
  request: AdviceRequest,
  suggestion: Suggestion,
): ForbiddenCode | undefined {
  const { cautions, state } = suggestion;
  const changed = circuit.conditions.some(
    ({ name, moves }) => moves && state[name] !== undefined && state[name] !== request.state[name],
  );
  if (changed && !cautions.includes('people and motion')) {
    return 'condition that moves, without people and motion';
  }
  if (suggestion.kind !== 'reading') return undefined;
  if (!cautions.includes('live terminals')) return 'no caution for live terminals';
  const { red, black, place } = suggestion;
  const reached = (tag: string | undefined) =>
    circuit.terminals.some(
      (each) =>
        each.tag === tag &&
        each.reachable &&
        each.places.includes(place) &&
        !request.unreachable.includes(each.tag),
    );
  if (!reached(red) || !reached(black)) return 'not reached together';
  const isReturn = (tag: string | undefined) =>
    circuit.strings.some((line) => tag === line.return || tag === line.supplyReturn);
  const toReturn = isReturn(red) !== isReturn(black);
  if (request.meter.kind !== 'digital' && !toReturn) return 'lamp or low impedance across a part';
  const shaft = circuit.places.find(({ name }) => name === place)?.shaft ?? false;
  return shaft && !SHAFT_CAUTIONS.some((code) => cautions.includes(code))
    ? 'shaft entry without its caution'
    : undefined;
}
