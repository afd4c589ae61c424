import type { Circuit, Part } from './circuit';
import type { CheckFinding } from './finding';
import { modesOf, PART_KINDS } from './partKinds';

/** Values that fit their ranges but not each other, and priors that are missing. */
export function checkValues(circuit: Circuit): readonly CheckFinding[] {
  return [
    ...circuit.parts.flatMap(partValues),
    ...priors(circuit),
    ...idleConditions(circuit),
    ...stringCurrent(circuit),
  ];
}

function partValues(part: Part, k: number): CheckFinding[] {
  const at = `parts.${k}`;
  if (part.kind === 'supply' && part.current === 'alternating' && part.hertz === undefined) {
    return [
      { code: 'circuit.no-frequency', severity: 'warning', at, details: { part: part.name } },
    ];
  }
  if (part.kind !== 'coil') return [];
  const findings: CheckFinding[] = [];
  const ratedMilliamps = (part.ratedVolts / part.ohms) * 1000;
  if (part.dropOutMilliamps >= part.pullInMilliamps) {
    findings.push({
      code: 'circuit.drop-out-above-pull-in',
      severity: 'error',
      at,
      details: { part: part.name },
    });
  }
  if (part.pullInMilliamps > ratedMilliamps) {
    findings.push({
      code: 'circuit.pull-in-above-rated',
      severity: 'warning',
      at,
      details: { part: part.name, ratedMilliamps },
    });
  }
  return findings;
}

/** Kinds that fail often enough that a weight of 0 is more likely forgotten than meant. */
const USUAL_CULPRITS: ReadonlySet<Part['kind']> = new Set(['contact', 'fuse', 'coil']);

function priors({ parts }: Circuit): CheckFinding[] {
  if (parts.every(({ weight }) => weight === 0)) {
    return [{ code: 'circuit.no-priors', severity: 'error', at: 'parts' }];
  }
  return parts.flatMap((part, k): CheckFinding[] => {
    const details = { part: part.name };
    if (part.weight === 0) {
      return USUAL_CULPRITS.has(part.kind)
        ? [{ code: 'circuit.missing-prior', severity: 'warning', at: `parts.${k}.weight`, details }]
        : [];
    }
    // Capacitors have no modes of their own yet: a weight on one is not lost by mistake.
    const expected = PART_KINDS[part.kind].modes.length > 0;
    return expected && modesOf(part).length === 0
      ? [{ code: 'circuit.no-modes', severity: 'warning', at: `parts.${k}.modeWeights`, details }]
      : [];
  });
}

function idleConditions({ conditions, parts }: Circuit): CheckFinding[] {
  return conditions.flatMap(({ name, values }, k): CheckFinding[] => {
    const moved = parts.some(
      (part) =>
        part.kind === 'contact' &&
        part.condition?.name === name &&
        !values.every((value) => part.condition!.closedWhen.includes(value)),
    );
    if (moved) return [];
    return [
      {
        code: 'circuit.condition-moves-nothing',
        severity: 'warning',
        at: `conditions.${k}`,
        details: { name },
      },
    ];
  });
}

function stringCurrent({ stringCurrent: current, parts }: Circuit): CheckFinding[] {
  const direct = parts.some(
    (p) => p.kind === 'bridge' || (p.kind === 'supply' && p.current === 'direct'),
  );
  const alternating = parts.some((p) => p.kind === 'supply' && p.current === 'alternating');
  if (current === 'direct' ? direct : alternating) return [];
  return [
    {
      code: 'circuit.string-current-without-source',
      severity: 'error',
      at: 'stringCurrent',
      details: { current },
    },
  ];
}
