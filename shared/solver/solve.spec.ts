import { describe, expect, it } from 'vitest';
import { stringCircuit, type Circuit, type Fault, type Part } from '../circuit';
import { solve } from './solve';
import type { SettledReading } from './solution';

const METER = 10e6;
/** A meter that draws nothing, ohms. */
const NONE = 1e15;

const LIFT =
  '110 V DC earthed: T0 (governor switch) T1 ~core 103~ T2 (pit stop) T3 [SR 3300 ohm] ' +
  '(gate contact) T4 (lock 1) T5 [LR 3300 ohm] (call contact when call=yes) T6 [K 550 ohm]';

function volts(circuit: Circuit, red: string, black: string, ...faults: Fault[]): SettledReading {
  return solve(circuit, {}, faults).read({ red, black, meterOhms: METER });
}

describe('a DC string', () => {
  const lift = stringCircuit(LIFT);

  it('reads what Ohm gives: 110 V over source, string and two coils in parallel', () => {
    // 1.5 + 0.1 + 0.1 + 0.3 + 0.1 to T3; there 3300 beside 0.1 + 0.1 + 3300; 0.1 back.
    const coils = 1 / (1 / 3300 + 1 / 3300.2);
    const amps = 110 / (1.5 + 0.1 + 0.5 + coils + 0.1);
    expect(volts(lift, 'T3', 'R').mean).toBeCloseTo(amps * coils, 4);
    expect(volts(lift, 'T3', 'R').ripple).toBe(0);
    expect(volts(lift, 'T3', 'R').hertz).toBe(0);
  });

  it('keeps the sign of swapped probes', () => {
    expect(volts(lift, 'R', 'T3').mean).toBeCloseTo(-volts(lift, 'T3', 'R').mean, 9);
  });

  it('is live before an open and dead behind it, with all volts across it', () => {
    const open: Fault = { part: 'pit stop', mode: 'open' };
    expect(volts(lift, 'T2', 'R', open).mean).toBeCloseTo(110, 1);
    expect(volts(lift, 'T3', 'R', open).mean).toBeCloseTo(0, 3);
    expect(volts(lift, 'T2', 'T3', open).mean).toBeCloseTo(110, 1);
  });

  it('shows no volts across one of two opens, and says that what is between floats', () => {
    const two: Fault[] = [
      { part: 'governor switch', mode: 'open' },
      { part: 'pit stop', mode: 'open' },
    ];
    // An open is 1 Gohm, so that a meter of 10 Mohm behind it takes a hundredth.
    expect(volts(lift, 'T2', 'R', ...two).mean).toBeCloseTo(110 / 102, 1);
    expect(volts(lift, 'T2', 'R', ...two).floating).toBe(true);
    expect(volts(lift, 'T0', 'R', ...two).floating).toBe(false);
    expect(volts(lift, 'T0', 'R', ...two).theveninOhms).toBeCloseTo(1.7, 3);
  });

  it('has the return live to the supply when the return wire is open', () => {
    const open: Fault = { part: 'return wire', mode: 'open' };
    expect(volts(lift, 'T0', 'R', open).mean).toBeCloseTo(0, 2);
    expect(volts(lift, 'R', 'N', open).mean).toBeCloseTo(110, 0);
  });

  it('reads against earth through the earth link, and blows no fuse by itself', () => {
    const amps = 110 / (1.5 + 0.1 + 2.2 + 0.05);
    const earthed: Fault = { part: 'T0', mode: 'earth', ohms: 2.2 };
    expect(volts(lift, 'T0', 'earth', earthed).mean).toBeCloseTo(amps * 2.2, 1);
  });

  it.each<[Fault, number]>([
    [{ part: 'supply', mode: 'low', factor: 0.5 }, 55],
    [{ part: 'supply', mode: 'high', factor: 1.2 }, 132],
    [{ part: 'supply', mode: 'dead' }, 0],
    [{ part: 'fuse', mode: 'blown' }, 0],
  ])('%j leaves %d V at T0', (fault, expected) => {
    expect(Math.abs(volts(lift, 'T0', 'R', fault).mean - expected)).toBeLessThan(0.2);
  });

  it('loses volts under load with a weak supply', () => {
    const coils = 1 / (1 / 3300 + 1 / 3300.2);
    const reading = volts(lift, 'T0', 'R', { part: 'supply', mode: 'weak', ohms: 300 });
    expect(reading.mean).toBeCloseTo((110 * (coils + 0.5)) / (300 + 0.1 + 0.5 + coils + 0.1), 1);
  });

  it('stays finite with faults of 0 ohm', () => {
    const dead: Fault = { part: 'T0', mode: 'earth', ohms: 0 };
    expect(volts(lift, 'T0', 'earth', dead).mean).toBeCloseTo(0, 3);
    const weak: Fault = { part: 'supply', mode: 'weak', ohms: 0 };
    expect(volts(lift, 'S', 'N', weak).mean).toBeCloseTo(110, 3);
  });

  it('refuses a tag that the circuit lacks', () => {
    expect(() => volts(lift, 'T99', 'R')).toThrow(RangeError);
  });
});

