import { sinesOf, type Cycle, type SampledCycle } from './cycle';
import { DiodeNewton } from './diodeNewton';
import type { Combination, KeptNodes } from './keptNodes';

/**
 * The first stage of a step ends at this share of it: 1 − 1/√2. With it two implicit stages of equal
 * size are accurate to the second order and damp what is too quick to follow (Alexander 1977).
 */
const STAGE = 1 - Math.SQRT1_2;
/** Cycles tried before the last one is taken as settled. Usual: four or five. */
const MAX_CYCLES = 60;
/** The correction at the cycle's beginning that ends the search, volts. */
const SETTLED_VOLTS = 1e-3;

/**
 * The cycle that ends as it begins, capacitors included. One cycle is stepped through from assumed
 * charges together with how its end depends on them; Newton then corrects the beginning.
 */
export function chargedCycle(
  kept: KeptNodes,
  points: number,
  extras: readonly Combination[],
  near: Cycle | undefined,
): SampledCycle {
  const stepper = new Stepper(kept, points, extras);
  const begin = new Float64Array(kept.capacitors.length);
  if (near) begin.set(near.charges);
  for (let cycles = 0; cycles < MAX_CYCLES; cycles++) {
    stepper.run(begin);
    const correction = stepper.correction(begin);
    if (correction.every((volts) => Math.abs(volts) < SETTLED_VOLTS)) break;
    correction.forEach((volts, c) => (begin[c]! += volts));
  }
  return { points, volts: stepper.volts, junctions: stepper.junctions, charges: begin };
}

class Stepper {
  readonly volts: Float64Array;
  readonly junctions: Float64Array;
  /** Siemens that each capacitor is during a stage. */
  private readonly siemens: readonly number[];
  private readonly newton: DiodeNewton;
  private readonly stored: Float64Array;
  private readonly column: Float64Array;
  private readonly now: Float64Array;
  private readonly end: Float64Array;
  /** How the charges now depend on those at the beginning; row by row. */
  private depends: Float64Array;

  constructor(
    private readonly kept: KeptNodes,
    private readonly points: number,
    extras: readonly Combination[],
  ) {
    const { size, capacitors, diodes, periodSeconds } = kept;
    const stage = (STAGE * periodSeconds) / points;
    this.siemens = capacitors.map(({ farads }) => farads / stage);
    this.newton = new DiodeNewton(withCompanions(kept, this.siemens), extras);
    this.volts = new Float64Array(points * size);
    this.junctions = new Float64Array(points * diodes.length);
    this.stored = new Float64Array(size);
    this.column = new Float64Array(size);
    this.now = new Float64Array(diodes.length);
    this.end = new Float64Array(capacitors.length);
    this.depends = new Float64Array(capacitors.length ** 2);
  }

  /** One cycle from these volts across the capacitors. */
  run(begin: Float64Array): void {
    const { kept, points, end, now } = this;
    const count = begin.length;
    const sines = sinesOf(points);
    end.set(begin);
    this.depends.fill(0);
    for (let c = 0; c < count; c++) this.depends[c * count + c] = 1;
    const memory = new Float64Array(count);
    for (let j = 1; j <= points; j++) {
      const middle = Math.sin((2 * Math.PI * (j - 1 + STAGE)) / points);
      memory.set(end);
      const first = this.stage(middle, memory);
      const dependsFirst = this.dependence(this.depends);
      // What the second stage starts from: the first one's slope carried on over the rest of the step.
      const carry = (1 - STAGE) / STAGE;
      for (let c = 0; c < count; c++) memory[c] = end[c]! + carry * (first[c]! - end[c]!);
      const dependsMemory = this.depends.map(
        (value, k) => value + carry * (dependsFirst[k]! - value),
      );
      end.set(this.stage(sines[j % points]!, memory));
      this.depends = this.dependence(dependsMemory);
      this.volts.set(this.newton.volts, (j % points) * kept.size);
      this.junctions.set(now, (j % points) * now.length);
    }
  }

