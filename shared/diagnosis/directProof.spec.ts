import { describe, expect, it } from 'vitest';
import { stringCircuit } from '../circuit';
import { createEngine, USUAL_METER, type Observation, type ReadingObservation } from './index';

const circuit = stringCircuit('110 V DC earthed: T0 (stop) T1 (governor) T2 (gate) T3 [LR]');
const reading = (
  red: string,
  volts: number,
  more: Partial<ReadingObservation> = {},
): ReadingObservation => ({
  kind: 'reading',
  id: `${red} ${volts}`,
  red,
  black: 'R',
  function: 'dc volts',
  volts,
  meter: USUAL_METER,
  state: {},
  place: 'controller',
  ...more,
});
const relay = (position: 'in' | 'out'): Observation => ({
  kind: 'relay',
  id: 'LR',
  relay: 'LR',
  position,
  state: {},
});
const after = (...observations: Observation[]) =>
  createEngine(circuit).advise({
    observations,
    place: 'controller',
    state: {},
    unreachable: [],
    declined: [],
    meter: USUAL_METER,
  });
const toGovernor = [
  relay('out'),
  reading('T0', 110),
  reading('T0', 110, { black: 'N', id: 'return' }),
  reading('T1', 110),
  reading('T2', 0),
  reading('T3', 0),
];

describe('the direct proof of an open contact', () => {
  it('is the string’s volts across it', () => {
    const { step, stopping } = after(
      ...toGovernor,
      reading('T1', 110, { black: 'T2', id: 'across' }),
      reading('T2', 0, { black: 'N', id: 'other' }),
      reading('T1', 110, { black: 'N', id: 'another' }),
    );
    expect(stopping.direct).toBe(true);
    expect(step).toMatchObject({ kind: 'finding', directObservation: 'across' });
  });

  it('is as good with the probes the other way round', () => {
    const across = reading('T2', -110, { black: 'T1', id: 'across' });
    expect(after(...toGovernor, across).stopping.direct).toBe(true);
  });

  it.each([
    ['on the wrong range', { function: 'ac volts' as const, volts: 0.1 }],
    ['that shows none', { volts: 0 }],
    ['that shows what neither the fault nor a healthy lift would', { volts: 31 }],
  ])('is not a reading across it %s', (_what, more) => {
    const across = reading('T1', 0, { black: 'T2', id: 'across', ...more });
    expect(after(...toGovernor, across).stopping.direct).toBe(false);
  });
});

describe('the direct proof of a coil', () => {
  const across = reading('T3', 110, { id: 'across' });

  it('is its volts together with its relay, seen out', () => {
    const { suspects, stopping } = after(relay('out'), reading('T0', 110), across);
    expect(suspects[0]!.faults[0]!.part).toBe('LR');
    expect(stopping.direct).toBe(true);
  });

  it('is not its volts alone', () => {
    const { suspects, stopping } = after(reading('T0', 110), across);
    expect(suspects[0]!.faults[0]!.part).toBe('LR');
    expect(stopping.direct).toBe(false);
  });
});
