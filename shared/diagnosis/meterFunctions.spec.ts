import { describe, expect, it } from 'vitest';
import { CONTROLLER, stringCircuit } from '../circuit';
import { candidatesOf } from './candidates';
import { USUAL_METER } from './observation';
import { meterFunctions } from './meterFunctions';

const rectified = stringCircuit('110 V bridge earthed: T0 (stop) T1 (gate) T2 [LR]');
const request = {
  observations: [],
  place: CONTROLLER,
  state: {},
  unreachable: [],
  declined: [],
  meter: USUAL_METER,
};

describe('the function of a reading', () => {
  it('is the one of the side of the bridge on which both probes are', () => {
    const between = meterFunctions(rectified);
    expect(between('AC1', 'AC2')).toBe('ac volts');
    expect(between('T0', 'R')).toBe('dc volts');
    // From one side to the other the string's own function shows what the string's faults change.
    expect(between('AC1', 'R')).toBe('dc volts');
  });

  it('is alternating everywhere on an alternating supply, earthed or not', () => {
    const between = meterFunctions(stringCircuit('110 V AC earthed: T0 (stop) T1 [LR]'));
    expect(between('T0', 'R')).toBe('ac volts');
    expect(between('S', 'N')).toBe('ac volts');
  });

  it('is offered with the readings: a supply before a bridge, and what the bridge gives out', () => {
    const offered = candidatesOf(rectified, request);
    const across = (part: string) => offered.find((each) => each.across.includes(part));
    expect(across('supply')).toMatchObject({ function: 'ac volts' });
    expect(across('bridge')).toMatchObject({ red: 'S', black: 'N', function: 'dc volts' });
  });
});
