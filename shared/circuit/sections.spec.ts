import { describe, expect, it } from 'vitest';
import type { Circuit } from './circuit';
import { finestSections, sectionsOf, stringSteps, stringTags } from './sections';
import { stringCircuit } from './stringNotation';

const LIFT = stringCircuit(
  '110 V DC: T0 (governor) T1@controller,pit (pit stop@pit) 1.1@pit (tension@pit) T2@pit,controller ' +
    '[SR] (gate@car) 2.1@car ~core~ T3 [LR]',
);
const line = LIFT.strings[0]!;

/** Sections as text: `T0-T1 governor | ...` */
const text = (sections: ReturnType<typeof sectionsOf>) =>
  sections.map(({ from, to, parts }) => `${from}-${to} ${parts.join('+')}`).join(' | ');

describe('a string', () => {
  it('has its tags in the order wired, however its parts are listed', () => {
    expect(stringTags(LIFT, line).join(' ')).toBe('T0 T1 1.1 T2 2.1 T3');
    const turned: Circuit = { ...LIFT, parts: LIFT.parts.toReversed() };
    expect(stringTags(turned, line).join(' ')).toBe('T0 T1 1.1 T2 2.1 T3');
  });

  it('has between neighbours at the controller the parts that lie there', () => {
    expect(text(sectionsOf(LIFT, line))).toBe(
      'T0-T1 governor | T1-T2 pit stop+tension | T2-T3 gate+core',
    );
  });

  it('is divided by the tags of another place, with its ends always bounds', () => {
    expect(text(sectionsOf(LIFT, line, 'pit'))).toBe(
      'T0-T1 governor | T1-1.1 pit stop | 1.1-T2 tension | T2-T3 gate+core',
    );
  });

  it('is divided as finely as any reading can', () => {
    expect(finestSections(LIFT, line)).toHaveLength(5);
    const hidden: Circuit = {
      ...LIFT,
      terminals: LIFT.terminals.map((t) => (t.tag === '1.1' ? { ...t, reachable: false } : t)),
    };
    expect(text(finestSections(hidden, line))).toContain('T1-T2 pit stop+tension');
  });

  it('runs through what is bypassed, not through the bypass', () => {
    const bypassed: Circuit = {
      ...LIFT,
      parts: [
        {
          kind: 'contact',
          name: 'door zone',
          place: 'controller',
          weight: 1,
          between: ['T1', 'T2'],
          ohms: 0.1,
        },
        ...LIFT.parts,
      ],
    };
    expect(stringTags(bypassed, line).join(' ')).toBe('T0 T1 1.1 T2 2.1 T3');
  });

  it('names parts side by side in one step', () => {
    const twin: Circuit = {
      ...LIFT,
      parts: [
        ...LIFT.parts,
        { ...LIFT.parts.find(({ name }) => name === 'gate')!, name: 'gate 2' },
      ],
    };
    expect(stringSteps(twin, line)[3]!.parts).toEqual(['gate', 'gate 2']);
  });

  it('is empty where no way leads to its end', () => {
    expect(stringTags(LIFT, { ...line, to: 'N' })).toEqual([]);
    expect(sectionsOf(LIFT, { ...line, to: 'N' })).toEqual([]);
  });
});
