import { describe, expect, it } from 'vitest';
import { solve } from '@shared/solver';
import { huntCircuit, huntFault, huntState, type HuntSample } from './huntCircuit';
import { circuits, scenarios } from './referenceData';

const byName = new Map(circuits.map((circuit) => [circuit.id, huntCircuit(circuit)]));

/** Volts: what the scenarios must agree to. */
const TOLERANCE = 0.1;
/**
 * The samples give three decimals and take the varying part as the root of RMS² − mean². On pure DC of
 * 220 V that root of a rounding comes to half a volt, and says nothing.
 */
const DECIMALS = 0.0005;

/** The varying part that a sample can mean, from what its rounding leaves open. */
function rippleBounds({ dc, ac, rms }: HuntSample): readonly [number, number] {
  const blur = 2 * (Math.abs(dc) + rms) * DECIMALS;
  return [Math.sqrt(Math.max(0, ac * ac - blur)), Math.sqrt(ac * ac + blur)];
}

describe.each(scenarios)('$circuit, $name', (scenario) => {
  const circuit = byName.get(scenario.circuit)!;
  const state = huntState(circuit, scenario.state);
  const solution = solve(circuit, state, scenario.faults.map(huntFault));

  it('has its relays as given', () => {
    expect(solution.relays).toEqual(scenario.relays);
  });

  it.each(scenario.samples)('$red to $black', (sample) => {
    const { red, black } = sample;
    const reading = solution.read({ red, black, meterOhms: scenario.meterOhms });
    expect(Math.abs(reading.mean - sample.dc)).toBeLessThanOrEqual(TOLERANCE);
    expect(Math.abs(reading.rms - sample.rms)).toBeLessThanOrEqual(TOLERANCE);
    const [least, most] = rippleBounds(sample);
    expect(reading.ripple).toBeGreaterThanOrEqual(least - TOLERANCE);
    expect(reading.ripple).toBeLessThanOrEqual(most + TOLERANCE);
  });
});

describe('scenarios of the trade', () => {
  it('are all there', () => {
    expect(scenarios).toHaveLength(14);
    expect(scenarios.map(({ name }) => name)).toEqual(
      expect.arrayContaining(['F4, black on supply negative', 'F5, 3 kohm', 'F11']),
    );
  });
});
