import { describe, expect, it } from 'vitest';
import { stringCircuit } from '@shared/circuit';
import { solve } from '@shared/solver';

/**
 * Sources: operating windows of contactor coils by IEC 60947 as usually quoted: they must close from 85 %
 * to 110 % of the rated volts (M: from memory), and drop out between 75 % and 20 % on AC or 10 % on DC
 * (R: read in data sheets). At 110 V: 93.5, 121, 82.5, 22 and 11 V.
 */
describe.each(['DC', 'AC'] as const)('a %s coil as this project makes it', (current) => {
  const at = (volts: number, previous?: 'in' | 'out') => {
    const rated = stringCircuit(`110 V ${current}: T0 (gate) T1 [SR 3300 ohm]`);
    const circuit = {
      ...rated,
      parts: rated.parts.map((part) => (part.kind === 'supply' ? { ...part, volts } : part)),
    };
    return solve(circuit, {}, [], previous ? { previous: { SR: previous } } : {}).relays['SR'];
  };

  it('closes at 93.5 V and at 121 V', () => {
    expect(at(93.5)).toBe('in');
    expect(at(121)).toBe('in');
  });

  it('holds at 82.5 V', () => {
    expect(at(82.5, 'in')).toBe('in');
  });

  it('drops out before 22 V on AC, before 11 V on DC', () => {
    expect(at(current === 'AC' ? 22 : 11, 'in')).toBe('out');
  });
});
