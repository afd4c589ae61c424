import { describe, expect, it } from 'vitest';
import { stringCircuit, type Circuit, type Part } from '../circuit';
import { solvable } from './solvable';

const stray: Part = {
  kind: 'supply',
  name: 'stray',
  place: 'controller',
  weight: 1,
  between: ['T0', 'R'],
  current: 'alternating',
  volts: 30,
  hertz: 60,
  ohms: 100,
};
const withStray = (circuit: Circuit): Circuit => ({ ...circuit, parts: [...circuit.parts, stray] });

describe('what the solver can do', () => {
  it('is any circuit of one frequency', () => {
    expect(solvable(stringCircuit('124 V bridge: T0 (gate) T1 [LR]'))).toEqual([]);
  });

  it('is several frequencies without a bridge, not with one', () => {
    expect(solvable(withStray(stringCircuit('110 V AC: T0 (gate) T1 [LR]')))).toEqual([]);
    const codes = solvable(withStray(stringCircuit('124 V bridge: T0 (gate) T1 [LR]')));
    expect(codes.map(({ code }) => code)).toEqual(['solver.several-frequencies-with-bridge']);
  });
});
