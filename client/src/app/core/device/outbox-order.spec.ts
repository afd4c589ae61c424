import { MOST_EVENTS_IN_BATCH } from '@shared/contract';
import { asStored, noteEvent } from './in-memory-phone';
import type { OwnEvent } from './device-database';
import { MOST_BATCH_BYTES, afterResult, nextBatch } from './outbox-order';

const own = (sequence: number, text = 'short', kept: OwnEvent['kept'] = 'kept here'): OwnEvent => ({
  sequence,
  caseId: 'case',
  kept,
  event: { ...noteEvent(`event ${sequence}`, 'case'), sequence, payload: { text } },
});
const sequences = (waiting: readonly OwnEvent[], most?: number): number[] =>
  nextBatch(waiting, most).map(({ sequence }) => sequence);

describe('the next batch', () => {
  it("keeps the device's order, whatever order it is given", () => {
    expect(sequences([own(3), own(1), own(2)])).toEqual([1, 2, 3]);
  });

  it('leaves out what was refused', () => {
    expect(sequences([own(1), own(2, '', 'refused'), own(3)])).toEqual([1, 3]);
  });

  it('stops at the number of events that the contract allows, or at fewer', () => {
    const many = Array.from({ length: MOST_EVENTS_IN_BATCH + 5 }, (_, index) => own(index + 1));
    expect(nextBatch(many)).toHaveLength(MOST_EVENTS_IN_BATCH);
    expect(nextBatch(many, 7)).toHaveLength(7);
  });

  it('stops before it gets too large, but always takes one', () => {
    const half = 'x'.repeat(MOST_BATCH_BYTES * 0.6);
    expect(sequences([own(1, half), own(2, half)])).toEqual([1]);
    expect(sequences([own(1, half + half)])).toEqual([1]);
  });
});

describe('what becomes of an event', () => {
  const stored = asStored({ ...noteEvent('a', 'case'), sequence: 1 }, 1);

  it('enters the log when it is acknowledged with what was stored', () => {
    expect(afterResult({ id: 'a', outcome: 'accepted', stored })).toBe('in the log');
    expect(afterResult({ id: 'a', outcome: 'duplicate', stored })).toBe('in the log');
  });

  it('is kept here without an acknowledgement that proves it', () => {
    expect(afterResult(undefined)).toBe('kept here');
    expect(afterResult({ id: 'a', outcome: 'retry' })).toBe('kept here');
    expect(afterResult({ id: 'a', outcome: 'accepted' })).toBe('kept here');
  });

  it('is set aside when it is refused', () => {
    expect(afterResult({ id: 'a', outcome: 'rejected', code: 'case-closed' })).toBe('refused');
  });
});
