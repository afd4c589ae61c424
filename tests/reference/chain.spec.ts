import { describe, expect, it } from 'vitest';
import { stringCircuit, type Circuit, type Fault } from '@shared/circuit';
import { solve } from '@shared/solver';

/**
 * Source: a chain of 40 elements computed by hand and by ngspice 39 alike (C): 110 V, 2 + 0.1 ohm,
 * 40 × (0.05 ohm contact + 0.075 ohm wire), load 242 ohm.
 */
const ELEMENTS = 40;
const NO_METER = 1e15;

function chain(): Circuit {
  const elements = Array.from(
    { length: ELEMENTS },
    (_, k) => `E${k} (contact ${k + 1} 0.05 ohm) W${k + 1} ~wire ${k + 1} 0.075 ohm~`,
  );
  const line = stringCircuit(`110 V DC earthed: ${elements.join(' ')} E${ELEMENTS} [load 242 ohm]`);
  return {
    ...line,
    parts: line.parts.map((part) => {
      if (part.kind === 'supply') return { ...part, ohms: 2 };
      // Only the return to the supply is in this chain, and has no resistance of its own.
      return part.name === 'return wire' ? { ...part, ohms: 1e-6 } : part;
    }),
  };
}

const circuit = chain();
const at21 = (ohms: number): Fault[] => [{ part: 'contact 21', mode: 'resistive', ohms }];
const read = (red: string, faults: readonly Fault[] = []) =>
  solve(circuit, {}, faults).read({ red, black: 'R', meterOhms: NO_METER }).mean;

describe('a chain of forty', () => {
  it('carries 0.441590 A', () => {
    expect(solve(circuit, {}, []).coilMilliamps['load']).toBeCloseTo(441.59, 2);
  });

  it.each([
    ['E10', 108.52067],
    ['E20', 107.96869],
    ['E30', 107.4167],
    ['E40', 106.86471],
  ])('after %s: %d V', (tag, volts) => {
    expect(read(tag)).toBeCloseTo(volts, 4);
  });

  it.each([
    [10, 102.76008],
    [50, 89.01521],
    [100, 76.26415],
    [1000, 21.3122],
  ])('contact 21 at %d ohm: load %d V', (ohms, volts) => {
    expect(read('E40', at21(ohms))).toBeCloseTo(volts, 4);
  });

  it('contact 21 open: the tail reads 2.7e-5 V, and is no ghost', () => {
    const open: Fault[] = [{ part: 'contact 21', mode: 'open' }];
    expect(Math.abs(read('E40', open) - 2.7e-5)).toBeLessThan(1e-6);
    const reading = solve(circuit, {}, open).read({ red: 'E30', black: 'R', meterOhms: 10e6 });
    expect(reading.floating).toBe(false);
  });
});
