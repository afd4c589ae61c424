import type { Circuit, Fault, LiftState } from '@shared/circuit';
import type { AdviceRequest } from '@shared/diagnosis';

/** What the page sends to the worker; a circuit goes once and is named by its key afterwards. */
export type EngineRequest =
  | { readonly kind: 'circuit'; readonly key: number; readonly circuit: Circuit }
  | {
      readonly kind: 'advise';
      readonly id: number;
      readonly key: number;
      readonly request: AdviceRequest;
    }
  | {
      readonly kind: 'practice';
      readonly id: number;
      readonly key: number;
      readonly state: LiftState;
      readonly faults: readonly Fault[];
      readonly probes: { readonly red: string; readonly black: string; readonly ohms: number };
    };

export type EngineAnswer =
  | { readonly id: number; readonly ok: true; readonly value: unknown }
  | { readonly id: number; readonly ok: false; readonly message: string };
