import { MOST_VOLTS } from '@shared/cases';
import { afterKey, padValue } from './pad-model';

describe('padValue', () => {
  it.each([
    ['109.6', 109.6],
    ['109,6', 109.6],
    [' 1 09.6 V ', 109.6],
    ['109.6VDC', 109.6],
    ['.5', 0.5],
    ['0', 0],
    ['1.1e2', 110],
  ])('reads %s as volts', (text, volts) => {
    expect(padValue(text, true)).toEqual({ kind: 'volts', volts, swapped: false });
  });

  it.each(['-109.6', '−109.6', '–109,6'])('takes %s as swapped probes on DC', (text) => {
    expect(padValue(text, true)).toEqual({ kind: 'volts', volts: -109.6, swapped: true });
  });

  it('drops the sign on AC, where it says nothing', () => {
    expect(padValue('-54', false)).toEqual({ kind: 'volts', volts: 54, swapped: false });
  });

  it.each(['1e9', '99999', '1e999', String(MOST_VOLTS + 1)])('finds %s too large', (text) => {
    expect(padValue(text, true)).toEqual({ kind: 'problem', problem: 'too large' });
  });

  it.each(['abc', '1.2.3', '12..', '0x10', 'Infinity', 'NaN', '1,000.5'])(
    'finds no number in %s',
    (text) => {
      expect(padValue(text, true)).toEqual({ kind: 'problem', problem: 'not a number' });
    },
  );

  it.each(['', '  ', '-', 'V'])('finds nothing in %j', (text) => {
    expect(padValue(text, true)).toEqual({ kind: 'empty' });
  });
});

describe('afterKey', () => {
  const typed = (keys: string) => [...keys].reduce(afterKey, '');

  it('builds a number key by key', () => {
    expect(typed('109.6')).toBe('109.6');
  });

  it('takes one decimal sign only', () => {
    expect(typed('1.0.9')).toBe('1.09');
    expect(afterKey('1,0', '.')).toBe('1,0');
  });

  it('turns the sign both ways without losing digits', () => {
    expect(typed('54±')).toBe('-54');
    expect(typed('54±±')).toBe('54');
  });

  it('erases one digit', () => {
    expect(typed('54⌫')).toBe('5');
    expect(afterKey('', '⌫')).toBe('');
  });

  it('stops at the width of the display', () => {
    expect(typed('1234567890')).toHaveLength(8);
  });
});
