import type { CaseState } from '@shared/cases';
import type { Circuit, Fault } from '@shared/circuit';

/** The device that a part belongs to, as a repair names it. */
export function deviceOf(circuit: Circuit, part: string): string {
  return circuit.parts.find(({ name }) => name === part)?.device ?? part;
}

/** A practice lift's faults that are still there: a repair of the right device takes its fault away. */
export function faultsLeft(
  circuit: Circuit,
  hidden: readonly Fault[],
  state: CaseState,
): readonly Fault[] {
  const repaired = new Set(state.repairs.flatMap(({ devices }) => devices));
  return hidden.filter(({ part }) => !repaired.has(deviceOf(circuit, part)));
}
