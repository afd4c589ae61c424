import type { Signal } from '@angular/core';
import type { CaseRefusal, CaseState, EventType, PayloadOf } from '@shared/cases';
import type { LiftState } from '@shared/circuit';

/** How an event got on: on this phone only, in the server's log, or refused there. */
export type Kept = 'kept here' | 'sent' | 'refused';

/** One event as the journal shows it, in the order that this phone sees. */
export interface JournalEntry {
  readonly id: string;
  readonly type: string;
  readonly recordedAt: string;
  readonly kept: Kept;
  /** Key of the sentence, where refused. */
  readonly code?: string;
  /** Came from another device after later events of this one. */
  readonly late: boolean;
}

export type AppendResult =
  /** Durable on this phone: the transaction has completed. */
  | { readonly kind: 'kept here'; readonly id: string }
  | { readonly kind: 'refused'; readonly refusal: CaseRefusal }
  /** The store could not be written; the caller keeps what was typed and says so. */
  | { readonly kind: 'failed'; readonly message: string };

/** One case on this phone: its state as a signal, and the only way to add to it. */
export interface CaseJournal {
  readonly caseId: string;
  /** Undefined until read from the store, and for a case that this phone does not hold. */
  readonly state: Signal<CaseState | undefined>;
  readonly entries: Signal<readonly JournalEntry[]>;
  /** Checked by the reducer's rules first; `state` is the lift state it is recorded in. */
  append<T extends EventType>(
    type: T,
    payload: PayloadOf<T>,
    state?: LiftState,
  ): Promise<AppendResult>;
}
