import { stringTags, tagsOf, travelOf, type Circuit } from '../circuit';
import type { AdviceRequest } from './advice';
import type { MeterFunction } from './observation';

/** Two probes that one place reaches, in the lift state as it is. Nothing here works or moves anything. */
export interface Candidate {
  readonly red: string;
  readonly black: string;
  readonly function: MeterFunction;
  readonly place: string;
  readonly minutes: number;
  /** Both probes on the two ends of a part. */
  readonly across: boolean;
}

export function functionOf(circuit: Circuit): MeterFunction {
  return circuit.stringCurrent === 'direct' ? 'dc volts' : 'ac volts';
}

/**
 * The permitted readings from here: string tags to the return and to the supply's other pole, and
 * across each part that a place reaches at both ends. Only a digital meter is ever put across a part:
 * a lamp or a low impedance there is a partial bridge.
 */
export function candidatesOf(circuit: Circuit, request: AdviceRequest): readonly Candidate[] {
  if (request.meter.kind !== 'digital') return [];
  const barred = new Set(request.unreachable);
  const travel = travelOf(circuit);
  const places = new Map(
    circuit.terminals.map(({ tag, places: own, reachable }) => [
      tag,
      reachable && !barred.has(tag) ? own : [],
    ]),
  );
  const range = functionOf(circuit);
  const found = new Map<string, Candidate>();
  const offer = (red: string, black: string, across: boolean) => {
    const key = `${red} ${black} ${range}`;
    if (red === black || found.has(key) || request.declined.includes(key)) return;
    const shared = (places.get(red) ?? []).filter((place) => places.get(black)?.includes(place));
    for (const place of shared) {
      const minutes = travel.minutesToRead(request.place, place);
      const best = found.get(key);
      if (Number.isFinite(minutes) && (!best || minutes < best.minutes)) {
        found.set(key, { red, black, function: range, place, minutes, across });
      }
    }
  };
  // Parts first: the return wire's own two tags are also string tags, and across a part proves most.
  for (const part of circuit.parts) {
    const tags = tagsOf(part);
    if (tags.length === 2) offer(tags[0]!, tags[1]!, true);
  }
  for (const line of circuit.strings) {
    for (const tag of stringTags(circuit, line)) {
      offer(tag, line.return, false);
      offer(tag, line.supplyReturn, false);
    }
    offer(line.return, line.supplyReturn, false);
  }
  return [...found.values()];
}
