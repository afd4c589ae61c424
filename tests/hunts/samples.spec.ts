import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { solvable, solve } from '@shared/solver';
import {
  huntCircuit,
  huntFault,
  type HuntCircuit,
  type HuntFault,
  type HuntSample,
} from '../reference/huntCircuit';

/**
 * Source: 40 invented circuits, each with a fault put in, and ten readings of each by ngspice 39
 * (Debian) with the model that `tests/reference/scenarios.spec.ts` describes.
 */
interface Hunt {
  readonly circuit: HuntCircuit;
  readonly faults: readonly HuntFault[];
  readonly relays: Readonly<Record<string, string>>;
  readonly samples: readonly HuntSample[];
}

const file = new URL('./data/hunts.json', import.meta.url);
const hunts = JSON.parse(readFileSync(file, 'utf8')) as readonly Hunt[];

/** Whichever is larger: of the value, and volts. */
const RELATIVE = 0.005;
const VOLTS = 0.1;
const near = (actual: number, expected: number) =>
  Math.abs(actual - expected) <= Math.max(VOLTS, RELATIVE * Math.abs(expected));

describe('the hunts', () => {
  it('are forty', () => {
    expect(hunts).toHaveLength(40);
  });

  it.each(hunts.map((hunt) => [hunt.circuit.id, hunt.circuit.kind, hunt] as const))(
    '%s, %s: relays and all samples',
    (_id, _kind, { circuit: given, faults, relays, samples }) => {
      const circuit = huntCircuit(given);
      expect(solvable(circuit)).toEqual([]);
      const solution = solve(circuit, {}, faults.map(huntFault));
      expect(solution.relays).toEqual(relays);
      for (const sample of samples) {
        const { red, black } = sample;
        const reading = solution.read({ red, black, meterOhms: given.meter!.ohms });
        const at = `${red} to ${black}: ${JSON.stringify(reading)}`;
        expect(near(reading.mean, sample.dc), at).toBe(true);
        expect(near(reading.rms, sample.rms), at).toBe(true);
        // A varying part under a hundredth of the whole is the rounding of the samples (see scenarios).
        const rounded = sample.ac < 0.01 * sample.rms && reading.ripple < 0.01 * reading.rms;
        expect(rounded || near(reading.ripple, sample.ac), at).toBe(true);
      }
    },
  );
});
