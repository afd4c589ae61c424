import type { Circuit } from '../circuit';
import type { Observation } from './observation';

/**
 * The observations that the circuit could answer. A tag, relay or part that it does not have, both probes
 * on one tag, and volts that are no number, say nothing about it.
 */
export function answerable(
  circuit: Circuit,
  observations: readonly Observation[],
): readonly Observation[] {
  const tags = new Set(circuit.terminals.map(({ tag }) => tag));
  const names = new Set(circuit.parts.map(({ name }) => name));
  const coils = new Set(circuit.parts.filter((part) => part.kind === 'coil').map((c) => c.name));
  return observations.filter((seen) => {
    switch (seen.kind) {
      case 'reading':
        return (
          tags.has(seen.red) &&
          tags.has(seen.black) &&
          seen.red !== seen.black &&
          Number.isFinite(seen.volts)
        );
      case 'relay':
        return coils.has(seen.relay);
      case 'device':
        return names.has(seen.part) || circuit.parts.some(({ device }) => device === seen.part);
    }
  });
}
