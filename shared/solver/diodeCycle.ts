import { chargedCycle, withCompanions } from './chargedCycle';
import { PHASES, sinesOf, type Cycle, type SampledCycle } from './cycle';
import { DiodeNewton } from './diodeNewton';
import type { Combination, KeptNodes } from './keptNodes';

/**
 * The voltages over one cycle at `points` even steps, the meter connected if there is one. `near` is a
 * cycle of the same kept nodes to start from. Where no part stores charge, each sample stands alone.
 */
export function sampleCycle(
  kept: KeptNodes,
  points: number,
  meter?: Combination,
  near?: Cycle,
): Cycle {
  const extras = meter ? [...kept.windings, meter] : kept.windings;
  if (kept.capacitors.length === 0) {
    const cycle = restingCycle(kept, points, extras, near);
    const impedances = impedancesOf(kept, extras, cycle);
    return { ...cycle, impedances, momentary: impedances };
  }
  const cycle = chargedCycle(kept, points, extras, near);
  const yielding = kept.capacitors.map(({ farads }) => farads / kept.periodSeconds);
  return {
    ...cycle,
    impedances: impedancesOf(kept, extras, cycle),
    momentary: impedancesOf(withCompanions(kept, yielding), extras, cycle),
  };
}

function restingCycle(
  kept: KeptNodes,
  points: number,
  extras: readonly Combination[],
  near: Cycle | undefined,
): SampledCycle {
  const { size, diodes } = kept;
  const newton = new DiodeNewton(kept, extras);
  const volts = new Float64Array(points * size);
  const junctions = new Float64Array(points * diodes.length);
  const now = new Float64Array(diodes.length);
  const sines = sinesOf(points);
  for (let j = 0; j < points; j++) {
    if (near) now.set(near.junctions.subarray(j * diodes.length, (j + 1) * diodes.length));
    newton.settle(sines[j]!, now);
    volts.set(newton.volts, j * size);
    junctions.set(now, j * diodes.length);
  }
  return { points, volts, junctions, charges: new Float64Array(0) };
}

/** What the kept nodes resist at each phase, with capacitors only where they were made conductances. */
function impedancesOf(
  kept: KeptNodes,
  extras: readonly Combination[],
  { points, junctions }: SampledCycle,
): Float64Array {
  const { size, diodes, windings } = kept;
  const newton = new DiodeNewton(kept, extras);
  const impedances = new Float64Array(PHASES * size * size);
  for (let phase = 0; phase < PHASES; phase++) {
    const j = (phase * points) / PHASES;
    const at = junctions.subarray(j * diodes.length, (j + 1) * diodes.length);
    newton.impedances(at, windings.length, impedances, phase * size * size);
  }
  return impedances;
}
