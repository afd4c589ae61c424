import type { Outcome } from '@shared/diagnosis';
import { outcomeRows } from './outcome-model';

const outcome = (band: Outcome['band'], probability: number, ...leaves: string[]): Outcome => ({
  band,
  probability,
  leaves,
});

describe('outcomeRows', () => {
  it('joins what the meter shows alike, the likelier part first', () => {
    const rows = outcomeRows([
      outcome('full', 0.1, 'supply'),
      outcome('none', 0.3, 'pit stop'),
      outcome('full', 0.6, 'gate', 'supply'),
    ]);
    expect(rows.map(({ band }) => band)).toEqual(['full', 'none']);
    expect(rows[0]!.probability).toBeCloseTo(0.7);
    expect(rows[0]!.leaves).toEqual(['gate', 'supply']);
  });

  it('leaves out what is hardly likely, unless nothing else is there', () => {
    expect(outcomeRows([outcome('full', 0.999), outcome('none', 0.001)])).toHaveLength(1);
    expect(outcomeRows([outcome('none', 0.001)])).toHaveLength(1);
  });

  it('keeps a stretch only where one outcome stands behind the row', () => {
    const stretch = ['T5', 'T8'] as [string, string];
    const one = { ...outcome('none', 0.4), stretch };
    expect(outcomeRows([one])[0]!.stretch).toEqual(stretch);
    expect(outcomeRows([one, outcome('none', 0.2)])[0]!.stretch).toBeUndefined();
  });

  it('spans the volts of what it joins', () => {
    const a = { ...outcome('between', 0.3), fromVolts: 20, toVolts: 30 };
    const b = { ...outcome('between', 0.2), fromVolts: 50, toVolts: 60 };
    expect(outcomeRows([a, b])[0]).toMatchObject({ fromVolts: 20, toVolts: 60 });
  });
});
