import type { RelayPosition } from '../circuit';
import type { Meter } from './observation';
import type { Prediction } from './predictions';

/** Share of readings that are mistaken: wrong tag, wrong function, misread (judgement, 0 to 0.2). */
export const SLIP = 0.02;
/** Share of readings taken with the probes the wrong way round, which turns the sign (judgement). */
export const SWAPPED = 0.03;
/** One standard deviation of the model itself, beside the supply: resistances as drawn (judgement). */
export const MODEL_ERROR = 0.012;
/** The least standard deviation of a comparison, volts: leakage and resistances not drawn. */
export const LEAST_DEVIATION_VOLTS = 0.3;
/** Share of relay positions that are mistaken when seen (judgement). */
export const RELAY_SLIP = 0.01;

/** One standard deviation of what the meter shows where this is predicted, volts. */
export function deviationOf(volts: number, meter: Meter): number {
  return Math.hypot(
    (volts * meter.accuracyPercent) / 100,
    volts * MODEL_ERROR,
    meter.stepVolts,
    LEAST_DEVIATION_VOLTS,
  );
}

/** Density of a reading anywhere on the scale, per volt: what a slip or a thing not drawn shows. */
export function anywhere(scaleVolts: number): number {
  return 1 / (2.4 * scaleVolts);
}

/**
 * Share of readings of one set-up that are mistaken after it agreed with itself this many times. Half of
 * the slips are fresh and would not repeat themselves; half persist (wrong tag, wrong function), and no
 * repeat shows them.
 */
export function slipAfter(times: number): number {
  return SLIP / 2 + (SLIP / 2) ** times;
}

/** How many deviations a reading is off a prediction, whichever way round the probes were. */
export function deviationsOff(volts: number, predicted: number, meter: Meter, spread = 0): number {
  const off = Math.min(Math.abs(volts - predicted), Math.abs(volts + predicted));
  return off / Math.hypot(deviationOf(predicted, meter), spread);
}

/** Density of the shown volts if this prediction holds. `slip` is the share of mistaken readings. */
export function readingLikelihood(
  volts: number,
  predicted: Prediction,
  meter: Meter,
  scaleVolts: number,
  slip = SLIP,
): number {
  const flat = anywhere(scaleVolts);
  if (predicted.floating) {
    return floatingLikelihood(volts, predicted.volts, meter, scaleVolts, slip);
  }
  const deviation = Math.hypot(deviationOf(predicted.volts, meter), predicted.spread);
  return (1 - slip) * eitherWay(volts, predicted.volts, deviation) + slip * flat;
}

/** Density of the volts around a prediction, and around its negative for probes that were swapped. */
function eitherWay(volts: number, predicted: number, deviation: number): number {
  const around = (centre: number) => Math.exp(-(((volts - centre) / deviation) ** 2) / 2);
  const both = (1 - SWAPPED) * around(predicted) + SWAPPED * around(-predicted);
  return both / (deviation * Math.sqrt(2 * Math.PI));
}

/** A floating point shows at most this share of the string's volts: coupled cores, damp (common practice). */
export const FLOATING_MOST = 0.65;
/** How often the solved value holds where a point floats; else anything up to the most (judgement). */
const FLOATING_AS_SOLVED = 0.7;
/** One standard deviation of a floating point's solved value, of the string's volts (judgement). */
const FLOATING_DEVIATION = 0.02;

/** A floating point is an interval, not a number: near what leakage as drawn gives, or anywhere below. */
function floatingLikelihood(
  volts: number,
  solved: number,
  meter: Meter,
  scaleVolts: number,
  slip: number,
): number {
  const deviation = Math.hypot(deviationOf(solved, meter), FLOATING_DEVIATION * scaleVolts);
  const peak = eitherWay(volts, solved, deviation);
  const most = FLOATING_MOST * scaleVolts;
  const inside = Math.abs(volts) <= most ? 1 / (2 * most) : 0;
  const drawn = FLOATING_AS_SOLVED * peak + (1 - FLOATING_AS_SOLVED) * inside;
  return (1 - slip) * drawn + slip * anywhere(scaleVolts);
}

export function relayLikelihood(seen: RelayPosition, predicted: RelayPosition | undefined): number {
  return seen === predicted ? 1 - RELAY_SLIP : RELAY_SLIP / 2;
}