  /** Settles one implicit stage; the volts across the capacitors at its end. */
  private stage(sine: number, memory: Float64Array): Float64Array {
    const { capacitors } = this.kept;
    this.stored.fill(0);
    capacitors.forEach(({ a, b }, c) => {
      const amps = this.siemens[c]! * memory[c]!;
      if (a >= 0) this.stored[a]! += amps;
      if (b >= 0) this.stored[b]! -= amps;
    });
    this.newton.settle(sine, this.now, this.stored);
    return this.across(this.newton.volts);
  }

  private across(volts: Float64Array): Float64Array {
    return Float64Array.from(
      this.kept.capacitors,
      ({ a, b }) => (a >= 0 ? volts[a]! : 0) - (b >= 0 ? volts[b]! : 0),
    );
  }

  /** The dependence at a stage's end, from that of what the stage remembers. */
  private dependence(memory: Float64Array): Float64Array {
    const { capacitors } = this.kept;
    const count = capacitors.length;
    const after = new Float64Array(count * count);
    capacitors.forEach(({ a, b }, c) => {
      this.column.fill(0);
      if (a >= 0) this.column[a]! += this.siemens[c]!;
      if (b >= 0) this.column[b]! -= this.siemens[c]!;
      this.newton.respond(this.column);
      const gain = this.across(this.column);
      for (let row = 0; row < count; row++) {
        for (let k = 0; k < count; k++) {
          after[row * count + k]! += gain[row]! * memory[c * count + k]!;
        }
      }
    });
    return after;
  }

  /** What to add to the beginning so that the end would meet it, volts. */
  correction(begin: Float64Array): Float64Array {
    const count = begin.length;
    const matrix = this.depends.map((value, k) => (k % (count + 1) === 0 ? 1 - value : -value));
    return solveDense(
      matrix,
      this.end.map((value, c) => value - begin[c]!),
    );
  }
}

/** The kept nodes with every capacitor as a conductance besides. */
export function withCompanions(kept: KeptNodes, siemens: readonly number[]): KeptNodes {
  const between = Float64Array.from(kept.between);
  const leak = Float64Array.from(kept.leak);
  kept.capacitors.forEach(({ a, b }, c) => {
    if (a < 0) leak[b]! += siemens[c]!;
    else if (b < 0) leak[a]! += siemens[c]!;
    else between[Math.min(a, b) * kept.size + Math.max(a, b)]! += siemens[c]!;
  });
  return { ...kept, between, leak };
}

/** Gaussian elimination with row pivoting, for as many unknowns as there are capacitors. */
function solveDense(given: Float64Array, right: Float64Array): Float64Array {
  const count = right.length;
  const rows = Array.from({ length: count }, (_, k) => [
    ...given.subarray(k * count, (k + 1) * count),
    right[k]!,
  ]);
  for (let k = 0; k < count; k++) {
    let pivot = k;
    for (let i = k + 1; i < count; i++) {
      if (Math.abs(rows[i]![k]!) > Math.abs(rows[pivot]![k]!)) pivot = i;
    }
    [rows[k], rows[pivot]] = [rows[pivot]!, rows[k]!];
    if (rows[k]![k] === 0) continue;
    for (let i = k + 1; i < count; i++) {
      const factor = rows[i]![k]! / rows[k]![k]!;
      for (let j = k; j <= count; j++) rows[i]![j]! -= factor * rows[k]![j]!;
    }
  }
  const values = new Float64Array(count);
  for (let k = count - 1; k >= 0; k--) {
    let sum = rows[k]![count]!;
    for (let j = k + 1; j < count; j++) sum -= rows[k]![j]! * values[j]!;
    values[k] = rows[k]![k] === 0 ? 0 : sum / rows[k]![k]!;
  }
  return values;
}
