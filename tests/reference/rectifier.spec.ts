import { describe, expect, it } from 'vitest';
import type { Circuit, Fault } from '@shared/circuit';
import { solve, type DiodeLaw, type SettledReading } from '@shared/solver';

const METER = 10e6;

/** A bridge on a supply with a resistor behind it, minus earthed. The supply's resistance is apart, for its current. */
function bridge(volts: number, sourceOhms: number, loadOhms: number): Circuit {
  const at = { place: 'controller', weight: 1 };
  return {
    format: 1,
    name: 'bridge',
    drawing: 'bridge',
    nominalVolts: volts,
    stringCurrent: 'direct',
    places: [{ name: 'controller', setUpMinutes: 0, shaft: false }],
    minutes: {},
    readingMinutes: 0.5,
    conditions: [],
    terminals: ['L', 'A1', 'A2', 'P', 'M'].map((tag) => ({
      tag,
      places: ['controller'],
      reachable: true,
      hazard: 'low',
    })),
    parts: [
      {
        ...at,
        kind: 'supply',
        name: 'supply',
        between: ['L', 'A2'],
        current: 'alternating',
        volts,
        hertz: 50,
        ohms: 1e-5,
      },
      { ...at, kind: 'resistor', name: 'winding', between: ['L', 'A1'], ohms: sourceOhms },
      { ...at, kind: 'bridge', name: 'bridge', between: ['A1', 'A2', 'P', 'M'] },
      { ...at, kind: 'resistor', name: 'load', between: ['P', 'M'], ohms: loadOhms },
      { ...at, kind: 'link', name: 'earth link', between: ['M', 'earth'], ohms: 0.05 },
    ],
    strings: [{ name: 'string', from: 'P', to: 'P', return: 'M', supplyReturn: 'M' }],
  };
}

const read = (
  circuit: Circuit,
  law: DiodeLaw,
  faults: readonly Fault[],
  [red, black]: readonly [string, string] = ['P', 'M'],
): SettledReading =>
  solve(circuit, {}, faults, { diodeLaw: law }).read({ red, black, meterOhms: METER });

const open = (diode: 1 | 2 | 3 | 4): Fault => ({ part: 'bridge', mode: 'diode open', diode });

describe('an ideal rectifier, per volt of sine', () => {
  // Source: closed forms 2√2/π and √2/π, √(1 − 8/π²) and √(1/2 − 2/π²); computed (C).
  // The form factors 1.11072 and 1.57080 are read in public texts (R).
  const IDEAL: DiodeLaw = { saturationAmps: 1e-9, emission: 1e-3, seriesOhms: 1e-6 };
  const VOLTS = 1000;
  const circuit = bridge(VOLTS, 1e-5, 1e4);

  it.each<[string, readonly Fault[], number, number, number, number]>([
    ['full wave', [], 0.900316, 0.43524, 0.48343, 100],
    ['half wave, diode 1 open', [open(1)], 0.450158, 0.54531, 1.21136, 50],
    ['half wave, diode 4 open', [open(4)], 0.450158, 0.54531, 1.21136, 50],
  ])('%s', (_name, faults, mean, ripple, factor, hertz) => {
    const reading = read(circuit, IDEAL, faults);
    expect(reading.mean / VOLTS).toBeCloseTo(mean, 4);
    expect(reading.ripple / VOLTS).toBeCloseTo(ripple, 4);
    expect(reading.ripple / reading.mean).toBeCloseTo(factor, 3);
    expect(reading.hertz).toBe(hertz);
  });

  it('has the form factors 1.11072 and 1.57080', () => {
    const full = read(circuit, IDEAL, []);
    expect(full.rms / full.mean).toBeCloseTo(1.11072, 3);
    const half = read(circuit, IDEAL, [open(2)]);
    expect(half.rms / half.mean).toBeCloseTo(1.5708, 3);
  });
});

describe('a real rectifier', () => {
  // Source: ngspice 39, 110 V 50 Hz, 7.1 ohm source, diodes IS=1e-9 N=1.8 RS=.02, 242 ohm load (C).
  const LAW: DiodeLaw = { saturationAmps: 1e-9, emission: 1.8, seriesOhms: 0.02 };
  const circuit = bridge(110, 7.1, 242);

  it('healthy: 94.439 V mean, 46.413 V ripple', () => {
    const { mean, ripple } = read(circuit, LAW, []);
    expect(Math.abs(mean - 94.439)).toBeLessThan(0.02);
    expect(Math.abs(ripple - 46.413)).toBeLessThan(0.02);
  });

  it('one diode open: 47.220 V mean, 57.504 V ripple', () => {
    const { mean, ripple } = read(circuit, LAW, [open(1)]);
    expect(Math.abs(mean - 47.22)).toBeLessThan(0.02);
    expect(Math.abs(ripple - 57.504)).toBeLessThan(0.02);
  });

  it('one diode open: 1.386 V of DC on the AC side, whose sign tells which of the leg', () => {
    const ac = (diode: 1 | 2 | 3 | 4) => read(circuit, LAW, [open(diode)], ['A1', 'A2']).mean;
    for (const diode of [1, 2, 3, 4] as const) {
      expect(Math.abs(Math.abs(ac(diode)) - 1.386)).toBeLessThan(0.01);
    }
    expect(Math.sign(ac(1))).toBe(-Math.sign(ac(3)));
    expect(Math.sign(ac(2))).toBe(-Math.sign(ac(4)));
  });

  it('one diode shorted: 10.81 A RMS in the supply, against 0.435 A', () => {
    const amps = (faults: readonly Fault[]) => read(circuit, LAW, faults, ['L', 'A1']).rms / 7.1;
    expect(amps([])).toBeCloseTo(0.435, 2);
    const shorted = amps([{ part: 'bridge', mode: 'diode shorted', diode: 1 }]);
    expect(Math.abs(shorted - 10.81)).toBeLessThan(0.03);
  });

  it('loses about two diode drops: mean near .9003·V − 2·Vf', () => {
    const light = read(bridge(110, 0.01, 1e4), LAW, []);
    // 0.6 V each at 10 mA by the law itself.
    expect(Math.abs(light.mean - (0.900316 * 110 - 2 * 0.7))).toBeLessThan(0.2);
  });
});

describe('a smoothed rectifier', () => {
  // Source: simulated (C): 110 V 50 Hz, two drops of 0.7 V, 100 µF, 1210 ohm. Here the diodes have no
  // drop and the supply is lower by both drops at its peak, which is the same.
  const IDEAL: DiodeLaw = { saturationAmps: 1e-9, emission: 1e-3, seriesOhms: 1e-4 };
  const resistive = bridge(110 - (2 * 0.7) / Math.SQRT2, 1e-5, 1210);
  const circuit: Circuit = {
    ...resistive,
    parts: [
      ...resistive.parts,
      {
        kind: 'capacitor',
        name: 'smoothing',
        place: 'controller',
        weight: 1,
        between: ['P', 'M'],
        farads: 1e-4,
      },
    ],
  };

  it.each<[string, readonly Fault[], number, number, number]>([
    ['full wave', [], 148.95, 3.191, 100],
    ['half wave', [open(1)], 143.44, 6.354, 50],
  ])('%s', (_name, faults, mean, ripple, hertz) => {
    const reading = read(circuit, IDEAL, faults);
    expect(Math.abs(reading.mean - mean)).toBeLessThan(0.1);
    expect(Math.abs(reading.ripple - ripple)).toBeLessThan(0.05);
    expect(reading.hertz).toBe(hertz);
  });
});
