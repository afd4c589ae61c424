import { describe, expect, it } from 'vitest';
import { checkCircuit, restingState, stringTags } from '../../shared/circuit';
import { solve } from '../../shared/solver';
import { alternatingOneRelay } from './alternatingOneRelay';
import { rectifiedTwoRelays } from './rectifiedTwoRelays';
import { stringBeforeBridge } from './stringBeforeBridge';
import { unearthedHighVolts } from './unearthedHighVolts';

const circuits = [
  rectifiedTwoRelays(8),
  alternatingOneRelay(6),
  unearthedHighVolts(5),
  stringBeforeBridge(4),
];

describe.each(circuits)('$name', (circuit) => {
  const line = circuit.strings[0]!;
  const state = restingState(circuit);
  const volts = (faults: Parameters<typeof solve>[2], red: string, black: string) => {
    const { mean, ripple } = solve(circuit, state, faults).read({ red, black, meterOhms: 10e6 });
    return Math.abs(circuit.stringCurrent === 'direct' ? mean : ripple);
  };

  it('has no findings', () => {
    expect(checkCircuit(circuit).findings.filter(({ severity }) => severity === 'error')).toEqual(
      [],
    );
  });

  it('pulls its relays in when healthy, and reads its volts along the whole line', () => {
    const { relays } = solve(circuit, state, []);
    expect(relays['lock relay']).toBe('in');
    for (const tag of stringTags(circuit, line)) {
      expect(volts([], tag, line.return)).toBeGreaterThan(circuit.nominalVolts * 0.95);
    }
  });

  it('loses the lock relay, and the volts behind the gate, with the gate open', () => {
    const open = [{ part: 'car gate contact', mode: 'open' as const }];
    expect(solve(circuit, state, open).relays['lock relay']).toBe('out');
    expect(volts(open, line.to, line.return)).toBeLessThan(circuit.nominalVolts * 0.05);
  });
});
