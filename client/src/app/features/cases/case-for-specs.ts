import { foldCase, type CaseEvent, type CaseState, type EventType } from '@shared/cases';
import { stringCircuit } from '@shared/circuit';
import { USUAL_METER } from '@shared/diagnosis';

/** A short string with a tap for the safety relay, as most specs of this folder need it. */
export const specCircuit = stringCircuit(
  '110 V DC earthed: T0 (pit stop@pit) T1 (car stop@car) T2 [SR 3300 ohm] (gate@car) T3 [LR 3300 ohm]',
);

export interface SpecEvent {
  readonly type: EventType;
  readonly payload?: Record<string, unknown>;
  readonly state?: Record<string, string>;
}

const uuid = (n: number): string => `00000000-0000-7000-8000-${String(n).padStart(12, '0')}`;
const START = Date.UTC(2026, 0, 15, 9, 0);

/** Id of the nth event of {@link specCase}; 0 is the one that opened it. */
export const eventId = (n: number): string => uuid(100 + n);

/** A reading as an event: red minus black in volts. */
export const reading = (red: string, black: string, volts: number): SpecEvent => ({
  type: 'reading taken',
  payload: {
    red,
    black,
    function: 'dc volts',
    volts,
    meter: USUAL_METER,
    place: 'controller',
    entered: 'digits',
  },
});

/** A case that was opened and in which these events followed, a minute apart. */
export function specCase(...events: readonly SpecEvent[]): CaseState {
  const opened: SpecEvent = {
    type: 'case opened',
    payload: {
      liftId: uuid(1),
      circuitId: uuid(2),
      circuitRevision: 1,
      complaint: 'Not moving',
      practice: false,
    },
  };
  const log = [opened, ...events].map(({ type, payload = {}, state = {} }, n): CaseEvent => ({
    id: eventId(n),
    caseId: uuid(3),
    device: uuid(4),
    sequence: n + 1,
    schema: 1,
    type,
    payload,
    recordedAt: new Date(START + n * 60_000).toISOString(),
    state,
  }));
  return foldCase(log)!;
}

export const found: SpecEvent = {
  type: 'finding stated',
  payload: {
    faults: [{ part: 'gate', mode: 'open' }],
    device: 'gate',
    cause: 'Finger worn to nothing',
    proof: { kind: 'seen', what: 'no wipe' },
    restsOnOneReading: false,
  },
};

export const repaired: SpecEvent = {
  type: 'repair done',
  payload: {
    what: 'Finger renewed',
    devices: ['gate'],
    parts: [{ description: 'contact finger', number: 'F-12', quantity: 1 }],
  },
};
