import type { Circuit } from '../circuit/circuit';
import type { CheckFinding } from '../circuit/finding';
import { hertzOf } from './stamping';

/**
 * What the solver cannot do with a circuit, before it is asked to: errors make readings wrong.
 * Beside a bridge all alternating supplies must have one frequency, since one cycle of it is sampled.
 */
export function solvable(circuit: Circuit): readonly CheckFinding[] {
  const findings: CheckFinding[] = [];
  const rectified = circuit.parts.some(({ kind }) => kind === 'bridge');
  if (!rectified) return findings;
  const frequencies = new Set(
    circuit.parts.flatMap((part) =>
      part.kind === 'supply' && part.current === 'alternating' ? [hertzOf(part)] : [],
    ),
  );
  if (frequencies.size > 1) {
    findings.push({
      code: 'solver.several-frequencies-with-bridge',
      severity: 'error',
      at: 'parts',
      details: { frequencies: frequencies.size },
    });
  }
  return findings;
}
