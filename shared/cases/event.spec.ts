import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readEvent, type Upcaster } from './event';
import { sampleEvent, sampleReading } from './sampleEvents';

/** A made-up past: schema 1 wrote millivolts and `a`/`b`, schema 2 volts; the present has red and black. */
const steps: Readonly<Record<number, Upcaster>> = {
  1: (event) => {
    const { millivolts, ...rest } = event.payload;
    return { ...event, payload: { ...rest, volts: Number(millivolts) / 1000 } };
  },
  2: (event) => {
    const { a, b, ...rest } = event.payload;
    return { ...event, payload: { ...rest, red: a, black: b } };
  },
};
const { red, black, volts, ...rest } = sampleReading('5', '9', 48.5);
const oldest = {
  ...sampleEvent(2, 'reading taken', sampleReading('5', '9', 0)),
  payload: { ...rest, a: red, b: black, millivolts: volts * 1000 },
};

describe('reading an event', () => {
  it('lifts an old one step by step, and leaves what was sent as it was', () => {
    const before = JSON.stringify(oldest);
    const read = readEvent(oldest, steps, 3);
    expect(read).toMatchObject({
      kind: 'known',
      event: { schema: 3, payload: { red: '5', black: '9', volts: 48.5 } },
    });
    expect(JSON.stringify(oldest)).toBe(before);
  });

  it('goes in at the schema that it was written in', () => {
    const middle = { ...oldest, schema: 2, payload: { ...rest, a: '1', b: '2', volts: 3 } };
    expect(readEvent(middle, steps, 3)).toMatchObject({
      kind: 'known',
      event: { payload: { red: '1', volts: 3 } },
    });
  });

  it('keeps one whose way is not known, and one of a later build', () => {
    expect(readEvent(oldest, { 2: steps[2]! }, 3).kind).toBe('unknown');
    expect(readEvent({ ...oldest, schema: 4 }, steps, 3)).toEqual({
      kind: 'unknown',
      event: { ...oldest, schema: 4 },
    });
  });

  it('names what does not fit', () => {
    const read = readEvent({ ...oldest, payload: { ...sampleReading('5', '9', 1e9) } });
    expect(read.kind).toBe('invalid');
    expect(read.kind === 'invalid' && read.problems.some((at) => at.startsWith('volts'))).toBe(
      true,
    );
  });

  it('takes any type and payload without failing', () => {
    fc.assert(
      fc.property(
        fc.oneof(fc.string(), fc.constantFrom('constructor', 'toString', 'reading taken')),
        fc.dictionary(fc.string(), fc.jsonValue()),
        (type, payload) =>
          ['known', 'unknown', 'invalid'].includes(readEvent({ ...oldest, type, payload }).kind),
      ),
    );
  });
});
