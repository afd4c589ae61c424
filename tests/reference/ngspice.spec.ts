import { describe, expect, it } from 'vitest';
import { solve } from '@shared/solver';
import { randomLift } from './randomLift';
import { hasNgspice, spiceReadings } from './spice';

/**
 * Source: ngspice as Debian packages it, run here on circuits that a seed makes. Where it is not
 * installed this file has nothing to compare with; the readings in `data` come from the same program.
 */
const SEEDS = Array.from({ length: 24 }, (_, k) => k + 1);
const METER = 10e6;
const HERTZ = 50;
/** Whichever is larger: of the value, and volts. */
const RELATIVE = 0.005;
const VOLTS = 0.1;

describe.runIf(hasNgspice)('against ngspice', () => {
  it.each(SEEDS)('circuit of seed %d', (seed) => {
    const { circuit, faults, probes } = randomLift(seed);
    const solution = solve(circuit, {}, faults);
    const expected = spiceReadings({
      circuit,
      state: {},
      relays: solution.relays,
      faults,
      probes,
      meterOhms: METER,
      hertz: HERTZ,
    });
    probes.forEach(([red, black], k) => {
      const reading = solution.read({ red, black, meterOhms: METER });
      const { mean, rms } = expected[k]!;
      const at = JSON.stringify({
        seed,
        name: circuit.name,
        faults,
        red,
        black,
        reading,
        mean,
        rms,
      });
      const allowed = Math.max(VOLTS, RELATIVE * rms);
      expect(Math.abs(reading.mean - mean), at).toBeLessThanOrEqual(allowed);
      expect(Math.abs(reading.rms - rms), at).toBeLessThanOrEqual(allowed);
    });
  });
});
