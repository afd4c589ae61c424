import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Circuit, Part } from '../circuit';
import { solve } from './solve';

/** A meter that draws nothing, ohms. */
const NONE = 1e15;
const TAGS = ['a', 'b', 'c', 'd', 'e', 'f'] as const;
const at = { place: 'controller', weight: 1 };

interface Wire {
  readonly from: number;
  readonly to: number;
  readonly ohms: number;
}

/** A connected net of six nodes: a ring and some chords, over seven decades of resistance. */
const wires = fc
  .record({
    ring: fc.array(ohms(), { minLength: 6, maxLength: 6 }),
    chords: fc.array(
      fc
        .record({ from: fc.nat(5), to: fc.nat(5), ohms: ohms() })
        .filter(({ from, to }) => from !== to),
      { maxLength: 6 },
    ),
  })
  .map(({ ring, chords }): Wire[] => [
    ...ring.map((value, k) => ({ from: k, to: (k + 1) % 6, ohms: value })),
    ...chords,
  ]);
const pair = fc
  .record({ from: fc.nat(5), to: fc.nat(5) })
  .filter(({ from, to }) => from !== to)
  .map(({ from, to }): [string, string] => [TAGS[from]!, TAGS[to]!]);

function ohms(): fc.Arbitrary<number> {
  return fc.double({ min: -2, max: 5, noNaN: true }).map((power) => 10 ** power);
}

function supply(name: string, between: [string, string], volts: number): Part {
  return { ...at, kind: 'supply', name, between, current: 'direct', volts, ohms: 2 };
}

function net(list: readonly Wire[], supplies: readonly Part[]): Circuit {
  return {
    format: 1,
    name: 'net',
    drawing: '',
    nominalVolts: 100,
    stringCurrent: 'direct',
    places: [{ name: 'controller', setUpMinutes: 0, shaft: false }],
    minutes: {},
    readingMinutes: 0.5,
    conditions: [],
    terminals: TAGS.map((tag) => ({ tag, places: ['controller'], reachable: true, hazard: 'low' })),
    parts: [
      ...list.map(({ from, to, ohms: value }, k): Part => {
        const between: [string, string] = [TAGS[from]!, TAGS[to]!];
        return { ...at, kind: 'core', name: `wire ${k}`, between, ohms: value };
      }),
      ...supplies,
    ],
    strings: [{ name: 'string', from: 'a', to: 'b', return: 'c', supplyReturn: 'c' }],
  };
}

function read(circuit: Circuit, [red, black]: readonly [string, string], meterOhms = NONE): number {
  return solve(circuit, {}, []).read({ red, black, meterOhms }).mean;
}

function expectClose(actual: number, expected: number): void {
  expect(Math.abs(actual - expected)).toBeLessThanOrEqual(1e-6 + 1e-7 * Math.abs(expected));
}

describe('laws of networks', () => {
  it('superposition: two supplies make the sum of what each makes with the other at 0 V', () => {
    fc.assert(
      fc.property(wires, pair, pair, pair, (list, one, two, probes) => {
        const off = (name: string, between: [string, string]): Part => ({
          ...at,
          kind: 'core',
          name,
          between,
          ohms: 2,
        });
        const both = net(list, [supply('one', one, 100), supply('two', two, 40)]);
        const onlyOne = net(list, [supply('one', one, 100), off('two', two)]);
        const onlyTwo = net(list, [off('one', one), supply('two', two, 40)]);
        expectClose(read(both, probes), read(onlyOne, probes) + read(onlyTwo, probes));
      }),
    );
  });

  it('reciprocity: supply and meter may change places', () => {
    fc.assert(
      fc.property(wires, pair, pair, (list, one, two) => {
        // With source and meter of the same resistance the two transfers are equal.
        const there = read(net(list, [supply('s', one, 100)]), two, 2);
        const back = read(net(list, [supply('s', two, 100)]), one, 2);
        expectClose(there, back);
      }),
    );
  });

  it('scaling: volts by a factor make all readings larger by it', () => {
    fc.assert(
      fc.property(
        wires,
        pair,
        pair,
        fc.double({ min: 0.1, max: 9, noNaN: true }),
        (list, one, probes, factor) => {
          const base = read(net(list, [supply('s', one, 100)]), probes);
          expectClose(read(net(list, [supply('s', one, 100 * factor)]), probes), base * factor);
        },
      ),
    );
  });

  it('current balance: what comes to a node through its parts also leaves it', () => {
    fc.assert(
      fc.property(wires, pair, (list, one) => {
        const circuit = net(list, [supply('s', one, 100)]);
        const solution = solve(circuit, {}, []);
        const drop = (from: string, to: string) =>
          solution.read({ red: from, black: to, meterOhms: NONE }).mean;
        for (const tag of TAGS) {
          let sum = 0;
          let largest = 0;
          for (const part of circuit.parts) {
            if (!('ohms' in part) || part.kind === 'transformer') continue;
            const [from, to] = part.between;
            if (from !== tag && to !== tag) continue;
            const emf = part.kind === 'supply' ? part.volts : 0;
            const amps = (emf - drop(from, to)) / part.ohms;
            sum += from === tag ? amps : -amps;
            largest = Math.max(largest, Math.abs(amps));
          }
          expect(Math.abs(sum)).toBeLessThanOrEqual(1e-9 + 1e-6 * largest);
        }
      }),
    );
  });

  it('the meter is a resistance like any other', () => {
    fc.assert(
      fc.property(wires, pair, pair, ohms(), (list, one, probes, meter) => {
        const withResistor = net(list, [
          supply('s', one, 100),
          { ...at, kind: 'resistor', name: 'meter', between: probes, ohms: meter },
        ]);
        const circuit = net(list, [supply('s', one, 100)]);
        expectClose(read(circuit, probes, meter), read(withResistor, probes));
      }),
    );
  });

  it('order: the parts may be listed in any order', () => {
    fc.assert(
      fc.property(wires, pair, pair, (list, one, probes) => {
        const circuit = net(list, [supply('s', one, 100)]);
        const turned = { ...circuit, parts: circuit.parts.toReversed() };
        expectClose(read(turned, probes), read(circuit, probes));
      }),
    );
  });

  it('bounds: without sources inside, no node is beyond the poles of the supply', () => {
    fc.assert(
      fc.property(wires, pair, pair, (list, one, probes) => {
        const reading = read(net(list, [supply('s', one, 100)]), probes);
        expect(Math.abs(reading)).toBeLessThanOrEqual(100 + 1e-6);
      }),
    );
  });
});
