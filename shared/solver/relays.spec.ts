import { describe, expect, it } from 'vitest';
import { stringCircuit, type Circuit, type Fault } from '../circuit';
import { solve } from './solve';

const LIFT =
  '110 V DC earthed: T0 (governor switch) T1 [SR 3300 ohm] (gate) T2 [LR 3300 ohm] ' +
  '(call contact when call=yes) T3 [K 550 ohm]';
const CALL = { call: 'yes' };
const lift = stringCircuit(LIFT);

function relays(circuit: Circuit, state: Record<string, string>, ...faults: Fault[]): string {
  return Object.entries(solve(circuit, state, faults).relays)
    .map(([name, position]) => `${name} ${position}`)
    .join(', ');
}

describe('relays', () => {
  it('pull in on coil current: those that the string feeds', () => {
    expect(relays(lift, {})).toBe('SR in, LR in, K out');
    expect(relays(lift, CALL)).toBe('SR in, LR in, K in');
    expect(relays(lift, CALL, { part: 'gate', mode: 'open' })).toBe('SR in, LR out, K out');
  });

  it('stay out with an open coil at full volts', () => {
    expect(relays(lift, {}, { part: 'SR', mode: 'open' })).toBe('SR out, LR in, K out');
    const solution = solve(lift, {}, [{ part: 'SR', mode: 'open' }]);
    expect(solution.read({ red: 'T1', black: 'R', meterOhms: 10e6 }).mean).toBeCloseTo(110, 0);
  });

  it('lose force with turns shorted', () => {
    expect(relays(lift, {}, { part: 'SR', mode: 'partly shorted', factor: 0.5 })).toContain(
      'SR out',
    );
  });

  it('do not move where they are stuck', () => {
    expect(relays(lift, {}, { part: 'SR', mode: 'stuck out' })).toContain('SR out');
    const dead: Fault = { part: 'supply', mode: 'dead' };
    expect(relays(lift, {}, dead, { part: 'SR', mode: 'stuck in' })).toBe('SR in, LR out, K out');
  });

  it('hold between drop-out and pull-in what was in before', () => {
    // 900 ohm before the gate: with K drawing too, the lock relay's share is between its thresholds.
    const film: Fault = { part: 'gate', mode: 'resistive', ohms: 900 };
    expect(relays(lift, CALL, film)).toBe('SR in, LR in, K out');
    const fromOut = solve(lift, CALL, [film], {
      previous: { SR: 'in', LR: 'out', K: 'out' },
    });
    expect(fromOut.relays['LR']).toBe('out');
  });

  it('feed a second string through a contact of the first', () => {
    const two = stringCircuit(
      '110 V DC: T0 (gate) T1 [SR 3300 ohm] (SR contact when SR=in) T2 [LR 3300 ohm]',
    );
    expect(relays(two, {})).toBe('SR in, LR in');
    expect(relays(two, {}, { part: 'SR', mode: 'open' })).toBe('SR out, LR out');
    expect(relays(two, {}, { part: 'SR', mode: 'stuck out' })).toBe('SR out, LR out');
    const welded: Fault = { part: 'SR contact', mode: 'not opening' };
    expect(relays(two, {}, { part: 'SR', mode: 'stuck out' }, welded)).toBe('SR out, LR in');
  });

  it('chatter where their own contact takes their current away, and only there', () => {
    const buzzer = stringCircuit('110 V DC: T0 (own contact when SR=out) T1 [SR 3300 ohm]');
    expect(relays(buzzer, {})).toBe('SR chatter');
    const race = stringCircuit('110 V DC: T0 [A 3300 ohm] (A out when A=out) T1 [B 3300 ohm]');
    expect(relays(race, {})).toBe('A in, B out');
  });

  it('settle in the order of their delays', () => {
    // Each opens the other's feed: the quicker one wins.
    const race = (delayA: number, delayB: number): Circuit => {
      const base = stringCircuit(
        '110 V DC: T0 (B out when B=out) T1 [A 3300 ohm] ~far~ T9 (x when A=in) T2 [B 3300 ohm]',
      );
      const parts = base.parts.map((part) => {
        if (part.name === 'x') {
          return {
            ...part,
            between: ['T0', 'T2'] as [string, string],
            relay: { name: 'A', closedWhen: 'out' as const },
          };
        }
        if (part.name === 'A') return { ...part, delaySeconds: delayA };
        if (part.name === 'B') return { ...part, delaySeconds: delayB };
        return part;
      });
      return { ...base, parts: parts as Circuit['parts'] };
    };
    expect(relays(race(0.02, 0.05), {})).toBe('A in, B out');
    expect(relays(race(0.05, 0.02), {})).toBe('A out, B in');
  });
});
