import { describe, expect, it } from 'vitest';
import { stringCircuit } from '../circuit';
import { createEngine, USUAL_METER, type Observation } from './index';

const circuit = stringCircuit('110 V DC earthed: T0 (stop) T1 [SR] (gate) T2 (lock) T3 [LR]');
const reading = (red: string, volts: number): Observation => ({
  kind: 'reading',
  id: `${red} ${volts}`,
  red,
  black: 'R',
  function: 'dc volts',
  volts,
  meter: USUAL_METER,
  state: {},
  place: 'controller',
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
const gateOpen: Observation = { kind: 'device', id: 'g', part: 'gate', seen: 'open', state: {} };
const srIn: Observation = { kind: 'relay', id: 's', relay: 'SR', position: 'in', state: {} };

describe('signs of danger', () => {
  it('stops at volts beyond a device that is seen open', () => {
    const { step, stopping } = after(gateOpen, reading('T2', 110));
    expect(step).toMatchObject({
      kind: 'stop',
      dangers: [{ code: 'volts beyond open device', part: 'gate', observations: ['g', 'T2 110'] }],
    });
    expect(stopping.noDanger).toBe(false);
  });
  it('does not stop at volts before it, or at none beyond it', () => {
    expect(after(gateOpen, reading('T1', 110), reading('T2', 0)).step.kind).not.toBe('stop');
  });
  it('stops at a relay that is in without volts', () => {
    expect(after(srIn, reading('T1', 0)).step).toMatchObject({
      kind: 'stop',
      dangers: [{ code: 'relay in without volts', part: 'SR' }],
    });
  });
});
