import { describe, expect, it } from 'vitest';
import { stringCircuit } from '../circuit';
import { afterRepair } from './afterRepair';
import { USUAL_METER, type ReadingObservation } from './observation';

const circuit = stringCircuit('110 V DC earthed: T0 (stop) T1 (governor) T2 (gate) T3 [LR]');
const reading = (red: string, volts: number, black = 'R'): ReadingObservation => ({
  kind: 'reading',
  id: `${red} ${black}`,
  red,
  black,
  function: 'dc volts',
  volts,
  meter: USUAL_METER,
  state: {},
  place: 'controller',
});
const finding = { part: 'governor', mode: 'open' as const };
// A supply of 101 V where 110 are drawn.
const before = [
  reading('T0', 101.2),
  reading('T1', 101),
  reading('T2', 0),
  reading('T1', 101.1, 'T2'),
];
const point = (red: string, black = 'R') =>
  afterRepair(circuit, before, finding).find((each) => each.red === red && each.black === black)!;

describe('the points after a repair', () => {
  it('should read the supply as it was learnt, not as it is drawn', () => {
    expect(point('T2').volts).toBeGreaterThan(100);
    expect(point('T2').volts).toBeLessThan(102.5);
    expect(point('T2')).toMatchObject({ before: 0, changes: true, observation: 'T2 R' });
    expect(point('T2').toVolts).toBeLessThan(110);
  });

  it('should read none across the part that was open', () => {
    const across = point('T1', 'T2');
    expect(across).toMatchObject({ before: 101.1, changes: true });
    expect(across.fromVolts).toBeLessThan(0);
    expect(across.toVolts).toBeLessThan(2);
  });

  it('do not change where they were live', () => {
    expect(point('T1').changes).toBe(false);
    expect(point('T1').fromVolts).toBeLessThan(101);
    expect(point('T1').toVolts).toBeGreaterThan(101);
  });

  it('are each there once, and none is made of what the circuit does not have', () => {
    const more = [...before, reading('T2', 0.1), reading('no such tag', 5), reading('T0', NaN)];
    expect(afterRepair(circuit, more, finding)).toHaveLength(before.length);
  });
});
