import { describe, expect, it } from 'vitest';
import { stringCircuit, type Circuit } from '@shared/circuit';
import { solve } from '@shared/solver';

/**
 * Source: V = Vs·|jωC1 / (jω(C1+C2) + 1/Rm)|, computed (C). That 100 kohm divides low from high
 * impedance is read in meter manuals after IEC 61243-3 (R).
 */
function conductor(volts: number, farads: number): Circuit {
  const line = stringCircuit(`${volts} V AC earthed: T0 (gate) T1 [LR 3300 ohm]`);
  const at = { place: 'controller', weight: 0, kind: 'capacitor' as const, farads };
  return {
    ...line,
    terminals: [...line.terminals, { ...line.terminals[0]!, tag: 'X' }],
    parts: [
      // A stiff supply, so that the meter's answer is the divider's alone.
      ...line.parts.map((part) => (part.kind === 'supply' ? { ...part, ohms: 1e-3 } : part)),
      { ...at, name: 'core to core', between: ['S', 'X'] },
      { ...at, name: 'core to earth', between: ['X', 'N'] },
    ],
  };
}

const OPEN = 1e13;

describe('a meter on a floating conductor', () => {
  it.each([
    [110, 5e-9, OPEN, 55.0],
    [110, 5e-9, 10e6, 54.97],
    [110, 5e-9, 400e3, 43.04],
    [110, 5e-9, 3e3, 0.518],
    [230, 1e-9, 10e6, 113.57],
    [230, 1e-9, 400e3, 28.03],
    [230, 1e-9, 3e3, 0.217],
  ])('%d V over %d F each way, meter %d ohm: %d V', (volts, farads, meterOhms, expected) => {
    const solution = solve(conductor(volts, farads), {}, []);
    const reading = solution.read({ red: 'X', black: 'N', meterOhms });
    expect(Math.abs(reading.ripple - expected)).toBeLessThan(expected > 1 ? 0.02 : 0.001);
    expect(reading.mean).toBe(0);
    // 1 / (2π · 50 · (C1 + C2)): 318 kohm, or 1.6 Mohm where stray capacitance is all there is.
    expect(reading.theveninOhms).toBeCloseTo(1 / (2 * Math.PI * 50 * 2 * farads), -3);
    expect(reading.floating).toBe(farads < 1.6e-9);
  });
});
