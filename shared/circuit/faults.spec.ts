import { describe, expect, it } from 'vitest';
import { faultSchema, partSchema, type Circuit } from './circuit';
import { EARTH_SHARE, RESISTIVE_OHMS, faultKey, singleFaults } from './faults';
import { PART_KINDS, modesOf, proofsOf } from './partKinds';
import { stringCircuit } from './stringNotation';

const LIFT = stringCircuit(
  '124 V bridge earthed: T0 (gate) T1 [LR 3300 ohm] (call contact when call=yes) T2 [K 550 ohm]',
);
const faults = singleFaults(LIFT);
const of = (part: string) => faults.filter(({ fault }) => fault.part === part);
const modes = (part: string) => [...new Set(of(part).map(({ fault }) => fault.mode))];

describe('single faults', () => {
  it('are valid faults, each once, with weight', () => {
    for (const { fault, weight } of faults) {
      expect(faultSchema.safeParse(fault).success).toBe(true);
      expect(weight).toBeGreaterThan(0);
    }
    expect(new Set(faults.map(({ fault }) => faultKey(fault))).size).toBe(faults.length);
  });

  it('share out exactly the weight of the part', () => {
    for (const part of LIFT.parts) {
      const sum = of(part.name).reduce((total, { weight }) => total + weight, 0);
      expect(sum).toBeCloseTo(part.weight, 9);
    }
  });

  it('cover what each kind can have', () => {
    expect(modes('gate')).toEqual(['open', 'resistive']);
    expect(modes('call contact')).toEqual(['open', 'resistive', 'not opening']);
    expect(modes('fuse')).toEqual(['blown', 'resistive']);
    expect(modes('LR')).toEqual(['open', 'partly shorted', 'stuck out', 'stuck in']);
    expect(modes('supply')).toEqual(['dead', 'low', 'high', 'weak']);
    expect(of('bridge').map(({ fault }) => fault.diode)).toEqual([1, 2, 3, 4, 1, 2, 3, 4]);
    expect(modes('return wire')).toEqual(['open', 'resistive']);
    expect(of('earth link')).toEqual([]);
  });

  it('spread resistive ones over the grid', () => {
    const grid = of('gate').flatMap(({ fault }) => (fault.mode === 'resistive' ? fault.ohms : []));
    expect(grid).toEqual(RESISTIVE_OHMS);
    const steps = RESISTIVE_OHMS.slice(1).map((ohms, k) => ohms / RESISTIVE_OHMS[k]!);
    for (const step of steps) expect(step).toBeLessThanOrEqual(10);
  });

  it('have diodes short to open as .49 to .36', () => {
    // Source: MIL-HDBK-338B, failure mode distributions, rectifier diodes (R).
    const [shorted] = of('bridge').filter(({ fault }) => fault.mode === 'diode shorted');
    const [open] = of('bridge').filter(({ fault }) => fault.mode === 'diode open');
    expect(shorted!.weight / open!.weight).toBeCloseTo(0.49 / 0.36, 9);
  });

  it('put an earth at every terminal but the earthed one, with little weight', () => {
    const earths = faults.filter(({ fault }) => fault.mode === 'earth');
    expect(earths.map(({ fault }) => fault.part).sort()).toEqual(
      LIFT.terminals
        .map(({ tag }) => tag)
        .filter((tag) => tag !== 'N')
        .sort(),
    );
    // At T0 meet the fuse (6) and the gate contact (1).
    expect(of('T0')[0]!.weight).toBeCloseTo(7 * EARTH_SHARE, 12);
  });

  it("follow a part's own shares where it has them", () => {
    const own: Circuit = {
      ...LIFT,
      parts: LIFT.parts.map((part) =>
        part.name === 'gate' ? { ...part, modeWeights: { open: 1, resistive: 3 } } : part,
      ),
    };
    const [open] = singleFaults(own).filter(({ fault }) => fault.part === 'gate');
    expect(open).toEqual({ fault: { part: 'gate', mode: 'open' }, weight: 0.25 });
  });
});

describe('the table of kinds', () => {
  it('has a line for every kind of part, with shares that are shares', () => {
    const kinds = partSchema.options.map(({ shape }) => shape.kind.value);
    expect(Object.keys(PART_KINDS).sort()).toEqual([...kinds].sort());
    for (const { modes: list } of Object.values(PART_KINDS)) {
      const sum = list.reduce((total, { share }) => total + share, 0);
      expect(sum).toBeLessThanOrEqual(1 + 1e-12);
    }
  });

  it('names a proof for every mode', () => {
    for (const part of LIFT.parts) {
      for (const { mode } of modesOf(part)) expect(proofsOf(part, mode).length).toBeGreaterThan(0);
    }
    expect(proofsOf(LIFT.parts[0]!, 'blown')).toEqual([]);
  });
});
