/** Points of the cycle at which the network's impedance is kept. */
export const PHASES = 16;

/** A settled cycle at the kept nodes. */
export interface Cycle {
  readonly points: number;
  /** Volts, sample by sample, node by node. */
  readonly volts: Float64Array;
  /** Junction volts, sample by sample, diode by diode: where Newton starts next time. */
  readonly junctions: Float64Array;
  /** Volts across each capacitor where the cycle begins. */
  readonly charges: Float64Array;
  /** By phase, ohms between all pairs of nodes without the meter; capacitors left out. */
  readonly impedances: Float64Array;
  /** The same with each capacitor as what it yields in one cycle: period over farads. */
  readonly momentary: Float64Array;
}

/** A cycle before its impedances are worked out. */
export type SampledCycle = Omit<Cycle, 'impedances' | 'momentary'>;

const sineTables = new Map<number, Float64Array>();

/** The sine at `points` even steps of a cycle; kept, since every cycle needs it. */
export function sinesOf(points: number): Float64Array {
  let table = sineTables.get(points);
  if (!table) {
    table = Float64Array.from({ length: points }, (_, j) => Math.sin((2 * Math.PI * j) / points));
    sineTables.set(points, table);
  }
  return table;
}