describe('an AC string', () => {
  const lift = stringCircuit('110 V AC earthed: T0 (governor switch) T1 (gate) T2 [LR 3300 ohm]');

  it('reads RMS as ripple, no mean, at the frequency of the supply', () => {
    const reading = volts(lift, 'T2', 'R');
    expect(reading.mean).toBe(0);
    expect(reading.rms).toBeCloseTo((110 * 3300) / (3300 + 1.5 + 0.1 + 0.2 + 0.1), 2);
    expect(reading.ripple).toBeCloseTo(reading.rms, 9);
    expect(reading.hertz).toBe(50);
  });

  it('takes the coil current as RMS', () => {
    expect(solve(lift, {}, []).coilMilliamps['LR']).toBeCloseTo((110 / 3301.9) * 1000, 3);
  });
});

describe('two supplies of different frequency', () => {
  it('adds their squares, and names the lower frequency', () => {
    const lift = stringCircuit('100 V DC: T0 (gate) T1 [LR 1000 ohm]');
    const second = stringCircuit('30 V AC: T0 (gate) T1 [LR 1000 ohm]');
    const supply = { ...second.parts[0]!, name: 'stray', between: ['S', 'N'] as [string, string] };
    const reading = volts(
      { ...lift, parts: [...lift.parts, supply] as Circuit['parts'] },
      'S',
      'N',
    );
    expect(reading.hertz).toBe(50);
    expect(reading.rms).toBeCloseTo(Math.hypot(reading.mean, reading.ripple), 9);
    expect(reading.mean).toBeCloseTo(50, 0);
    expect(reading.ripple).toBeCloseTo(15, 0);
  });
});

describe('a transformer', () => {
  const lift = stringCircuit('110 V AC: T0 (gate) T1 [LR 1000 ohm]');
  const circuit: Circuit = {
    ...lift,
    parts: [
      ...lift.parts.filter(({ kind }) => kind !== 'supply'),
      {
        kind: 'supply',
        name: 'mains',
        place: 'controller',
        weight: 1,
        between: ['L', 'N0'],
        current: 'alternating',
        volts: 230,
        hertz: 50,
        ohms: 0.5,
      },
      {
        kind: 'transformer',
        name: 'control transformer',
        place: 'controller',
        weight: 1,
        primary: ['L', 'N0'],
        secondary: ['S', 'N'],
        ratio: 0.5,
        ohms: 10,
      },
    ],
  };

  it('gives the ratio less what its own and the referred resistance take', () => {
    // 0.5 ohm on the primary is 0.5²·0.5 = 0.125 ohm on the secondary.
    const expected = (115 * 1000) / (1000 + 10 + 0.125 + 0.1 + 0.1 + 0.1);
    expect(volts(circuit, 'T1', 'R').rms).toBeCloseTo(expected, 2);
  });

  it('gives nothing when its winding is dead', () => {
    const reading = volts(circuit, 'T1', 'R', { part: 'control transformer', mode: 'dead' });
    expect(reading.rms).toBeLessThan(0.01);
  });

  it('feeds a bridge as it feeds a string', () => {
    const rectified = stringCircuit('124 V bridge earthed: T0 (gate) T1 [LR 1000 ohm]');
    const fed: Circuit = {
      ...rectified,
      parts: rectified.parts.flatMap((part): Part[] =>
        part.kind === 'supply'
          ? [
              {
                ...part,
                between: ['L', 'N0'] as [string, string],
                volts: 248,
                ohms: 4 * part.ohms - 4,
              },
              {
                kind: 'transformer',
                name: 'control transformer',
                place: 'controller',
                weight: 1,
                primary: ['L', 'N0'],
                secondary: ['AC1', 'AC2'],
                ratio: 0.5,
                ohms: 1,
              },
            ]
          : [part],
      ),
    };
    const direct = solve(rectified, {}, []).read({ red: 'T1', black: 'R', meterOhms: METER });
    const through = solve(fed, {}, []).read({ red: 'T1', black: 'R', meterOhms: METER });
    expect(through.mean).toBeCloseTo(direct.mean, 4);
    expect(through.ripple).toBeCloseTo(direct.ripple, 4);
  });
});

