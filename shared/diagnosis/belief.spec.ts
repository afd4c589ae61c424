import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { stringCircuit } from '../circuit';
import { solve } from '../solver';
import { createEngine } from './advise';
import { SUPPLY_DEVIATION, SUPPLY_FACTORS } from './belief';
import { Evidence } from './evidence';
import { hypothesesOf, NOT_DESCRIBED_PRIOR } from './hypotheses';
import { anywhere, readingLikelihood } from './likelihood';
import { USUAL_METER, type Observation, type ReadingObservation } from './observation';
import { Predictions } from './predictions';

const circuit = stringCircuit('110 V DC earthed: T0 (stop) T1 (governor) T2 (gate) T3 [LR]');
const hypotheses = hypothesesOf(circuit);
const predictions = new Predictions(circuit, hypotheses);

const reading = (red: string, volts: number, id = red): ReadingObservation => ({
  kind: 'reading',
  id,
  red,
  black: 'R',
  function: 'dc volts',
  volts,
  meter: USUAL_METER,
  state: {},
  place: 'controller',
});
const believe = (observations: readonly Observation[]) =>
  new Evidence(circuit, hypotheses, predictions).belief(observations);

describe('belief', () => {
  it('is what plain enumeration of hypotheses and supply factors makes', () => {
    const observations = [reading('T0', 109.2), reading('T1', 108.8), reading('T2', 0.1)];
    const joint = hypotheses.map(({ prior, fault }) =>
      SUPPLY_FACTORS.map((factor) => {
        const weight = Math.exp(-0.5 * ((factor - 1) / SUPPLY_DEVIATION) ** 2);
        return observations.reduce((product, seen) => {
          const solution = solve(circuit, {}, fault ? [fault] : []);
          const read = solution.read({ red: seen.red, black: 'R', meterOhms: 10e6 });
          const spread = predictions.readings({}, { ...seen, ohms: 10e6 })[
            hypotheses.findIndex((each) => each.fault === fault)
          ]!.spread;
          const predicted = { volts: read.mean * factor, floating: read.floating, spread };
          return product * readingLikelihood(seen.volts, predicted, seen.meter, 110);
        }, prior * weight);
      }),
    );
    const supply = SUPPLY_FACTORS.reduce(
      (sum, factor) => sum + Math.exp(-0.5 * ((factor - 1) / SUPPLY_DEVIATION) ** 2),
      0,
    );
    const weights = joint.map((row) => row.reduce((a, b) => a + b, 0) / supply);
    const other = NOT_DESCRIBED_PRIOR * anywhere(110) ** observations.length;
    const sum = weights.reduce((a, b) => a + b, other);
    const { shares, notDescribed } = believe(observations);
    weights.forEach((weight, h) => expect(shares[h]).toBeCloseTo(weight / sum, 9));
    expect(notDescribed).toBeCloseTo(other / sum, 9);
  });

  it('does not depend on the order, also of repeats that contradict each other', () => {
    const pool = [
      reading('T0', 110.4),
      reading('T1', 110.2),
      reading('T2', 0),
      reading('T3', 0),
      reading('T1', 20, 'slip'),
      reading('T2', 110, 'the other'),
      { ...reading('T3', 0, 'turned'), red: 'R', black: 'T3' },
      { kind: 'relay' as const, id: 'out', relay: 'LR', position: 'out' as const, state: {} },
      { kind: 'relay' as const, id: 'in', relay: 'LR', position: 'in' as const, state: {} },
    ];
    fc.assert(
      fc.property(fc.shuffledSubarray(pool, { minLength: pool.length }), (shuffled) => {
        const [a, b] = [believe(pool), believe(shuffled)];
        a.shares.forEach((share, h) => expect(b.shares[h]).toBeCloseTo(share, 12));
      }),
      { seed: 3, numRuns: 60 },
    );
  });

  it('learns the supply from what is read', () => {
    const low = believe([reading('T0', 101.2), reading('T1', 101), reading('T2', 100.8)]);
    expect(low.supply.mean).toBeGreaterThan(0.9);
    expect(low.supply.mean).toBeLessThan(0.95);
    expect(low.supply.deviation).toBeLessThan(SUPPLY_DEVIATION);
  });

  // Half of the slips persist: however often it is repeated, a reading at most halves the odds of one.
  it('gains almost nothing by repeats of the same set-up', () => {
    const once = believe([reading('T0', 110), reading('T2', 0)]);
    const repeats = Array.from({ length: 9 }, (_, k) => reading('T2', 0, `again ${k}`));
    const often = believe([reading('T0', 110), reading('T2', 0), ...repeats]);
    const top = once.shares.indexOf(Math.max(...once.shares));
    once.shares.forEach((share, h) => {
      const odds = often.shares[h]! / often.shares[top]! / (share / once.shares[top]!);
      expect(odds).toBeGreaterThan(0.49);
      expect(odds).toBeLessThan(1.05);
    });
  });

  it('leans to the larger number where a set-up contradicts itself', () => {
    const governor = (...seen: ReadingObservation[]) => {
      const { shares } = believe([reading('T0', 110), ...seen, reading('T2', 0)]);
      return shares[hypotheses.findIndex(({ fault }) => fault?.part === 'governor')]!;
    };
    const evenly = governor(reading('T1', 0), reading('T1', 110, 'b'));
    const mostly = governor(reading('T1', 0), reading('T1', 110, 'b'), reading('T1', 110, 'c'));
    expect(mostly).toBeGreaterThan(evenly);
  });

  it('takes readings with the probes the wrong way round as what they are', () => {
    const turned = believe([reading('T0', -110), reading('T1', -110), reading('T2', 0)]);
    expect(turned.notDescribed).toBeLessThan(0.02);
    const top = turned.shares.indexOf(Math.max(...turned.shares));
    expect(hypotheses[top]!.fault?.part).toBe('governor');
  });

  it('learns nothing from what the circuit does not have', () => {
    const seen: readonly Observation[] = [
      { kind: 'relay', id: 'a', relay: 'no such relay', position: 'in', state: {} },
      { kind: 'device', id: 'b', part: 'no such part', seen: 'open', state: {} },
      reading('no such tag', 110),
      reading('R', 110),
      reading('T1', Number.NaN),
      reading('T1', Number.POSITIVE_INFINITY),
    ];
    const ask = (observations: readonly Observation[]) =>
      createEngine(circuit).advise({
        observations,
        place: 'no such place',
        state: { 'no such condition': 'yes' },
        unreachable: ['no such tag'],
        declined: [],
        meter: USUAL_METER,
      });
    expect(ask(seen)).toEqual(ask([]));
  });
});

