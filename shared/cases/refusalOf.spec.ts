import { describe, expect, it } from 'vitest';
import type { FoldedEvent } from './caseState';
import { foldCase } from './foldCase';
import { refusalOf } from './refusalOf';
import {
  sampleEvent,
  sampleFinding,
  sampleId,
  sampleOpening,
  sampleReading,
  sampleRepair,
} from './sampleEvents';

const technician = { role: 'technician' };
const supervisor = { role: 'supervisor' };
const closed = sampleRepair();
/** Up to and with the nth event of the repair. */
const until = (n: number) => closed.slice(0, n);
const accepted = [...closed, sampleEvent(16, 'review accepted', {})];
const returned = [...closed, sampleEvent(16, 'review returned', { question: 'Why bent?' })];

const codeOf = (log: readonly FoldedEvent[], event: FoldedEvent, writer = technician) =>
  refusalOf(foldCase(log), event, writer)?.code;

describe('what may be added to a case', () => {
  it('is each event of a whole repair, in its order', () => {
    closed.forEach((event, k) => expect(codeOf(closed.slice(0, k), event)).toBeUndefined());
  });

  it('begins with its opening, once', () => {
    expect(codeOf([], sampleEvent(1, 'note written', { text: 'x' }))).toBe('case-unknown');
    expect(codeOf(until(2), sampleEvent(3, 'case opened', sampleOpening()))).toBe(
      'case-already-open',
    );
  });

  it('is nothing of a role that does not work in cases', () => {
    const note = sampleEvent(3, 'note written', { text: 'x' });
    expect(codeOf(until(2), note, { role: 'administrator' })).toBe('role-not-allowed');
    expect(codeOf(until(2), note, { role: 'engineer' })).toBeUndefined();
  });

  it.each([1e9, -1e9, Number.NaN])('is no reading of %d V', (volts) => {
    const refusal = refusalOf(
      foldCase(until(2)),
      sampleEvent(3, 'reading taken', sampleReading('5', '9', volts)),
      technician,
    );
    expect(refusal?.code).toBe('payload-invalid');
    expect(refusal?.details['problems']).not.toEqual([]);
  });

  it('is a negative reading: the probes were swapped', () => {
    const swapped = sampleEvent(3, 'reading taken', sampleReading('9', '5', -110));
    expect(codeOf(until(2), swapped)).toBeUndefined();
  });

  it('is no reading with both probes on one tag', () => {
    const same = sampleEvent(3, 'reading taken', sampleReading('5', '5', 0));
    expect(codeOf(until(2), same)).toBe('probes-on-one-tag');
  });

  it('is what a later build writes, but for its reviews', () => {
    const later = { ...sampleEvent(3, 'note written', { text: 'x' }), type: 'photo attached' };
    expect(codeOf(until(2), later)).toBeUndefined();
    expect(codeOf(closed, { ...later, type: 'review reopened' })).toBe('review-not-allowed');
  });
});

describe('a closed case', () => {
  const reading = sampleEvent(17, 'reading taken', sampleReading('5', '9', 110));
  const note = sampleEvent(17, 'note written', { text: 'Spring ordered' });

  it.each([closed, accepted])('takes no reading any more, and takes a note', (...log) => {
    expect(codeOf(log, reading)).toBe('case-closed');
    expect(codeOf(log, note)).toBeUndefined();
    const undo = sampleEvent(18, 'event withdrawn', { of: sampleId(14) });
    expect(codeOf(log, undo)).toBe('case-closed');
  });

  it('is reviewed by a supervisor only, once, and only when it is closed', () => {
    const review = sampleEvent(17, 'review accepted', {});
    expect(codeOf(closed, review, technician)).toBe('review-not-allowed');
    expect(codeOf(closed, review, supervisor)).toBeUndefined();
    expect(codeOf(until(9), review, supervisor)).toBe('case-not-to-review');
    expect(codeOf(accepted, review, supervisor)).toBe('case-not-to-review');
  });

  it('is answered and closed again when it was returned', () => {
    expect(codeOf(returned, note)).toBeUndefined();
    const again = sampleEvent(18, 'case closed', { outcome: 'repaired' });
    expect(codeOf([...returned, note], again)).toBeUndefined();
    expect(foldCase([...returned, note, again])).toMatchObject({ status: 'closed' });
  });
});

