import { EARTH, type Circuit, type Fault, type FaultMode, type Part } from './circuit';
import { modesOf } from './partKinds';
import { tagsOf } from './tags';

/**
 * Ohms of a resistive contact or joint: a grid of which each step is about a factor of three.
 * Under 10 ohm nothing shows beside relay coils of some kilohms; above 10 kohm it reads as an open.
 * In between the drop at a coil of 0.5 to 9 kohm goes from a hundredth to nearly all of the supply.
 */
export const RESISTIVE_OHMS: readonly number[] = [10, 100, 300, 1000, 3000, 10_000];
/** Inner ohms of a supply with a bad joint or a tired winding. */
export const WEAK_OHMS: readonly number[] = [30, 100, 300];
/** Of the volts: wrong tap with a low mains, one winding half, half of the volts gone. */
export const LOW_FACTORS: readonly number[] = [0.85, 0.7, 0.5];
/** Of the volts: next tap up, and one more. */
export const HIGH_FACTORS: readonly number[] = [1.1, 1.25];
/** Effective turns left of a partly shorted coil. */
export const TURNS_FACTORS: readonly number[] = [0.5];
/** Ohms of a conductor rubbed through on metal (judgement, from the trade's readings of 3 to 15 ohm). */
export const EARTH_OHMS = 3;
/** Weight of an earth at a terminal, of the weights of the parts that meet there (judgement). */
export const EARTH_SHARE = 0.01;

/** A single fault with its prior weight: the part's weight times the share of the mode. No fixed sum. */
export interface WeightedFault {
  readonly fault: Fault;
  readonly weight: number;
}

/** Every single fault that the circuit can have, zero weights left out, in the order of its parts. */
export function singleFaults(circuit: Circuit): readonly WeightedFault[] {
  return [...circuit.parts.flatMap(partFaults), ...earthFaults(circuit)];
}

/** The same text for the same fault. */
export function faultKey({ part, mode, ohms, factor, diode }: Fault): string {
  return [part, mode, ohms ?? '', factor ?? '', diode ?? ''].join('|');
}

function partFaults(part: Part): readonly WeightedFault[] {
  if (part.weight === 0) return [];
  const modes = modesOf(part).filter(({ mode }) => mode !== 'not opening' || canOpen(part));
  const sum = modes.reduce((total, { share }) => total + share, 0);
  return modes.flatMap(({ mode, share }) => {
    const variants = variantsOf(part, mode);
    const weight = (part.weight * share) / sum / variants.length;
    return variants.map((variant) => ({ fault: { part: part.name, mode, ...variant }, weight }));
  });
}

/** A contact that no state opens reads the same whether it could open or not. */
function canOpen(part: Part): boolean {
  return part.kind === 'contact' && (part.condition !== undefined || part.relay !== undefined);
}

function variantsOf(part: Part, mode: FaultMode): readonly Omit<Fault, 'part' | 'mode'>[] {
  switch (mode) {
    case 'resistive':
      return RESISTIVE_OHMS.filter((ohms) => !('ohms' in part) || ohms > 2 * part.ohms).map(
        (ohms) => ({ ohms }),
      );
    case 'weak':
      return WEAK_OHMS.map((ohms) => ({ ohms }));
    case 'low':
      return LOW_FACTORS.map((factor) => ({ factor }));
    case 'high':
      return HIGH_FACTORS.map((factor) => ({ factor }));
    case 'partly shorted':
      return TURNS_FACTORS.map((factor) => ({ factor }));
    case 'diode open':
    case 'diode shorted':
      return ([1, 2, 3, 4] as const).map((diode) => ({ diode }));
    default:
      return [{}];
  }
}

function earthFaults(circuit: Circuit): readonly WeightedFault[] {
  const weights = new Map<string, number>(circuit.terminals.map(({ tag }) => [tag, 0]));
  const joined = new Set<string>();
  for (const part of circuit.parts) {
    const tags = tagsOf(part);
    if (part.kind === 'link' && tags.includes(EARTH)) tags.forEach((tag) => joined.add(tag));
    for (const tag of tags) {
      if (weights.has(tag)) weights.set(tag, weights.get(tag)! + part.weight);
    }
  }
  return circuit.terminals
    .filter(({ tag }) => !joined.has(tag) && weights.get(tag)! > 0)
    .map(({ tag }) => ({
      fault: { part: tag, mode: 'earth', ohms: EARTH_OHMS },
      weight: weights.get(tag)! * EARTH_SHARE,
    }));
}
