import { describe, expect, it } from 'vitest';
import type { PartOf } from './circuit';
import { completeState, contactClosed, isResting, liftStateKey, restingState } from './liftState';
import { stringCircuit } from './stringNotation';

const LIFT = stringCircuit(
  '110 V DC: T0 (door when door=yes) T1 (hold when SR=in) T2 (brake when SR=out) T3 (lock) T4 [SR]',
);
const contact = (name: string) =>
  LIFT.parts.find((part) => part.name === name) as PartOf<'contact'>;

describe('lift state', () => {
  it('rests at the first value of each condition', () => {
    expect(restingState(LIFT)).toEqual({ door: 'no' });
    expect(isResting(LIFT, {})).toBe(true);
    expect(isResting(LIFT, { door: 'yes' })).toBe(false);
    expect(completeState(LIFT, {})).toEqual({ door: 'no' });
  });

  it('has one key for one state', () => {
    expect(liftStateKey(LIFT, {})).toBe(liftStateKey(LIFT, { door: 'no' }));
    expect(liftStateKey(LIFT, {})).not.toBe(liftStateKey(LIFT, { door: 'yes' }));
  });

  it('closes contacts by condition and by relay, and counts chatter as out', () => {
    expect(contactClosed(contact('lock'), {}, {})).toBe(true);
    expect(contactClosed(contact('door'), { door: 'yes' }, {})).toBe(true);
    expect(contactClosed(contact('door'), { door: 'no' }, {})).toBe(false);
    expect(contactClosed(contact('hold'), {}, { SR: 'in' })).toBe(true);
    expect(contactClosed(contact('hold'), {}, { SR: 'chatter' })).toBe(false);
    expect(contactClosed(contact('brake'), {}, { SR: 'in' })).toBe(false);
    expect(contactClosed(contact('brake'), {}, { SR: 'out' })).toBe(true);
  });
});
