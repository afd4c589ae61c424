import { checkCircuit } from '@shared/circuit';
import { sentenceOf } from '@shared/contract';

/** Findings on whatever was sent, each in words. Nonsense has findings too. */
export function checkACircuit(sent: unknown) {
  const { findings } = checkCircuit(sent);
  return {
    findings: findings.map(({ code, severity, at, details }) => ({
      code,
      severity,
      at,
      details: details && { ...details },
      detail: sentenceOf(code, { at, ...details }),
    })),
  };
}
