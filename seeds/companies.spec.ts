import { describe, expect, it } from 'vitest';
import { faultKey } from '../shared/circuit';
import { playHunt } from './cases/playHunt';
import { companies } from './companies';

const lifts = companies.flatMap((company) =>
  company.sites.flatMap((site) => site.lifts.map((lift) => ({ company, lift }))),
);

describe('the demo', () => {
  it('has 4 sites, 8 lifts on four circuits, and labels that differ', () => {
    expect(companies.flatMap(({ sites }) => sites)).toHaveLength(4);
    expect(lifts).toHaveLength(8);
    expect(companies.flatMap(({ circuits }) => Object.keys(circuits))).toHaveLength(4);
    expect(new Set(lifts.map(({ lift }) => lift.label)).size).toBe(8);
  });

  it('has every role in the first company, and a technician and a supervisor in the second', () => {
    const roles = companies.map(({ accounts }) => accounts.map(({ role }) => role));
    expect(roles[0]).toEqual(
      expect.arrayContaining(['technician', 'engineer', 'supervisor', 'administrator']),
    );
    expect(roles[1]).toEqual(expect.arrayContaining(['technician', 'supervisor']));
  });

  it('hides another fault on each lift', () => {
    const hidden = lifts.map(({ lift }) => lift.hidden.map(faultKey).join());
    expect(new Set(hidden).size).toBe(8);
  });

  it.each(lifts)('hides on $lift.label a fault that the engine finds', ({ company, lift }) => {
    const { end } = playHunt(company.circuits[lift.circuit]!, lift.hidden, String);
    expect(end.step.kind).toBe('finding');
    const { part, mode } = lift.hidden[0]!;
    const found = end.step.kind === 'finding' ? end.step.suspect.faults : [];
    expect(found.map((fault) => `${fault.part} ${fault.mode}`)).toContain(`${part} ${mode}`);
  });
});