describe('a rectified string', () => {
  const lift = stringCircuit('124 V bridge earthed: T0 (gate) T1 [LR 3300 ohm]');

  it('has its ripple at twice the frequency, and at the frequency with one diode open', () => {
    expect(volts(lift, 'T1', 'R').hertz).toBe(100);
    expect(volts(lift, 'T1', 'R', { part: 'bridge', mode: 'diode open', diode: 3 }).hertz).toBe(50);
  });

  it('reads the same with the meter as with a resistor of its size and no meter', () => {
    for (const fault of [
      [],
      [{ part: 'gate', mode: 'open' as const }],
      [{ part: 'bridge', mode: 'diode open' as const, diode: 2 as const }],
      [{ part: 'fuse', mode: 'blown' as const }],
    ]) {
      for (const [red, black, ohms] of [
        ['T1', 'R', 3000],
        ['T0', 'N', 10e6],
        ['AC1', 'N', 400e3],
        ['T0', 'T1', 3000],
      ] as const) {
        const withResistor: Circuit = {
          ...lift,
          parts: [
            ...lift.parts,
            {
              kind: 'resistor',
              name: 'meter',
              place: 'controller',
              weight: 0,
              between: [red, black],
              ohms,
            },
          ],
        };
        const metered = solve(lift, {}, fault).read({ red, black, meterOhms: ohms });
        const resistor = solve(withResistor, {}, fault).read({ red, black, meterOhms: NONE });
        expect(metered.mean).toBeCloseTo(resistor.mean, 1);
        expect(metered.rms).toBeCloseTo(resistor.rms, 1);
      }
    }
  });
});

describe('a smoothed string', () => {
  const rectified = stringCircuit('124 V bridge earthed: T0 (gate) T1 [LR 3300 ohm]');
  const smoothed = (farads: number): Circuit => ({
    ...rectified,
    parts: [
      ...rectified.parts,
      {
        kind: 'capacitor',
        name: 'smoothing',
        place: 'controller',
        weight: 0,
        between: ['S', 'N'],
        farads,
      },
    ],
  });

  it('has more volts and less ripple the more capacitance it has', () => {
    const readings = [1e-6, 1e-5, 1e-4, 1e-3].map((farads) => volts(smoothed(farads), 'T1', 'R'));
    const none = volts(rectified, 'T1', 'R');
    [none, ...readings].reduce((less, more) => {
      expect(more.mean).toBeGreaterThan(less.mean);
      expect(more.ripple).toBeLessThan(less.ripple);
      return more;
    });
    expect(readings.at(-1)!.mean).toBeLessThan(124 * Math.SQRT2);
  });

  it('falls by about i/(2·f·C) between two peaks', () => {
    const reading = volts(smoothed(1e-3), 'T1', 'R');
    const peakToPeak = reading.mean / 3300 / (100 * 1e-3);
    // A saw-tooth of that height has an RMS of its height over 2·√3.
    expect(reading.ripple).toBeGreaterThan((0.8 * peakToPeak) / (2 * Math.sqrt(3)));
    expect(reading.ripple).toBeLessThan((1.01 * peakToPeak) / (2 * Math.sqrt(3)));
  });

  it('charges to the peak where nothing draws current', () => {
    const open: Fault = { part: 'fuse', mode: 'blown' };
    const reading = volts(smoothed(1e-4), 'S', 'N', open);
    expect(reading.mean).toBeGreaterThan(124 * Math.SQRT2 - 2 * 0.7);
    expect(reading.ripple).toBeLessThan(0.1);
  });
});
