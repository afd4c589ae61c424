import { describe, expect, it } from 'vitest';
import { POWER_RECTIFIER, solve } from '@shared/solver';
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
    // Smoothed bridges block for most of the cycle, and their AC side then lies where the leak of the
    // junctions puts it; ngspice needs more of that to get through a cycle with charge. Both get the same.
    const smoothed = circuit.parts.some(({ name }) => name === 'smoothing');
    const diodeLeak = smoothed ? 1e-9 : 1e-12;
    const diodeLaw = { ...POWER_RECTIFIER, leakSiemens: diodeLeak };
    const solution = solve(circuit, {}, faults, { diodeLaw });
    const expected = spiceReadings({
      circuit,
      state: {},
      relays: solution.relays,
      faults,
      probes,
      meterOhms: METER,
      hertz: HERTZ,
      diodeLeak,
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
