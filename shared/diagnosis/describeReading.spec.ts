import { describe, expect, it } from 'vitest';
import { stringCircuit } from '../circuit';
import { describeReading, type ReadingToDescribe } from './describeReading';

const direct = stringCircuit('110 V DC earthed: T0 (stop) T1 (gate when call=yes) T2 [LR]');
const rectified = stringCircuit('122 V bridge earthed: T0 (stop) T1 [LR]');
const of = (volts: number, more: Partial<ReadingToDescribe> = {}, circuit = direct) =>
  describeReading(circuit, {
    red: 'T0',
    black: 'R',
    function: 'dc volts',
    volts,
    state: {},
    ...more,
  });
const sound = { swapped: false, implausible: false };

describe('a reading for its lamp', () => {
  it.each([
    [110, 'full'],
    [94, 'full'],
    [93, 'between'],
    [6, 'between'],
    [5, 'none'],
    [0, 'none'],
  ])('of %d V is %s', (volts, level) => {
    expect(of(volts)).toEqual({ level, ...sound });
  });

  it('is measured by the supply that the readings make', () => {
    expect(of(85, { supplyVolts: 98 }).level).toBe('full');
  });

  it('is full before the bridge by the volts that stand there', () => {
    const before = { red: 'AC1', black: 'AC2', function: 'ac volts' as const };
    expect(of(122, before, rectified)).toEqual({ level: 'full', ...sound });
    expect(of(61, before, rectified).level).toBe('between');
  });

  it('is full across an open part, and none beyond a contact that is open at rest', () => {
    expect(of(110, { red: 'T0', black: 'T1' }).level).toBe('full');
    expect(of(0, { red: 'T2' })).toEqual({ level: 'none', ...sound });
  });

  it('is of exchanged probes where the sign can’t be', () => {
    expect(of(-110)).toMatchObject({ level: 'full', swapped: true });
    expect(of(-110, { red: 'R', black: 'T0' }).swapped).toBe(false);
    expect(of(110, { red: 'R', black: 'T0' }).swapped).toBe(true);
    expect(of(-0.2).swapped).toBe(false);
  });

  it('is unknown on the other function, on one tag, or at a tag that is not drawn', () => {
    expect(of(54, { function: 'ac volts' }).level).toBe('unknown');
    expect(of(0, { black: 'T0' }).level).toBe('unknown');
    expect(of(110, { red: 'not drawn' }).level).toBe('unknown');
  });

  it.each([1e9, -1e9, 240, Number.NaN, Number.POSITIVE_INFINITY])(
    'of %d V is implausible',
    (volts) => expect(of(volts).implausible).toBe(true),
  );

  it('is implausible below none on the alternating function', () => {
    const before = { red: 'AC1', black: 'AC2', function: 'ac volts' as const };
    expect(of(-122, before, rectified).implausible).toBe(true);
  });
});
