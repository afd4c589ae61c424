import { USUAL_METER } from '../diagnosis';
import type { FoldedEvent } from './caseState';
import { applyEvent } from './foldCase';
import type { EventType, PayloadOf } from './payloads';

/** For specs: ids that are valid, and the same in each run. */
export const sampleId = (n: number): string =>
  `00000000-0000-4000-8000-${n.toString(16).padStart(12, '0')}`;

export const SAMPLE_CASE = sampleId(0xca5e);
const DEVICE = sampleId(0xde);
const START = Date.parse('2026-11-02T08:00:00.000Z');
const MINUTE = 60_000;

/** For specs: the nth event of a case, one minute after the one before. */
export function sampleEvent<T extends EventType>(
  n: number,
  type: T,
  payload: PayloadOf<T>,
  changed: Partial<FoldedEvent> = {},
): FoldedEvent {
  return {
    id: sampleId(n),
    caseId: SAMPLE_CASE,
    device: DEVICE,
    sequence: n,
    schema: 1,
    type,
    payload: { ...payload },
    recordedAt: new Date(START + n * MINUTE).toISOString(),
    state: {},
    ...changed,
  };
}

export const sampleOpening = (): PayloadOf<'case opened'> => ({
  liftId: sampleId(1001),
  circuitId: sampleId(1002),
  circuitRevision: 3,
  complaint: 'Dead at landing 2',
  practice: false,
});

export const sampleArrival = (
  changed: Partial<PayloadOf<'arrival checked'>> = {},
): PayloadOf<'arrival checked'> => ({
  peopleSafe: true,
  noticesUp: true,
  meterProven: true,
  linksFound: 0,
  ...changed,
});

export const sampleReading = (
  red: string,
  black: string,
  volts: number,
): PayloadOf<'reading taken'> => ({
  red,
  black,
  function: 'dc volts',
  volts,
  meter: USUAL_METER,
  place: 'controller',
  entered: 'digits',
});

export const sampleFinding = (
  reading: string,
  changed: Partial<PayloadOf<'finding stated'>> = {},
): PayloadOf<'finding stated'> => ({
  faults: [{ part: 'lock 2', mode: 'open' }],
  device: 'lock 2',
  cause: 'Keeper bent, the bolt did not go home',
  proof: { kind: 'measured', reading },
  restsOnOneReading: false,
  ...changed,
});

/** A whole repair, open to the closing: supply, a dead point, the lock itself, and the same again. */
export function sampleRepair(): FoldedEvent[] {
  return [
    sampleEvent(1, 'case opened', sampleOpening()),
    sampleEvent(2, 'arrival checked', sampleArrival()),
    sampleEvent(3, 'reading taken', sampleReading('5', '9', 110.2)),
    sampleEvent(4, 'reading taken', sampleReading('6', '9', 109.9)),
    sampleEvent(5, 'reading taken', sampleReading('5', '6', 0)),
    sampleEvent(6, 'reading taken', sampleReading('7', '9', 0.1)),
    sampleEvent(7, 'reading taken', sampleReading('6', '7', 109.8)),
    sampleEvent(8, 'finding stated', sampleFinding(sampleId(7))),
    sampleEvent(9, 'repair done', { what: 'Keeper set', devices: ['lock 2'], parts: [] }),
    sampleEvent(10, 'reading taken', sampleReading('5', '9', 110.1)),
    sampleEvent(11, 'reading taken', sampleReading('7', '9', 109.7)),
    sampleEvent(12, 'reading taken', sampleReading('7', '6', 0)),
    sampleEvent(13, 'device proven', {
      device: 'lock 2',
      result: 'stopped',
      how: 'Opened by hand; lock relay out',
    }),
    sampleEvent(14, 'returned to service', { runs: 6, coversOn: true }),
    sampleEvent(15, 'case closed', { outcome: 'repaired' }),
  ];
}

export const foldedOneByOne = (events: readonly FoldedEvent[]) =>
  events.reduce<ReturnType<typeof applyEvent>>(applyEvent, undefined);
