import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { confirmPlan, type PlanInput } from './confirmPlan';
import { bestCuts } from './cutTree';

const onePlace = (weights: readonly number[], costs?: readonly number[]): PlanInput => ({
  weights,
  cuts: [...weights, 0].map(() => [0]),
  direct: weights.map(() => [0]),
  minutes: [[costs?.[0] ?? 1]],
});

/** Every plan of these tests, by plain recursion without a table. */
function byEnumeration(input: PlanInput, i: number, j: number, place: number): number {
  const { weights, cuts, direct, minutes } = input;
  const whole = weights.slice(i, j).reduce((a, b) => a + b, 0);
  if (j - i < 1) return 0;
  if (j - i === 1) return whole * Math.min(...direct[i]!.map((q) => minutes[place]![q]!));
  const ways: number[] = [];
  for (let k = i + 1; k < j; k++) {
    for (const q of cuts[k]!) {
      ways.push(
        minutes[place]![q]! * whole + byEnumeration(input, i, k, q) + byEnumeration(input, k, j, q),
      );
    }
  }
  for (const q of direct[i]!) {
    ways.push(minutes[place]![q]! * whole + byEnumeration(input, i + 1, j, q));
  }
  for (const q of direct[j - 1]!) {
    ways.push(minutes[place]![q]! * whole + byEnumeration(input, i, j - 1, q));
  }
  return Math.min(...ways);
}

describe('the plan to a confirmed open', () => {
  // Source: independent exact dynamic programme (ten parts, 305 of 100).
  it('is the optimal alphabetic tree with one place, equal costs and no confirmation', () => {
    const ten = [30, 5, 5, 10, 2, 8, 20, 5, 10, 5];
    const plan = confirmPlan({ ...onePlace(ten), confirming: false });
    expect(plan.cost(0, 10, 0)).toBe(305);
  });

  it('agrees with the optimal alphabetic tree for any weights', () => {
    fc.assert(
      fc.property(
        fc.array(fc.integer({ min: 0, max: 50 }), { minLength: 1, maxLength: 14 }),
        (w) => {
          const plan = confirmPlan({ ...onePlace(w), confirming: false });
          expect(plan.cost(0, w.length, 0)).toBeCloseTo(bestCuts(w).cost, 9);
        },
      ),
      { seed: 20261201, numRuns: 200 },
    );
  });

  it('is the least of all plans with places and direct measurements', () => {
    const size = 5;
    const arbitrary = fc.record({
      weights: fc.array(fc.integer({ min: 1, max: 30 }), { minLength: size, maxLength: size }),
      cuts: fc.array(fc.constantFrom([0], [1], [2], [0, 1], [1, 2]), {
        minLength: size + 1,
        maxLength: size + 1,
      }),
      direct: fc.array(fc.constantFrom([0], [1], [2], [0, 2]), {
        minLength: size,
        maxLength: size,
      }),
      way: fc.array(fc.integer({ min: 1, max: 20 }), { minLength: 3, maxLength: 3 }),
    });
    fc.assert(
      fc.property(arbitrary, ({ weights, cuts, direct, way }) => {
        const [a, b, c] = way as [number, number, number];
        const minutes = [
          [0.5, a, b],
          [a, 0.5, c],
          [b, c, 0.5],
        ];
        const input = { weights, cuts, direct, minutes };
        const least = byEnumeration(input, 0, size, 0);
        expect(confirmPlan(input).cost(0, size, 0)).toBeCloseTo(least, 9);
      }),
      { seed: 7, numRuns: 100 },
    );
  });

  it('measures an end part at once where that splits and confirms', () => {
    // Two parts of equal weight: across the first, then across the second, is 1.5; a cut first is 2.
    expect(confirmPlan(onePlace([1, 1])).cost(0, 2, 0) / 2).toBeCloseTo(1.5, 9);
  });

  it('charges a dead measurement where no reading reaches', () => {
    const input = { ...onePlace([1, 3]), cuts: [[0], [], [0]], direct: [[], []] };
    expect(confirmPlan({ ...input, deadMinutes: 15 }).cost(0, 2, 0)).toBe(60);
  });
});
