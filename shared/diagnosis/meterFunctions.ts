import { EARTH, tagsOf, type Circuit } from '../circuit';
import type { MeterFunction } from './observation';

/** The function that shows what stands between two tags. */
export type FunctionBetween = (red: string, black: string) => MeterFunction;

const made = new WeakMap<Circuit, FunctionBetween>();

/**
 * Alternating volts where both tags are on the alternating side, direct volts where both are on the
 * direct side of a bridge; between the sides the string's own. On the other function a meter shows none
 * of the volts, and so proves nothing.
 */
export function meterFunctions(circuit: Circuit): FunctionBetween {
  let between = made.get(circuit);
  if (!between) {
    const alternating = alternatingTags(circuit);
    const ofString: MeterFunction = circuit.stringCurrent === 'direct' ? 'dc volts' : 'ac volts';
    between = (red, black) =>
      alternating.has(red) === alternating.has(black)
        ? alternating.has(red)
          ? 'ac volts'
          : 'dc volts'
        : ofString;
    made.set(circuit, between);
  }
  return between;
}

/** What hangs on an alternating supply without a bridge between; earth joins nothing here. */
function alternatingTags(circuit: Circuit): ReadonlySet<string> {
  const found = new Set<string>();
  const next: string[] = [];
  const reach = (tags: readonly string[]) => {
    for (const tag of tags) {
      if (tag === EARTH || found.has(tag)) continue;
      found.add(tag);
      next.push(tag);
    }
  };
  for (const part of circuit.parts) {
    if (part.kind === 'supply' && part.current === 'alternating') reach(part.between);
  }
  for (let tag = next.pop(); tag !== undefined; tag = next.pop()) {
    for (const part of circuit.parts) {
      if (part.kind !== 'bridge' && tagsOf(part).includes(tag)) reach(tagsOf(part));
    }
  }
  return found;
}