describe('taking back', () => {
  const undo = (of: number) => sampleEvent(20, 'event withdrawn', { of: sampleId(of) });

  it('is of an entry of this case, once', () => {
    expect(codeOf(until(4), undo(4))).toBeUndefined();
    expect(codeOf(until(4), undo(99))).toBe('nothing-to-withdraw');
    expect(codeOf([...until(4), undo(4)], undo(4))).toBe('nothing-to-withdraw');
  });

  it('is never of the opening', () => {
    expect(codeOf(until(4), undo(1))).toBe('nothing-to-withdraw');
  });

  it('is not of the reading that a finding rests on, until the finding is taken back', () => {
    expect(codeOf(until(8), undo(7))).toBe('reading-proves-finding');
    expect(codeOf([...until(8), undo(8)], undo(7))).toBeUndefined();
  });

  it('is not of a device that did not stop the lift', () => {
    const danger = sampleEvent(13, 'device proven', {
      device: 'lock 2',
      result: 'did not stop',
      how: 'Opened by hand; relay stayed in',
    });
    expect(codeOf([...until(12), danger], undo(13))).toBe('nothing-to-withdraw');
  });
});

describe('the registers', () => {
  const link = sampleId(500);
  const fitted = sampleEvent(3, 'link fitted', {
    link,
    mark: '4',
    from: '5',
    to: '6',
    reason: 'Car to be moved off the pit',
    found: false,
  });
  const removed = (n: number) => sampleEvent(n, 'link removed', { link });

  it('take a link in once, between two tags, and out once', () => {
    expect(codeOf(until(2), fitted)).toBeUndefined();
    expect(codeOf([...until(2), fitted], { ...fitted, id: sampleId(4) })).toBe(
      'link-already-entered',
    );
    const short = { ...fitted, payload: { ...fitted.payload, to: '5' } };
    expect(codeOf(until(2), short)).toBe('link-on-one-tag');
    expect(codeOf(until(2), removed(4))).toBe('link-not-out');
    expect(codeOf([...until(2), fitted], removed(4))).toBeUndefined();
    expect(codeOf([...until(2), fitted, removed(4)], removed(5))).toBe('link-not-out');
  });

  it('take out a thing or a person only where it was entered', () => {
    const restored = sampleEvent(3, 'thing restored', { thing: sampleId(600) });
    expect(codeOf(until(2), restored)).toBe('thing-not-disturbed');
    const left = sampleEvent(3, 'person left', { entry: sampleId(700) });
    expect(codeOf(until(2), left)).toBe('person-not-inside');
    const entered = sampleEvent(3, 'person entered', {
      entry: sampleId(700),
      who: 'J.',
      place: 'pit',
    });
    expect(codeOf([...until(2), entered], { ...left, id: sampleId(4) })).toBeUndefined();
  });
});

describe('finding, repair, closing', () => {
  it('rest on each other', () => {
    const elsewhere = sampleEvent(8, 'finding stated', sampleFinding(sampleId(99)));
    expect(codeOf(until(7), elsewhere)).toBe('proof-not-in-case');
    expect(codeOf(until(7), closed[8]!)).toBe('repair-before-finding');
  });

  it('is refused with what is still missing', () => {
    const refusal = refusalOf(foldCase(until(9)), closed[14]!, technician);
    expect(refusal).toEqual({
      code: 'case-not-ready',
      details: {
        needs: ['points not read again', 'devices not proven', 'not returned to service'],
      },
    });
  });
});
