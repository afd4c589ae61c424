/** Shockley's law with a series resistance: i = IS·(exp((v − i·RS) / (N·VT)) − 1). */
export interface DiodeLaw {
  /** IS, amperes. */
  readonly saturationAmps: number;
  /** N, without unit. */
  readonly emission: number;
  /** RS, ohms. */
  readonly seriesOhms: number;
  /** Conductance beside the junction, siemens; decides where a blocked bridge floats. Default 1e-12. */
  readonly leakSiemens?: number;
}

/** A power rectifier of about 1 A; the law behind the readings in `tests/reference/data`. */
export const POWER_RECTIFIER: DiodeLaw = { saturationAmps: 1e-9, emission: 1.7, seriesOhms: 0.05 };

/** kT/q at 27 °C, volts: the temperature that circuit simulators take unless told (CODATA 2018). */
export const THERMAL_VOLTS = 0.025864186;

/** Conductance beside every junction, siemens, as circuit simulators put it there. Keeps slopes above 0. */
export const JUNCTION_LEAK_SIEMENS = 1e-12;

/** Exponent above which a junction is continued as a straight line, so that nothing overflows. */
const MAX_EXPONENT = 80;

/** Junction current (A) and slope (S) at a junction voltage (V), written into `out` as [current, slope]. */
export function junction(law: DiodeLaw, volts: number, out: Float64Array): void {
  const scale = law.emission * THERMAL_VOLTS;
  const exponent = volts / scale;
  if (exponent > MAX_EXPONENT) {
    const top = law.saturationAmps * Math.exp(MAX_EXPONENT);
    out[0] = top * (1 + exponent - MAX_EXPONENT);
    out[1] = top / scale;
  } else {
    const grown = exponent < -MAX_EXPONENT ? 0 : law.saturationAmps * Math.exp(exponent);
    out[0] = grown - law.saturationAmps;
    out[1] = grown / scale;
  }
  const leak = law.leakSiemens ?? JUNCTION_LEAK_SIEMENS;
  out[0]! += leak * volts;
  out[1]! += leak;
}

/** Voltage above which a Newton step on a junction must be shortened, volts. */
export function criticalVolts(law: DiodeLaw): number {
  const scale = law.emission * THERMAL_VOLTS;
  return scale * Math.log(scale / (Math.SQRT2 * law.saturationAmps));
}

/**
 * A Newton step on a junction, shortened where the exponential would throw it far off: the step is then
 * taken along the logarithm of the current (Nagel's rule, as in SPICE 2, 1975).
 */
export function limitedStep(
  law: DiodeLaw,
  critical: number,
  wanted: number,
  before: number,
): number {
  const scale = law.emission * THERMAL_VOLTS;
  if (wanted <= critical || Math.abs(wanted - before) <= 2 * scale) return wanted;
  if (before > 0) {
    const argument = 1 + (wanted - before) / scale;
    return argument > 0 ? before + scale * Math.log(argument) : critical;
  }
  return scale * Math.log(wanted / scale);
}
