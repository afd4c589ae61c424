import { describe, expect, it } from 'vitest';
import { checkCircuit, stringCircuit, type Circuit, type Part } from '../../circuit';
import { circuitSentences } from './circuit';
import { sentenceOf } from './sentenceOf';

const LIFT = stringCircuit(
  '110 V DC earthed: T0 (gate) T1 [SR] (hold when SR=in) T2 (call contact when call=yes) T3 [K]',
);
const part = (draft: Circuit, name: string) =>
  draft.parts.find((each) => each.name === name) as Part & Record<string, unknown>;

/** Ways to break a circuit, one for each kind of detail that its findings carry. */
const broken: readonly ((draft: Circuit) => unknown)[] = [
  (d) => d.terminals.push(d.terminals[0]!),
  (d) => d.terminals.push({ ...d.terminals[0]!, tag: 'earth' }),
  (d) => d.terminals.push({ ...d.terminals[0]!, tag: 'X1' }),
  (d) => d.places.push({ ...d.places[0]!, name: 'attic' }),
  (d) => (part(d, 'gate')['between'] = ['T0', 'T99']),
  (d) => (part(d, 'gate')['between'] = ['T0', 'T0']),
  (d) => (part(d, 'hold')['relay'] = { name: 'XR', closedWhen: 'in' }),
  (d) => (part(d, 'call contact')['condition'] = { name: 'call', closedWhen: ['maybe'] }),
  (d) => (d.conditions = []),
  (d) => (part(d, 'K')['pullInMilliamps'] = 1e4),
  (d) => (part(d, 'K')['dropOutMilliamps'] = 1e4),
  (d) => (part(d, 'gate').weight = 0),
  (d) => (d.stringCurrent = 'alternating'),
  (d) => (d.strings[0]!.to = 'R'),
  (d) => (d.terminals.find(({ tag }) => tag === 'T0')!.places = []),
  (d) => (d.terminals.find(({ tag }) => tag === 'R')!.places = []),
  (d) => (d.nominalVolts = 1e6),
  (d) => (part(d, 'gate')['ohms'] = 0),
  (d) => Object.assign(part(d, 'gate'), { kind: 'flux device' }),
  (d) => Object.assign(d, { name: 7 }),
];

const findings = broken.flatMap((change) => {
  const draft = structuredClone(LIFT);
  change(draft);
  return checkCircuit(JSON.parse(JSON.stringify(draft))).findings;
});

describe('sentences of findings on a circuit', () => {
  it('have every detail that they speak of', () => {
    expect(new Set(findings.map(({ code }) => code)).size).toBeGreaterThan(15);
    for (const { code, at, details } of findings) {
      const sentence = (circuitSentences as Readonly<Record<string, string>>)[code]!;
      const given = { at, ...details } as Readonly<Record<string, unknown>>;
      const always = sentence.replace(/\[[^\]]*\]/g, '');
      const missing = [...always.matchAll(/\{(\w+)\}/g)].filter(
        ([, name]) => given[name ?? ''] === undefined,
      );
      expect(missing, code).toEqual([]);
      expect(sentenceOf(code, given)).not.toMatch(/[{}[\]]|\s\s| \./);
    }
  });

  it('say the one limit that was passed', () => {
    const at = 'parts.1.ohms';
    const low = sentenceOf('circuit.out-of-range', { at, minimum: 1e-6 });
    const high = sentenceOf('circuit.out-of-range', { at, maximum: 1000 });
    expect(low).toContain('0.000001');
    expect(low).not.toContain('most');
    expect(high).toContain('1000');
    expect(high).not.toContain('least');
  });
});
