import type { Circuit, LiftState } from '../circuit';
import { solve } from '../solver';
import { bandOf, NONE } from './bands';
import { meterFunctions } from './meterFunctions';
import { USUAL_METER, type MeterFunction } from './observation';

export interface ReadingToDescribe {
  readonly red: string;
  readonly black: string;
  readonly function: MeterFunction;
  /** Red minus black, volts. */
  readonly volts: number;
  readonly state: LiftState;
  /** Volts at the string's start as the readings make them; default: as drawn. */
  readonly supplyVolts?: number;
}

export interface ReadingDescription {
  /** `unknown` where the function can't show what stands between these tags, or a tag is not drawn. */
  readonly level: 'full' | 'none' | 'between' | 'unknown';
  /** The sign is the other way round than the circuit can make it: red and black were exchanged. */
  readonly swapped: boolean;
  /** More than anything in this circuit can make, or no number, or alternating volts below none. */
  readonly implausible: boolean;
}

/** Over the largest supply's volts: a smoothed rectifier gives the peak, and mains may be a quarter high. */
const MOST_OVER_SUPPLY = Math.SQRT2 * 1.25;

/** What a reading is, for a lamp on the line. Never throws. */
export function describeReading(circuit: Circuit, given: ReadingToDescribe): ReadingDescription {
  const { red, black, volts } = given;
  const direct = given.function === 'dc volts';
  const implausible =
    !Number.isFinite(volts) || Math.abs(volts) > mostVolts(circuit) || (!direct && volts < 0);
  const known = (tag: string) => circuit.terminals.some((each) => each.tag === tag);
  const shows = meterFunctions(circuit)(red, black) === given.function;
  if (!Number.isFinite(volts) || !known(red) || !known(black) || red === black || !shows) {
    return { level: 'unknown', swapped: false, implausible };
  }
  const healthy = solve(circuit, given.state, []).read({ red, black, meterOhms: USUAL_METER.ohms });
  const scale = (given.supplyVolts ?? circuit.nominalVolts) / circuit.nominalVolts;
  const should = (direct ? healthy.mean : healthy.ripple) * scale;
  const string = circuit.nominalVolts * scale;
  // Before a bridge the whole is another voltage than the string's; across a closed part there is none.
  const full = Math.abs(should) > NONE * string ? Math.abs(should) : string;
  const least = NONE * string;
  const against = should < -least ? volts > least : volts < -least;
  return { level: bandOf(volts, full), swapped: direct && against, implausible };
}

/** The most that a meter could show anywhere in the circuit, volts. */
function mostVolts(circuit: Circuit): number {
  const supplies = circuit.parts.flatMap((part) => (part.kind === 'supply' ? part.volts : []));
  const ratios = circuit.parts.flatMap((part) => (part.kind === 'transformer' ? part.ratio : []));
  const ratio = Math.max(1, ...ratios);
  return Math.max(circuit.nominalVolts, ...supplies.map((v) => v * ratio)) * MOST_OVER_SUPPLY;
}
