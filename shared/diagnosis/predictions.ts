import { liftStateKey, type Circuit, type LiftState, type RelayPosition } from '../circuit';
import { solve, type SettledReading, type Solution } from '../solver';
import type { Hypothesis } from './hypotheses';
import type { MeterFunction } from './observation';

/** A pair of probes with the function and the impedance of the meter. */
export interface MeterPair {
  readonly red: string;
  readonly black: string;
  readonly function: MeterFunction;
  readonly ohms: number;
}

/** Volts that the meter would show. A floating point is decided by leakage: its value is a bound. */
export interface Prediction {
  readonly volts: number;
  readonly floating: boolean;
  /**
   * One standard deviation of the volts by what the hypothesis leaves open: a resistive contact stands for
   * all resistances up to its neighbours on the grid.
   */
  readonly spread: number;
}

/** What every hypothesis would show, solved when first asked for and kept by lift state. */
export class Predictions {
  private readonly solutions = new Map<string, readonly Solution[]>();
  private readonly rows = new Map<string, readonly Prediction[]>();

  constructor(
    private readonly circuit: Circuit,
    private readonly hypotheses: readonly Hypothesis[],
  ) {}

  /** In the order of the hypotheses. */
  readings(state: LiftState, pair: MeterPair): readonly Prediction[] {
    const key = [liftStateKey(this.circuit, state), pair.red, pair.black, pair.ohms].join('|');
    const row = `${key}|${pair.function}`;
    let predictions = this.rows.get(row);
    if (!predictions) {
      const read = this.solved(state).map((solution) => {
        const reading = solution.read({ ...pair, meterOhms: pair.ohms });
        return { volts: shown(reading, pair.function), floating: reading.floating };
      });
      predictions = read.map((each, h) => ({ ...each, spread: this.spreadOf(read, h) }));
      this.rows.set(row, predictions);
    }
    return predictions;
  }

  /** Half the way to the farther neighbour on the grid of resistances, as a uniform deviation. */
  private spreadOf(read: readonly { readonly volts: number }[], h: number): number {
    const fault = this.hypotheses[h]!.fault;
    if (fault?.mode !== 'resistive') return 0;
    const farther = [h - 1, h + 1].map((other) => {
      const neighbour = this.hypotheses[other]?.fault;
      const same = neighbour?.mode === 'resistive' && neighbour.part === fault.part;
      return same ? Math.abs(read[other]!.volts - read[h]!.volts) : 0;
    });
    return Math.max(...farther) / 2 / Math.sqrt(3);
  }

  /** In the order of the hypotheses. */
  relay(state: LiftState, name: string): readonly (RelayPosition | undefined)[] {
    return this.solved(state).map(({ relays }) => relays[name]);
  }

  private solved(state: LiftState): readonly Solution[] {
    const key = liftStateKey(this.circuit, state);
    let solutions = this.solutions.get(key);
    if (!solutions) {
      solutions = this.hypotheses.map(({ fault }) =>
        solve(this.circuit, state, fault ? [fault] : []),
      );
      this.solutions.set(key, solutions);
    }
    return solutions;
  }
}

/** A direct range shows the mean, an alternating one what varies: on the wrong range, its own value. */
function shown(reading: SettledReading, meterFunction: MeterFunction): number {
  return meterFunction === 'dc volts' ? reading.mean : reading.ripple;
}
