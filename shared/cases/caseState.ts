import type { Fault, LiftState } from '../circuit';
import type { Advice, CautionCode, Danger, Observation, ReadingObservation } from '../diagnosis';
import type { CaseEvent, StoredEvent } from './event';
import type { OutcomeOfCase, PayloadOf } from './payloads';

/** An event of this device, or of the server's log with what the server added. */
export type FoldedEvent = CaseEvent & Partial<Pick<StoredEvent, 'actor' | 'receivedAt'>>;

/** Where a case stands. `returned`: the supervisor asked a question, and the technician owes an answer. */
export type CaseStatus = 'open' | 'closed' | 'returned' | 'accepted';

/** A reading or look with when it was recorded; `stage` says whether a repair came before it. */
export interface SeenInCase {
  readonly observation: Observation;
  readonly recordedAt: string;
  readonly stage: 'finding' | 'after repair';
  readonly answers?: string;
}

export interface TemporaryLink {
  readonly link: string;
  readonly mark: string;
  readonly from: string;
  readonly to: string;
  readonly reason: string;
  readonly found: boolean;
  readonly fittedAt: string;
  readonly removedAt?: string;
}

export interface DisturbedThing extends PayloadOf<'thing disturbed'> {
  readonly at: string;
  readonly restoredAt?: string;
}

export interface PersonInShaft {
  readonly entry: string;
  readonly who: string;
  readonly place: string;
  readonly since: string;
  readonly left?: string;
}

export interface StatedFinding extends PayloadOf<'finding stated'> {
  readonly id: string;
  readonly at: string;
}

export interface ShownAdvice extends Pick<
  Advice,
  'engine' | 'step' | 'suspects' | 'notDescribed' | 'nothingWrong'
> {
  readonly id: string;
  readonly at: string;
  readonly expectedMinutes?: number;
}

export interface ProvenDevice {
  readonly device: string;
  readonly result: 'stopped' | 'did not stop' | 'not possible';
  readonly how: string;
  readonly at: string;
}

export interface ReviewDecision {
  readonly kind: 'accepted' | 'returned';
  /** The remark, or the question. */
  readonly text?: string;
  readonly at: string;
  readonly actor?: string;
}

/** The fold of a case's events. Immutable; withdrawn events have left it, their data stays in the log. */
export interface CaseState {
  readonly id: string;
  readonly liftId: string;
  readonly circuitId: string;
  readonly circuitRevision: number;
  readonly complaint: string;
  readonly practice: boolean;
  readonly openedAt: string;
  /** Person id, where the server or the device's session says who. */
  readonly openedBy?: string;
  readonly status: CaseStatus;
  readonly arrival?: PayloadOf<'arrival checked'> & { readonly at: string };
  /** Where the technician stands, and the lift state, as last recorded. */
  readonly place?: string;
  readonly state: LiftState;
  readonly seen: readonly SeenInCase[];
  readonly unreachable: readonly string[];
  readonly declined: readonly string[];
  readonly acknowledged: readonly { readonly code: CautionCode; readonly place: string }[];
  readonly advice: readonly ShownAdvice[];
  readonly dangers: readonly (Danger & { readonly at: string })[];
  readonly links: readonly TemporaryLink[];
  readonly disturbed: readonly DisturbedThing[];
  readonly people: readonly PersonInShaft[];
  readonly isolated?: PayloadOf<'isolated'> & { readonly at: string };
  readonly finding?: StatedFinding;
  readonly repairs: readonly (PayloadOf<'repair done'> & { readonly at: string })[];
  readonly proven: readonly ProvenDevice[];
  readonly service?: PayloadOf<'returned to service'> & { readonly at: string };
  readonly notes: readonly {
    readonly text: string;
    readonly at: string;
    readonly actor?: string;
  }[];
  readonly outcome?: OutcomeOfCase;
  readonly remark?: string;
  readonly closedAt?: string;
  readonly reviews: readonly ReviewDecision[];
  /** Events of a later build, kept to be shown. */
  readonly unknown: readonly CaseEvent[];
  /** Ids of the events that *undo* may withdraw, latest last. */
  readonly undoable: readonly string[];
  /** Number of events folded. */
  readonly version: number;
  /** Every event folded, withdrawn ones too, in order. */
  readonly log: readonly FoldedEvent[];
}

/** Why an event is not taken. Sentences: `case.<code>` in the contract's table. */
export interface CaseRefusal {
  readonly code: string;
  readonly details: Readonly<Record<string, string | number | readonly string[]>>;
}

/** What still stands between a case and its closing. */
export interface ClosingNeed {
  readonly code:
    | 'arrival missing'
    | 'links out'
    | 'found links not entered'
    | 'people in the shaft'
    | 'things disturbed'
    | 'danger unreleased'
    | 'finding missing'
    | 'repair missing'
    | 'proof missing'
    | 'points not read again'
    | 'devices not proven'
    | 'not returned to service'
    | 'still isolated'
    | 'isolation not proven'
    | 'nothing named as left';
  /** What exactly: marks of links, names of devices, pairs of tags as `red black`. */
  readonly what: readonly string[];
}

/** A pair of probes to be put on again after the repair. */
export type PointToReadAgain = Pick<ReadingObservation, 'red' | 'black' | 'function' | 'state'>;
export type { Fault };
