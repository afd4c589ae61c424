import { found, reading, repaired, specCase, specCircuit } from '../case-for-specs';
import { pointRows } from './prove-model';

const before = [reading('T0', 'R', 109.9), reading('T3', 'R', 0), reading('T2', 'T3', 109.8)];

describe('pointRows', () => {
  it('asks for the dead points and the proof of the supply again, and says what each should read', () => {
    const rows = pointRows(specCircuit, specCase(...before, found, repaired));
    expect(rows.map(({ point, should }) => `${point.red} ${point.black} ${should}`)).toEqual([
      'T0 R live',
      'T3 R live',
    ]);
    expect(rows.every(({ done }) => !done)).toBe(true);
    expect(rows[1]!.before!.volts).toBe(0);
  });

  it('accepts a sound reading, and finds one that still is dead', () => {
    const state = (volts: number) =>
      specCase(...before, found, repaired, reading('T3', 'R', volts));
    const row = (volts: number) =>
      pointRows(specCircuit, state(volts)).find(({ point }) => point.red === 'T3');
    expect(row(109.7)).toMatchObject({ done: true, unsound: false });
    expect(row(0)).toMatchObject({ done: true, unsound: true });
  });

  it('takes the measured part as sound when next to nothing stands across it', () => {
    const measured = {
      ...found,
      payload: {
        ...found.payload,
        proof: { kind: 'measured', reading: '00000000-0000-7000-8000-000000000103' },
      },
    };
    const rows = pointRows(specCircuit, specCase(...before, measured, repaired));
    expect(rows.map(({ point, should }) => `${point.red} ${point.black} ${should}`)).toContain(
      'T2 T3 none',
    );
  });
});
