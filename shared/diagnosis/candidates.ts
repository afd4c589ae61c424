import { stringTags, travelOf, type Circuit, type LiftState, type Part } from '../circuit';
import type { AdviceRequest } from './advice';
import { meterFunctions } from './meterFunctions';
import type { MeterFunction } from './observation';

/** Two probes that one place reaches, in a lift state. */
export interface Candidate {
  readonly red: string;
  readonly black: string;
  readonly function: MeterFunction;
  readonly place: string;
  readonly minutes: number;
  readonly state: LiftState;
  /** Parts whose own two ends the probes are on. */
  readonly across: readonly string[];
}

/** Setting a condition: people told and clear, motor and brake feed made safe, minutes (judgement). */
export const CONDITION_MINUTES = 2;

/**
 * The permitted readings from here in a lift state: string tags to the return and to the supply's other
 * pole, and across each part that a place reaches at both ends. Only a digital meter is ever put across a
 * part: a lamp or a low impedance there is a partial bridge.
 * @param state the lift state to read in; by default as it is
 */
export function candidatesOf(
  circuit: Circuit,
  request: AdviceRequest,
  state: LiftState = request.state,
): readonly Candidate[] {
  if (request.meter.kind !== 'digital') return [];
  const barred = new Set(request.unreachable);
  const travel = travelOf(circuit);
  const places = new Map(
    circuit.terminals.map(({ tag, places: own, reachable }) => [
      tag,
      reachable && !barred.has(tag) ? own : [],
    ]),
  );
  const functions = meterFunctions(circuit);
  const setting = state === request.state ? 0 : CONDITION_MINUTES;
  const across = partsByEnds(circuit);
  const found = new Map<string, Candidate>();
  const offer = (red: string, black: string) => {
    const range = functions(red, black);
    const key = `${red} ${black} ${range}`;
    if (red === black || found.has(key) || request.declined.includes(key)) return;
    const shared = (places.get(red) ?? []).filter((place) => places.get(black)?.includes(place));
    for (const place of shared) {
      const minutes = travel.minutesToRead(request.place, place) + setting;
      const best = found.get(key);
      if (Number.isFinite(minutes) && (!best || minutes < best.minutes)) {
        const parts = across.get(endsKey(red, black)) ?? [];
        found.set(key, { red, black, function: range, place, minutes, state, across: parts });
      }
    }
  };
  for (const line of circuit.strings) {
    for (const tag of stringTags(circuit, line)) {
      offer(tag, line.return);
      offer(tag, line.supplyReturn);
    }
    offer(line.return, line.supplyReturn);
  }
  for (const part of circuit.parts) offer(...endsOf(part));
  return [...found.values()];
}

/** Where a part is measured by itself: its two ends, or what it gives out. */
function endsOf(part: Part): readonly [string, string] {
  if (part.kind === 'transformer') return part.secondary;
  return part.kind === 'bridge' ? [part.between[2], part.between[3]] : part.between;
}

const endsKey = (a: string, b: string): string => (a < b ? `${a}|${b}` : `${b}|${a}`);

function partsByEnds(circuit: Circuit): ReadonlyMap<string, readonly string[]> {
  const parts = new Map<string, string[]>();
  for (const part of circuit.parts) {
    const key = endsKey(...endsOf(part));
    parts.set(key, [...(parts.get(key) ?? []), part.name]);
  }
  return parts;
}
