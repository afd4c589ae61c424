import type { CaseState } from '@shared/cases';
import { faultSentence } from '@shared/contract';

/** What goes into the machine-room logbook, ready to copy by hand. */
export function logbookText(state: CaseState, lift: string): string {
  const day = state.openedAt.slice(0, 16).replace('T', ' ');
  const lines = [lift, $localize`Called: ${state.complaint}:complaint: (${day}:time: UTC)`];
  if (state.finding) {
    const faults = state.finding.faults.map(faultSentence).join('; ');
    lines.push($localize`Found: ${faults}:faults:. Cause: ${state.finding.cause}:cause:`);
  }
  for (const { what, parts } of state.repairs) {
    lines.push($localize`Done: ${what}:what:`);
    for (const { quantity, description, number } of parts) {
      lines.push(`  ${quantity} × ${description}${number ? ` (${number})` : ''}`);
    }
  }
  const proven = state.proven.filter(({ result }) => result === 'stopped');
  if (proven.length > 0) {
    const devices = proven.map(({ device }) => device).join(', ');
    lines.push($localize`Proven to stop the lift: ${devices}:devices:`);
  }
  const out = state.links.filter(({ removedAt }) => !removedAt).length;
  lines.push($localize`Temporary links out: ${out}:number:`);
  if (state.service) {
    lines.push($localize`Runs: ${state.service.runs}:number:. Returned to service.`);
  }
  return lines.join('\n');
}
