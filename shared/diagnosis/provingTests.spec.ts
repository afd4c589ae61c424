import { describe, expect, it } from 'vitest';
import { stringCircuit } from '../circuit';
import { provingTests } from './provingTests';

const drawn = stringCircuit(
  '110 V DC earthed: T0 (stop) T1 [SR] (gate) T2 (lock@landing 2 when call=yes) T3 [LR]',
);
const circuit = {
  ...drawn,
  conditions: drawn.conditions.map((each) => ({ ...each, moves: true })),
};
const test = (device: string) => provingTests(circuit, [device])[0]!;

describe('what proves a touched device', () => {
  it('is the tag behind it that goes dead and the relays that drop', () => {
    expect(test('gate')).toMatchObject({ kind: 'opens', red: 'T2', black: 'R', relays: ['LR'] });
    expect(test('stop')).toMatchObject({ kind: 'opens', red: 'T1', relays: ['SR', 'LR'] });
  });

  it('sets the state in which the string is live behind it', () => {
    expect(test('lock')).toMatchObject({
      red: 'T3',
      relays: ['LR'],
      state: { call: 'yes' },
      condition: { name: 'call', value: 'no' },
      place: 'landing 2',
      shows: true,
    });
  });

  it('warns of people and motion, and of the place', () => {
    expect(test('gate').cautions).toContain('people and motion');
    expect(test('lock').cautions).toContain('landing door');
  });

  it('is a relay that drops, for a coil; live volts, for what has nothing to operate', () => {
    expect(test('SR')).toMatchObject({ kind: 'drops', relays: ['SR'] });
    expect(test('fuse')).toMatchObject({ kind: 'carries', red: 'T0' });
  });

  it('says so where another way runs past the device', () => {
    const gate = circuit.parts.find(({ name }) => name === 'gate')!;
    const bypassed = {
      ...circuit,
      parts: [...circuit.parts, { ...gate, name: 'bypass', device: 'bypass' }],
    };
    expect(provingTests(bypassed, ['gate'])[0]).toMatchObject({ shows: false, relays: [] });
  });

  it('takes all contacts of one device together, and each device once', () => {
    const gate = circuit.parts.find(({ name }) => name === 'gate')!;
    const twin = { ...gate, name: 'gate, second contact', device: 'car gate' };
    const parts = circuit.parts.map((p) => (p === gate ? { ...gate, device: 'car gate' } : p));
    const tests = provingTests({ ...circuit, parts: [...parts, twin] }, ['car gate', 'car gate']);
    expect(tests).toHaveLength(1);
    expect(tests[0]).toMatchObject({ shows: true, parts: ['gate', 'gate, second contact'] });
  });

  it('leaves out what the circuit does not have', () => {
    expect(provingTests(circuit, ['no such device'])).toEqual([]);
  });
});
