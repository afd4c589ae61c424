import type { CaseEvent } from '../../shared/cases';
import type { SeedCompany } from '../companies';
import { seedId } from '../seedId';
import { pastCases } from './pastCases';
import { playCase, type PlayedEvent } from './playCase';

export const personId = (email: string): string => seedId(`person ${email}`);
export const liftId = (label: string): string => seedId(`lift ${label}`);
export const circuitId = (company: string, key: string): string =>
  seedId(`circuit ${company} ${key}`);

/** The events of a company's past cases in the order in which they happened, sequences given. */
export function playedEvents(company: SeedCompany): readonly PlayedEvent[] {
  const lifts = company.sites.flatMap(({ lifts: own }) => own);
  const byRole = (role: string) => company.accounts.filter((account) => account.role === role);
  const technicians = byRole('technician');
  const supervisor = personId(byRole('supervisor')[0]!.email);
  const cases = pastCases
    .filter((past) => past.company === company.key)
    .flatMap((past, k) => {
      const lift = lifts.find(({ label }) => label === past.lift)!;
      const technician = personId(technicians[k % technicians.length]!.email);
      return playCase(
        past,
        {
          caseId: seedId(`case ${past.lift} ${past.openedAt}`),
          liftId: liftId(past.lift),
          circuitId: circuitId(company.key, lift.circuit),
        },
        company.circuits[lift.circuit]!,
        { technician, supervisor },
      );
    });
  // A stable sort: entries of one moment keep their order.
  const inOrder = [...cases].sort((a, b) => a.event.recordedAt.localeCompare(b.event.recordedAt));
  const sequences = new Map<string, number>();
  return inOrder.map(({ event, actor }) => {
    const sequence = (sequences.get(event.device) ?? 0) + 1;
    sequences.set(event.device, sequence);
    return { actor, event: { ...event, sequence } satisfies CaseEvent };
  });
}
