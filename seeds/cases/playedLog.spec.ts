import { describe, expect, it } from 'vitest';
import { applyEvent, refusalOf, type CaseState } from '../../shared/cases';
import { companies } from '../companies';
import { circuitId, liftId, personId } from './playAll';
import { playedLog } from './playedLog';

const logs = companies.map((company) => ({ company, log: playedLog(company.key) }));

/** Folds a company's log event by event; each has to be allowed when its turn comes. */
function folded({ company, log }: (typeof logs)[number]): readonly CaseState[] {
  const roles = new Map(company.accounts.map(({ email, role }) => [personId(email), role]));
  const states = new Map<string, CaseState>();
  for (const { event, actor } of log) {
    const before = states.get(event.caseId);
    const refusal = refusalOf(before, { ...event, actor }, { role: roles.get(actor) ?? 'nobody' });
    expect(refusal, `${event.caseId} ${event.type}`).toBeUndefined();
    states.set(event.caseId, applyEvent(before, { ...event, actor })!);
  }
  return [...states.values()];
}

describe('the played cases', () => {
  it('are 12, closed; some accepted, one returned, some waiting for review', () => {
    const states = logs.flatMap(folded);
    expect(states).toHaveLength(12);
    expect(states.every(({ closedAt }) => closedAt !== undefined)).toBe(true);
    const count = (status: string) => states.filter((state) => state.status === status).length;
    expect(count('accepted')).toBeGreaterThanOrEqual(4);
    expect(count('returned')).toBe(1);
    expect(count('closed')).toBeGreaterThanOrEqual(3);
  });

  it('hold nothing that this build does not know', () => {
    expect(logs.flatMap(folded).flatMap(({ unknown }) => unknown)).toEqual([]);
  });

  it('are of lifts and circuits of their company', () => {
    for (const { company, log } of logs) {
      const own = new Map(
        company.sites
          .flatMap(({ lifts }) => lifts)
          .map(({ label, circuit }) => [liftId(label), circuitId(company.key, circuit)]),
      );
      const opened = log.filter(({ event }) => event.type === 'case opened');
      expect(opened.length).toBeGreaterThan(0);
      for (const { event } of opened) {
        expect(own.get(String(event.payload['liftId']))).toBe(event.payload['circuitId']);
      }
    }
  });

  it('come in the order in which they happened, each phone counting without a gap', () => {
    for (const { log } of logs) {
      const times = log.map(({ event }) => event.recordedAt);
      expect(times).toEqual([...times].sort());
      const last = new Map<string, number>();
      for (const { event } of log) {
        expect(event.sequence).toBe((last.get(event.device) ?? 0) + 1);
        last.set(event.device, event.sequence);
      }
      expect(new Set(log.map(({ event }) => event.id)).size).toBe(log.length);
    }
  });
});
