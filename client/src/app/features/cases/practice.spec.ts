import { solve } from '@shared/solver';
import type { Fault } from '@shared/circuit';
import { found, repaired, specCase, specCircuit } from './case-for-specs';
import { faultsLeft, operated, operatedPoints } from './practice';

const hidden: readonly Fault[] = [{ part: 'gate', mode: 'open' }];

describe('faultsLeft', () => {
  it('keeps the fault until the right device is repaired', () => {
    expect(faultsLeft(specCircuit, hidden, specCase(found))).toEqual(hidden);
    expect(faultsLeft(specCircuit, hidden, specCase(found, repaired))).toEqual([]);
  });

  it('keeps it when another device was repaired', () => {
    const wrong = { ...repaired, payload: { ...repaired.payload, devices: ['pit stop'] } };
    expect(faultsLeft(specCircuit, hidden, specCase(found, wrong))).toEqual(hidden);
  });
});

describe('operating a device', () => {
  const volts = (faults: readonly Fault[], red: string) =>
    solve(specCircuit, {}, faults).read({ red, black: 'R', meterOhms: 10e6 }).mean;

  it('opens the string behind a sound contact', () => {
    const points = operatedPoints(specCircuit, 'gate');
    expect(points.map(({ red }) => red)).toEqual(['T2', 'T3']);
    expect(volts([], 'T3')).toBeGreaterThan(100);
    expect(volts(operated(specCircuit, [], 'gate'), 'T3')).toBeLessThan(1);
  });

  it('leaves it live where the contact does not open', () => {
    const stuck: readonly Fault[] = [{ part: 'gate', mode: 'not opening', ohms: 0.1 }];
    expect(volts(operated(specCircuit, stuck, 'gate'), 'T3')).toBeGreaterThan(100);
  });

  it('has nothing to operate on a part without a contact', () => {
    expect(operatedPoints(specCircuit, 'return wire')).toEqual([]);
  });
});
