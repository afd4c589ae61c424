import type { Circuit, Fault, LiftState, RelayPosition } from '@shared/circuit';
import type { Advice, AdviceRequest } from '@shared/diagnosis';

/** What two probes on a practice lift show, and what its relays do. */
export interface PracticeReading {
  /** Mean volts, red minus black, as a DC range shows it. */
  readonly dcVolts: number;
  /** RMS of the varying part, volts, as an AC range shows it. */
  readonly acVolts: number;
  readonly relays: Readonly<Record<string, RelayPosition>>;
}

/**
 * The door to the engine. In the product a Web Worker stands behind it, in specs an object.
 * `circuit` is kept by its identity: hand over the same object for the same revision.
 */
export abstract class EnginePort {
  abstract advise(circuit: Circuit, request: AdviceRequest): Promise<Advice>;
  /** Solves the lift with its hidden faults; `ohms` is the meter's input resistance. */
  abstract practiceReading(
    circuit: Circuit,
    state: LiftState,
    faults: readonly Fault[],
    probes: { readonly red: string; readonly black: string; readonly ohms: number },
  ): Promise<PracticeReading>;
}
