import { describe, expect, it } from 'vitest';
import { bestCuts } from '@shared/diagnosis';

const TEN = [30, 5, 5, 10, 2, 8, 20, 5, 10, 5];

describe('the best order of cuts', () => {
  // Gilbert & Moore 1959, frequencies of English letters and the space, × 1e4. Input and optimum are
  // remembered; the optimum was reproduced by an independent dynamic programme.
  it('costs what the optimal alphabetic tree of English letters costs', () => {
    const letters = [
      1859, 642, 127, 218, 317, 1031, 208, 152, 467, 575, 8, 49, 321, 198, 574, 632, 152, 8, 484,
      514, 796, 228, 83, 175, 13, 164, 5,
    ];
    const cost = bestCuts(letters).cost / 1e4;
    expect(cost).toBeCloseTo(4.1978, 4);
    // Without regard to order Huffman's code costs 4.1195: no order of cuts can be cheaper.
    expect(cost).toBeGreaterThan(4.1195);
  });

  // Source: independent exact dynamic programme.
  it('costs 305 for ten parts, and 560 with costs of its own, cut first after 4', () => {
    expect(bestCuts(TEN).cost).toBe(305);
    expect(bestCuts(TEN, [1, 4, 4, 1, 4, 4, 1, 4, 1])).toEqual({ cost: 560, first: 4 });
  });

  // Closed form for equal weights: n·ceil(log2 n) + n − 2^ceil(log2 n).
  it.each([
    [20, 88],
    [37, 195],
    [64, 384],
  ])('costs for %i equal parts %i', (count, cost) => {
    expect(bestCuts(Array.from({ length: count }, () => 1)).cost).toBe(cost);
  });

  // Shannon's bound; the upper one for alphabetic trees is Gilbert & Moore's.
  it('lies between the entropy and two more', () => {
    const sum = TEN.reduce((a, b) => a + b);
    const entropy = TEN.reduce((bits, w) => bits - (w / sum) * Math.log2(w / sum), 0);
    expect(bestCuts(TEN).cost / sum).toBeGreaterThanOrEqual(entropy);
    expect(bestCuts(TEN).cost / sum).toBeLessThan(entropy + 2);
  });
});
