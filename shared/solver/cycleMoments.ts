import { sinesOf, type Cycle } from './cycle';

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

/** Sums of products over every second sample, from the `first` on. */
function halfSums(cycle: Cycle, kept: number, first: 0 | 1): Moments {
  const size = kept + 2;
  const means = new Float64Array(size);
  const products = new Float64Array(size * size);
  const sines = new Float64Array(size);
  const cosines = new Float64Array(size);
  const values = new Float64Array(size);
  const { points, volts } = cycle;
  const table = sinesOf(points);
  const quarter = points / 4;
  values[kept] = 1;
  for (let j = first; j < points; j += 2) {
    for (let k = 0; k < kept; k++) values[k] = volts[j * kept + k]!;
    const sine = table[j]!;
    const cosine = table[(j + quarter) % points]!;
    values[kept + 1] = sine;
    for (let a = 0; a < size; a++) {
      const value = values[a]!;
      means[a]! += value;
      sines[a]! += value * sine;
      cosines[a]! += value * cosine;
      for (let b = a; b < size; b++) products[a * size + b]! += value * values[b]!;
    }
  }
  return { size, means, products, sines, cosines };
}

/** Moments over all samples; and over every second one, to see what half the samples would have said. */
export function momentsOf(
  cycle: Cycle,
  kept: number,
): { readonly all: Moments; readonly half: Moments } {
  const even = halfSums(cycle, kept, 0);
  const odd = halfSums(cycle, kept, 1);
  const { points } = cycle;
  const scaled = (a: Float64Array, b: Float64Array | undefined, factor: number) =>
    a.map((value, k) => (value + (b ? b[k]! : 0)) * factor);
  const moments = (other: Moments | undefined, count: number): Moments => ({
    size: even.size,
    means: scaled(even.means, other?.means, 1 / count),
    products: mirrored(scaled(even.products, other?.products, 1 / count), even.size),
    sines: scaled(even.sines, other?.sines, 2 / count),
    cosines: scaled(even.cosines, other?.cosines, 2 / count),
  });
  return { all: moments(odd, points), half: moments(undefined, points / 2) };
}

/** The lower triangle filled in from the upper one, in place. */
function mirrored(products: Float64Array, size: number): Float64Array {
  for (let a = 0; a < size; a++) {
    for (let b = a + 1; b < size; b++) products[b * size + a] = products[a * size + b]!;
  }
  return products;
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
