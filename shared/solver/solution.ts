import type { RelayPosition } from '../circuit/circuit';

/**
 * Two probes and the meter's own impedance. The reading is red minus black. Either may be `EARTH`: the
 * mass of the building, as if a probe reached it.
 */
export interface Probes {
  readonly red: string;
  readonly black: string;
  /** Ohms; 10e6 for a usual digital meter. */
  readonly meterOhms: number;
}

/** What settles between two terminals with the meter connected. Volts. */
export interface SettledReading {
  /** Mean over the cycle: what a DC range shows. */
  readonly mean: number;
  /** RMS of the varying part: what an AC-coupled true-RMS range shows. */
  readonly ripple: number;
  /** RMS of the whole. */
  readonly rms: number;
  /** Lowest frequency of the varying part, hertz; 0 where nothing varies. */
  readonly hertz: number;
  /** Resistance that the meter sees between the probes, ohms. */
  readonly theveninOhms: number;
  /** True above about 1 Mohm: leakage and stray capacitance decide, so the value is only a bound. */
  readonly floating: boolean;
}

/** A circuit settled in one lift state with one set of faults. */
export interface Solution {
  /** By coil name. */
  readonly relays: Readonly<Record<string, RelayPosition>>;
  /** By coil name, milliamperes: mean of the magnitude on DC, RMS on AC. */
  readonly coilMilliamps: Readonly<Record<string, number>>;
  read(probes: Probes): SettledReading;
}
