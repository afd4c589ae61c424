import type { CaseState } from '@shared/cases';
import { faultSentence } from '@shared/contract';

/**
 * What goes into the machine-room logbook, ready to copy by hand.
 * @param lift site and lift, as on its page
 * @param zone the organisation's time zone, as `Europe/London`
 */
export function logbookText(state: CaseState, lift: string, zone: string): string {
  const time = (at: string) =>
    new Date(at).toLocaleString('en-GB', {
      timeZone: zone,
      dateStyle: 'medium',
      timeStyle: 'short',
    });
  const lines = [
    lift,
    $localize`Called: ${state.complaint}:complaint:`,
    $localize`Attended: ${time(state.openedAt)}:time:`,
  ];
  if (state.practice) lines.splice(1, 0, $localize`Practice: no work was done on this lift`);
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
    const at = time(state.service.at);
    const covers = state.service.coversOn ? $localize`covers on` : $localize`covers not all on`;
    lines.push(
      $localize`Runs: ${state.service.runs}:number:, ${covers}:covers:. Returned to service ${at}:time:.`,
    );
  } else if (state.isolated) {
    const notice = state.isolated.noticeFitted
      ? $localize`notice fitted`
      : $localize`notice not fitted`;
    lines.push(
      $localize`Lift isolated, ${notice}:notice:. Told: ${state.isolated.told ?? '–'}:who:`,
      ...state.isolated.left.map((thing) => $localize`Left: ${thing}:thing:`),
    );
  }
  return lines.join('\n');
}
