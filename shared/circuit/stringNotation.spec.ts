import { describe, expect, it } from 'vitest';
import { circuitSchema } from './circuit';
import { stringCircuit } from './stringNotation';

describe('a circuit in one line', () => {
  const lift = stringCircuit(
    '124 V bridge earthed: T0 (car-top stop@car top 0.2 ohm) T1@controller,pit ~core 103@pit~ T2 ' +
      '[SR 3300 ohm] (hold when SR=in) T3 (landing lock 1) T4 [LR]',
  );
  const part = (name: string) => lift.parts.find((each) => each.name === name);

  it('is a circuit by the schema', () => {
    expect(circuitSchema.safeParse(lift).success).toBe(true);
  });

  it('takes names with digits and hyphens, places and ohms', () => {
    expect(part('car-top stop')).toMatchObject({
      kind: 'contact',
      place: 'car top',
      ohms: 0.2,
      between: ['T0', 'T1'],
    });
    expect(part('core 103')).toMatchObject({ kind: 'core', place: 'pit', between: ['T1', 'T2'] });
    expect(part('landing lock 1')).toMatchObject({ between: ['T3', 'T4'] });
    expect(part('SR')).toMatchObject({ kind: 'coil', ohms: 3300, between: ['T2', 'R'] });
    expect(lift.terminals.find(({ tag }) => tag === 'T1')!.places).toEqual(['controller', 'pit']);
  });

  it('ties contacts to relays', () => {
    expect(part('hold')).toMatchObject({ relay: { name: 'SR', closedWhen: 'in' } });
  });

  it('puts a bridge before the fuse', () => {
    expect(part('bridge')).toMatchObject({ between: ['AC1', 'AC2', 'S', 'N'] });
    expect(lift.stringCurrent).toBe('direct');
    expect(lift.nominalVolts).toBeCloseTo(111.64, 2);
  });

  it.each(['T0 (a) T1', '110 V DC: T0', '110 V DC: (a) T0 T1'])('refuses %s', (line) => {
    expect(() => stringCircuit(line)).toThrow(SyntaxError);
  });
});
