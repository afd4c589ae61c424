import { describe, expect, it } from 'vitest';
import { foldCase } from '../shared/cases';
import { playedEvents } from './cases/playAll';
import { playHunt } from './cases/playHunt';
import { companies } from './companies';

describe('the demo', () => {
  it('has 4 sites, 8 lifts on four circuits, and labels that differ', () => {
    const sites = companies.flatMap((company) => company.sites);
    const lifts = sites.flatMap((site) => site.lifts);
    expect(sites).toHaveLength(4);
    expect(lifts).toHaveLength(8);
    expect(companies.flatMap(({ circuits }) => Object.keys(circuits))).toHaveLength(4);
    expect(new Set(lifts.map(({ label }) => label)).size).toBe(8);
  });

  it.each(
    companies.flatMap((company) =>
      company.sites.flatMap(({ lifts }) => lifts.map((lift) => ({ company, lift }))),
    ),
  )('hides on $lift.label a fault that the engine finds', ({ company, lift }) => {
    const { end } = playHunt(company.circuits[lift.circuit]!, lift.hidden, String);
    expect(end.step.kind).toBe('finding');
    const found =
      end.step.kind === 'finding' ? end.step.suspect.faults.map(({ part }) => part) : [];
    expect(found).toContain(lift.hidden[0]!.part);
  });

  it('has 12 closed cases that fold, some accepted, one returned, some to review', () => {
    const logs = companies.flatMap((company) => {
      const events = playedEvents(company);
      const ids = [...new Set(events.map(({ event }) => event.caseId))];
      return ids.map((id) =>
        events
          .filter(({ event }) => event.caseId === id)
          .map(({ event, actor }) => ({ ...event, actor })),
      );
    });
    const states = logs.map((log) => foldCase(log)!);
    expect(states).toHaveLength(12);
    const count = (status: string) => states.filter((state) => state.status === status).length;
    expect(count('accepted')).toBeGreaterThanOrEqual(4);
    expect(count('returned')).toBe(1);
    expect(count('closed')).toBeGreaterThanOrEqual(3);
    expect(states.every(({ outcome }) => outcome === 'repaired')).toBe(true);
  });
});
