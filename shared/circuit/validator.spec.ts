import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Circuit, Part } from './circuit';
import { stringCircuit } from './stringNotation';
import { checkCircuit, hasErrors } from './validator';

const LIFT = stringCircuit(
  '110 V DC earthed: T0 (gate) T1 [SR] (hold when SR=in) T2 (call contact when call=yes) T3 [K]',
);

type Draft = Circuit;
/** Codes of the findings on a circuit that was changed. */
function codes(change: (draft: Draft) => unknown): string[] {
  const draft = structuredClone(LIFT);
  change(draft);
  return checkCircuit(JSON.parse(JSON.stringify(draft))).findings.map(({ code }) => code);
}
const part = <K extends Part['kind']>(draft: Draft, name: string): Extract<Part, { kind: K }> =>
  draft.parts.find((each) => each.name === name) as Extract<Part, { kind: K }>;

describe('a circuit check', () => {
  it('finds nothing in a sound circuit', () => {
    const { circuit, findings } = checkCircuit(JSON.parse(JSON.stringify(LIFT)));
    expect(findings).toEqual([]);
    expect(circuit?.parts).toHaveLength(LIFT.parts.length);
  });

  it.each<[string, (draft: Draft) => unknown]>([
    ['circuit.duplicate-tag', (d) => d.terminals.push(d.terminals[0]!)],
    ['circuit.duplicate-part', (d) => (part(d, 'hold').name = 'gate')],
    ['circuit.duplicate-place', (d) => d.places.push(d.places[0]!)],
    ['circuit.duplicate-condition', (d) => d.conditions.push(d.conditions[0]!)],
    ['circuit.duplicate-value', (d) => d.conditions[0]!.values.push('yes')],
    ['circuit.duplicate-string', (d) => d.strings.push(d.strings[0]!)],
    ['circuit.reserved-tag', (d) => d.terminals.push({ ...d.terminals[0]!, tag: 'earth' })],
    ['circuit.unknown-terminal', (d) => (part<'contact'>(d, 'gate').between[1] = 'T99')],
    ['circuit.unknown-terminal', (d) => (d.strings[0]!.to = 'T99')],
    ['circuit.unknown-place', (d) => (part(d, 'gate').place = 'attic')],
    ['circuit.unknown-place', (d) => d.terminals[0]!.places.push('attic')],
    ['circuit.unknown-place', (d) => (d.minutes = { attic: {} })],
    ['circuit.unknown-relay', (d) => (part<'contact'>(d, 'hold').relay!.name = 'XR')],
    ['circuit.unknown-condition', (d) => (d.conditions = [])],
    [
      'circuit.unknown-condition-value',
      (d) => (part<'contact'>(d, 'call contact').condition!.closedWhen = ['maybe']),
    ],
    ['circuit.floating-part', (d) => addResistor(d, 'X1', 'X2')],
    ['circuit.terminal-with-one-part', (d) => addResistor(d, 'T1', 'X2')],
    ['circuit.terminal-without-part', (d) => addTerminal(d, 'X1')],
    ['circuit.part-on-one-terminal', (d) => (part<'contact'>(d, 'gate').between = ['T0', 'T0'])],
    [
      'circuit.string-without-supply',
      (d) => {
        addTerminal(d, 'X1');
        addTerminal(d, 'X2');
        part<'supply'>(d, 'supply').between = ['X1', 'X2'];
      },
    ],
    ['circuit.string-path-not-found', (d) => (d.strings[0]!.to = 'R')],
    ['circuit.coil-never-energised', (d) => (part<'coil'>(d, 'K').between = ['T3', 'T2'])],
    ['circuit.condition-moves-nothing', (d) => delete part<'contact'>(d, 'call contact').condition],
    [
      'circuit.condition-moves-nothing',
      (d) => (part<'contact'>(d, 'call contact').condition!.closedWhen = ['yes', 'no']),
    ],
    ['circuit.missing-prior', (d) => (part(d, 'gate').weight = 0)],
    ['circuit.no-priors', (d) => d.parts.forEach((each) => (each.weight = 0))],
    ['circuit.no-modes', (d) => (part(d, 'gate').modeWeights = { open: 0 })],
    ['circuit.no-frequency', (d) => (part<'supply'>(d, 'supply').current = 'alternating')],
    ['circuit.drop-out-above-pull-in', (d) => (part<'coil'>(d, 'K').dropOutMilliamps = 1e4)],
    ['circuit.pull-in-above-rated', (d) => (part<'coil'>(d, 'K').pullInMilliamps = 1e4)],
    ['circuit.string-current-without-source', (d) => (d.stringCurrent = 'alternating')],
    ['circuit.no-controller', (d) => renameController(d)],
    ['circuit.place-without-way', (d) => d.places.push({ ...d.places[0]!, name: 'attic' })],
    ['circuit.pair-without-place', (d) => (d.terminals.find((t) => t.tag === 'T0')!.places = [])],
    ['circuit.places-without-return', (d) => (d.terminals.find((t) => t.tag === 'R')!.places = [])],
    ['circuit.out-of-range', (d) => (d.nominalVolts = 1e6)],
    ['circuit.out-of-range', (d) => (part<'contact'>(d, 'gate').ohms = 0)],
    ['circuit.unknown-kind', (d) => ((part(d, 'gate') as { kind: string }).kind = 'flux device')],
    ['circuit.shape', (d) => ((d as { name: unknown }).name = 7)],
  ])('says %s', (code, change) => {
    expect(codes(() => undefined)).not.toContain(code);
    expect(codes(change)).toContain(code);
  });

  it('takes a coil behind a bridge or a transformer as fed', () => {
    const bridge = stringCircuit('124 V bridge: T0 (gate) T1 [LR]');
    expect(checkCircuit(bridge).findings).toEqual([]);
  });

  it('says where: the path into the data', () => {
    const draft = structuredClone(LIFT);
    draft.nominalVolts = -1;
    expect(checkCircuit(draft).findings).toEqual([
      {
        code: 'circuit.out-of-range',
        severity: 'error',
        at: 'nominalVolts',
        details: { minimum: 1 },
      },
    ]);
  });

  it('never throws, whatever it is given, and finds fault with what is no circuit', () => {
    fc.assert(
      fc.property(fc.anything({ withNullPrototype: true }), (data) => {
        expect(hasErrors(checkCircuit(data).findings)).toBe(true);
      }),
    );
  });

  it('never throws on a circuit with any one value replaced by nonsense', () => {
    const paths = leafPaths(LIFT);
    fc.assert(
      fc.property(fc.constantFrom(...paths), fc.jsonValue(), (path, value) => {
        const draft = structuredClone(LIFT);
        put(draft, path, value);
        expect(Array.isArray(checkCircuit(draft).findings)).toBe(true);
      }),
      { numRuns: 400 },
    );
  });
});

function addTerminal(draft: Draft, tag: string): void {
  draft.terminals.push({ ...draft.terminals[0]!, tag });
}

function addResistor(draft: Draft, from: string, to: string): void {
  for (const tag of [from, to]) {
    if (!draft.terminals.some((terminal) => terminal.tag === tag)) addTerminal(draft, tag);
  }
  draft.parts.push({
    kind: 'resistor',
    name: 'extra',
    place: 'controller',
    weight: 1,
    between: [from, to],
    ohms: 10,
  });
}

function renameController(draft: Draft): void {
  draft.places[0]!.name = 'cabinet';
  for (const each of draft.parts) each.place = 'cabinet';
  for (const terminal of draft.terminals) terminal.places = ['cabinet'];
}

function leafPaths(value: unknown, path: readonly string[] = []): (readonly string[])[] {
  if (typeof value !== 'object' || value === null) return [path];
  return Object.entries(value).flatMap(([key, inner]) => leafPaths(inner, [...path, key]));
}

function put(target: object, path: readonly string[], value: unknown): void {
  const last = path.at(-1)!;
  const owner = path
    .slice(0, -1)
    .reduce((inner, key) => (inner as Record<string, object>)[key]!, target);
  (owner as Record<string, unknown>)[last] = value;
}
