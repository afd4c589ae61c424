import type { SettledReading } from './solution';

/** Two nodes of a topology; -1 is earth. */
export interface NodePair {
  readonly red: number;
  readonly black: number;
}

/** Thevenin resistance above which leakage and stray capacitance decide what is read, ohms. */
export const FLOATING_OHMS = 1e6;

/** Amperes. */
export interface CoilCurrent {
  readonly rms: number;
  readonly meanMagnitude: number;
}

/** A circuit with all its contacts at rest, solved without a meter. */
export interface SettledNetwork {
  read(pair: NodePair, meterOhms: number): SettledReading;
  /** Through a resistance between two nodes, no meter connected. */
  current(pair: NodePair, ohms: number): CoilCurrent;
}
