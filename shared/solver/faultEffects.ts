import type { Fault } from '../circuit/circuit';

/** Resistance of what is open: a broken wire, an open contact, a blown fuse; ohms. Common practice in solvers. */
export const OPEN_OHMS = 1e9;
/** A diode burnt through, ohms. */
export const SHORTED_DIODE_OHMS = 0.01;
/** An earth fault whose resistance is not given, ohms. */
export const EARTH_FAULT_OHMS = 1;
/** Effective turns left of a partly shorted coil where the fault does not say. */
export const PARTLY_SHORTED_TURNS = 0.5;

/** The least that a fault can bring a resistance down to, ohms: as little as a part may have. */
export const LEAST_OHMS = 1e-6;

export type DiodeState = 'open' | 'shorted';

/** What a set of faults changes, by part name: what stamping and the relays look up. */
export interface FaultEffects {
  /** Ohms in place of the part's own. */
  readonly ohms: ReadonlyMap<string, number>;
  /** Contacts that stay closed whatever their condition or relay says. */
  readonly notOpening: ReadonlySet<string>;
  /** Factor on the volts of a supply or the ratio of a transformer. */
  readonly voltsFactor: ReadonlyMap<string, number>;
  /** By bridge, the diodes 1 to 4 that are not as they should be. */
  readonly diodes: ReadonlyMap<string, ReadonlyMap<number, DiodeState>>;
  /** Factor on the effective turns of a coil. */
  readonly turns: ReadonlyMap<string, number>;
  /** Armatures that do not move. */
  readonly stuck: ReadonlyMap<string, 'in' | 'out'>;
  readonly earths: readonly { readonly tag: string; readonly ohms: number }[];
}

/** Faults together; where two change the same property of a part, the later one holds. */
export function effectsOf(faults: readonly Fault[]): FaultEffects {
  const ohms = new Map<string, number>();
  const notOpening = new Set<string>();
  const voltsFactor = new Map<string, number>();
  const diodes = new Map<string, Map<number, DiodeState>>();
  const turns = new Map<string, number>();
  const stuck = new Map<string, 'in' | 'out'>();
  const earths: { tag: string; ohms: number }[] = [];
  const replace = (part: string, value: number | undefined) => {
    if (value !== undefined) ohms.set(part, Math.max(value, LEAST_OHMS));
  };
  for (const fault of faults) {
    switch (fault.mode) {
      case 'open':
      case 'blown':
        ohms.set(fault.part, OPEN_OHMS);
        break;
      case 'dead':
        ohms.set(fault.part, OPEN_OHMS);
        voltsFactor.set(fault.part, 0);
        break;
      case 'resistive':
      case 'weak':
        replace(fault.part, fault.ohms);
        break;
      case 'not opening':
        notOpening.add(fault.part);
        replace(fault.part, fault.ohms);
        break;
      case 'low':
      case 'high':
        voltsFactor.set(fault.part, fault.factor ?? 1);
        break;
      case 'diode open':
      case 'diode shorted': {
        const own = diodes.get(fault.part) ?? new Map<number, DiodeState>();
        own.set(fault.diode ?? 1, fault.mode === 'diode open' ? 'open' : 'shorted');
        diodes.set(fault.part, own);
        break;
      }
      case 'partly shorted':
        turns.set(fault.part, fault.factor ?? PARTLY_SHORTED_TURNS);
        replace(fault.part, fault.ohms);
        break;
      case 'stuck in':
        stuck.set(fault.part, 'in');
        break;
      case 'stuck out':
        stuck.set(fault.part, 'out');
        break;
      case 'earth':
        earths.push({
          tag: fault.part,
          ohms: Math.max(fault.ohms ?? EARTH_FAULT_OHMS, LEAST_OHMS),
        });
        break;
    }
  }
  return { ohms, notOpening, voltsFactor, diodes, turns, stuck, earths };
}
