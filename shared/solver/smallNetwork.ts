/**
 * A few nodes, each joined to each, eliminated without subtraction as in `elimination.ts` but dense:
 * the nodes of bridges and transformers, solved anew at every sample of a cycle.
 */
export class SmallNetwork {
  /** Upper triangle, row by row: the conductance between nodes, then each neighbour's share. */
  private readonly work: Float64Array;
  private readonly leaks: Float64Array;
  private readonly inverse: Float64Array;

  constructor(readonly size: number) {
    this.work = new Float64Array(size * size);
    this.leaks = new Float64Array(size);
    this.inverse = new Float64Array(size);
  }

  /** Takes over conductances between nodes (upper triangle) and leaks to earth, siemens. */
  load(between: Float64Array, leak: Float64Array): void {
    this.work.set(between);
    this.leaks.set(leak);
  }

  /** Adds a conductance between two nodes; -1 is earth. */
  add(a: number, b: number, siemens: number): void {
    if (a === b) return;
    if (a < 0) this.leaks[b]! += siemens;
    else if (b < 0) this.leaks[a]! += siemens;
    else this.work[a < b ? a * this.size + b : b * this.size + a]! += siemens;
  }

  factor(): void {
    const { size, work, leaks, inverse } = this;
    for (let k = 0; k < size; k++) {
      const row = k * size;
      let total = leaks[k]!;
      for (let j = k + 1; j < size; j++) total += work[row + j]!;
      const own = 1 / total;
      inverse[k] = own;
      for (let i = k + 1; i < size; i++) {
        const share = work[row + i]! * own;
        leaks[i]! += share * leaks[k]!;
        for (let j = i + 1; j < size; j++) work[i * size + j]! += share * work[row + j]!;
      }
      for (let i = k + 1; i < size; i++) work[row + i]! *= own;
    }
  }

  /** Currents into the nodes become their voltages, in place. */
  solve(values: Float64Array): void {
    const { size, work, inverse } = this;
    for (let k = 0; k < size; k++) {
      const own = values[k]!;
      const row = k * size;
      for (let j = k + 1; j < size; j++) values[j]! += work[row + j]! * own;
    }
    for (let k = size - 1; k >= 0; k--) {
      const row = k * size;
      let volts = values[k]! * inverse[k]!;
      for (let j = k + 1; j < size; j++) volts += work[row + j]! * values[j]!;
      values[k] = volts;
    }
  }
}
