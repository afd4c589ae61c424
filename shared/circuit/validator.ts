import type { z } from 'zod';
import { checkNames } from './checkNames';
import { checkReach } from './checkReach';
import { checkValues } from './checkValues';
import { checkWiring } from './checkWiring';
import { circuitSchema, type Circuit } from './circuit';
import type { CheckFinding } from './finding';

export interface CheckedCircuit {
  /** Present where the data has a circuit's shape, also if there are errors in what it means. */
  readonly circuit?: Circuit;
  readonly findings: readonly CheckFinding[];
}

/**
 * Looks at unknown data as a circuit: first its shape, then what it means. Never throws. A circuit is
 * fit for use when no finding is an error; warnings are for the engineer to judge.
 */
export function checkCircuit(data: unknown): CheckedCircuit {
  const parsed = circuitSchema.safeParse(data);
  if (!parsed.success) return { findings: parsed.error.issues.map(shapeFinding) };
  return { circuit: parsed.data, findings: circuitFindings(parsed.data) };
}

/** What a circuit of the right shape means: names first, since the rest relies on them. */
export function circuitFindings(circuit: Circuit): readonly CheckFinding[] {
  const names = checkNames(circuit);
  const values = checkValues(circuit);
  if (names.some(({ severity }) => severity === 'error')) return [...names, ...values];
  return [...names, ...values, ...checkWiring(circuit), ...checkReach(circuit)];
}

export function hasErrors(findings: readonly CheckFinding[]): boolean {
  return findings.some(({ severity }) => severity === 'error');
}

function shapeFinding(issue: z.core.$ZodIssue): CheckFinding {
  const at = issue.path.map(String).join('.');
  switch (issue.code) {
    case 'too_small':
      return {
        code: 'circuit.out-of-range',
        severity: 'error',
        at,
        details: { minimum: Number(issue.minimum) },
      };
    case 'too_big':
      return {
        code: 'circuit.out-of-range',
        severity: 'error',
        at,
        details: { maximum: Number(issue.maximum) },
      };
    case 'invalid_union':
      return { code: 'circuit.unknown-kind', severity: 'error', at };
    default:
      return { code: 'circuit.shape', severity: 'error', at, details: { problem: issue.code } };
  }
}
