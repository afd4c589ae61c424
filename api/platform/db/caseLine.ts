import { riskOf, weaknessesOf, type CaseState } from '@shared/cases';
import type { caseRow } from './schema';

export type CaseLine = Omit<typeof caseRow.$inferInsert, 'organisationId'>;

/** The line of a case, folded from its events: what lists and the review queue read. */
export function caseLine(state: CaseState): CaseLine {
  const ended = state.status !== 'open';
  return {
    id: state.id,
    liftId: state.liftId,
    circuitId: state.circuitId,
    circuitRevision: state.circuitRevision,
    status: state.status,
    complaint: state.complaint,
    device: state.finding?.device ?? null,
    cause: state.finding?.cause ?? null,
    outcome: state.outcome ?? null,
    practice: state.practice,
    openedAt: new Date(state.openedAt),
    closedAt: state.closedAt === undefined ? null : new Date(state.closedAt),
    openedBy: state.openedBy!,
    readings: state.seen.filter(({ observation }) => observation.kind === 'reading').length,
    dangers: state.dangers.length,
    weaknesses: ended ? weaknessesOf(state).map((weakness) => ({ ...weakness })) : [],
    risk: ended ? riskOf(state) : 0,
    version: state.version,
  };
}