describe('readings that fit nothing', () => {
  it.each([1e9, -1e9, 0, 1e-300, 55.5])(
    'never make NaN or an exception: %d V everywhere',
    (volts) => {
      const observations = ['T0', 'T1', 'T2', 'T3', 'a tag not drawn'].map((tag) =>
        reading(tag, volts),
      );
      const advice = createEngine(circuit).advise({
        observations,
        place: 'controller',
        state: {},
        unreachable: [],
        declined: [],
        meter: USUAL_METER,
      });
      expect(JSON.stringify(advice)).not.toContain('null');
      const shares = advice.suspects.map(({ probability }) => probability);
      for (const share of [...shares, advice.notDescribed, advice.nothingWrong]) {
        expect(share).toBeGreaterThanOrEqual(0);
        expect(share).toBeLessThanOrEqual(1 + 1e-9);
      }
    },
  );
});

describe('explanations', () => {
  it('name the readings that clear a part, and those that point to a suspect', () => {
    const advice = createEngine(circuit).advise({
      observations: [reading('T0', 110), reading('T1', 110), reading('T2', 0)],
      place: 'controller',
      state: {},
      unreachable: ['LR'],
      declined: [],
      meter: USUAL_METER,
    });
    expect(advice.suspects[0]!.faults[0]!.part).toBe('governor');
    expect(advice.suspects[0]!.because[0]).toMatchObject({
      code: 'reads as with this fault',
      observations: ['T2'],
    });
    const stop = advice.cleared.find(({ part }) => part === 'stop');
    expect(stop!.because[0]).toMatchObject({ code: 'would read otherwise', observations: ['T1'] });
  });
});
