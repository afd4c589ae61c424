import type { Cycle } from './diodeCycle';

/**
 * Every voltage of a rectified circuit is a fixed combination of the kept nodes' voltages, a constant
 * and the supply's sine. So its mean, its RMS and its part at the supply's frequency follow from the
 * moments of these few functions, and no other waveform is ever formed.
 */
export interface Moments {
  /** Number of functions: kept nodes, then the constant, then the sine. */
  readonly size: number;
  readonly means: Float64Array;
  /** Mean of each product of two functions. */
  readonly products: Float64Array;
  /** Amplitudes at the supply's frequency. */
  readonly sines: Float64Array;
  readonly cosines: Float64Array;
}

/** Moments over every `stride`-th sample. */
export function momentsOf(cycle: Cycle, kept: number, stride = 1): Moments {
  const size = kept + 2;
  const means = new Float64Array(size);
  const products = new Float64Array(size * size);
  const sines = new Float64Array(size);
  const cosines = new Float64Array(size);
  const values = new Float64Array(size);
  values[kept] = 1;
  const count = cycle.points / stride;
  for (let j = 0; j < cycle.points; j += stride) {
    for (let k = 0; k < kept; k++) values[k] = cycle.volts[j * kept + k]!;
    const angle = (2 * Math.PI * j) / cycle.points;
    const sine = Math.sin(angle);
    const cosine = Math.cos(angle);
    values[kept + 1] = sine;
    for (let a = 0; a < size; a++) {
      const value = values[a]!;
      means[a]! += value;
      sines[a]! += 2 * value * sine;
      cosines[a]! += 2 * value * cosine;
      for (let b = a; b < size; b++) products[a * size + b]! += value * values[b]!;
    }
  }
  for (let a = 0; a < size; a++) {
    means[a]! /= count;
    sines[a]! /= count;
    cosines[a]! /= count;
    for (let b = a; b < size; b++) {
      products[a * size + b]! /= count;
      products[b * size + a] = products[a * size + b]!;
    }
  }
  return { size, means, products, sines, cosines };
}

/** Mean of the square of a combination. Rounding may leave a trace below zero: it is cut off. */
export function squareOf({ size, products }: Moments, weights: Float64Array): number {
  let sum = 0;
  for (let a = 0; a < size; a++) {
    if (weights[a] === 0) continue;
    for (let b = 0; b < size; b++) sum += weights[a]! * weights[b]! * products[a * size + b]!;
  }
  return Math.max(0, sum);
}

/** The largest change between two sets of moments in the mean or RMS between any two kept nodes, volts. */
export function largestMove(a: Moments, b: Moments): number {
  const kept = a.size - 2;
  const weights = new Float64Array(a.size);
  let largest = 0;
  for (let red = 0; red < kept; red++) {
    for (let black = red; black < kept; black++) {
      weights.fill(0);
      weights[red] = 1;
      // A node with itself stands for the node against earth.
      if (black !== red) weights[black] = -1;
      let mean = 0;
      for (let k = 0; k < kept; k++) mean += weights[k]! * (a.means[k]! - b.means[k]!);
      const rms = Math.sqrt(squareOf(a, weights)) - Math.sqrt(squareOf(b, weights));
      largest = Math.max(largest, Math.abs(mean), Math.abs(rms));
    }
  }
  return largest;
}
