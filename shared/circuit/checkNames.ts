import { EARTH, type Circuit, type Part } from './circuit';
import type { CheckFinding } from './finding';
import { tagsOf } from './tags';

/** Names that stand twice, and names of what the circuit does not have. */
export function checkNames(circuit: Circuit): readonly CheckFinding[] {
  return [
    ...twice(
      'circuit.duplicate-tag',
      'terminals',
      circuit.terminals.map(({ tag }) => tag),
    ),
    ...twice(
      'circuit.duplicate-part',
      'parts',
      circuit.parts.map(({ name }) => name),
    ),
    ...twice(
      'circuit.duplicate-place',
      'places',
      circuit.places.map(({ name }) => name),
    ),
    ...twice(
      'circuit.duplicate-condition',
      'conditions',
      circuit.conditions.map(({ name }) => name),
    ),
    ...twice(
      'circuit.duplicate-string',
      'strings',
      circuit.strings.map(({ name }) => name),
    ),
    ...circuit.conditions.flatMap(({ values }, k) =>
      twice('circuit.duplicate-value', `conditions.${k}.values`, values),
    ),
    ...reservedTags(circuit),
    ...unknownTags(circuit),
    ...unknownPlaces(circuit),
    ...circuit.parts.flatMap((part, k) => unknownMovers(circuit, part, k)),
  ];
}

function twice(code: string, path: string, names: readonly string[]): CheckFinding[] {
  const seen = new Set<string>();
  return names.flatMap((name, k): CheckFinding[] => {
    if (seen.has(name)) return [{ code, severity: 'error', at: `${path}.${k}`, details: { name } }];
    seen.add(name);
    return [];
  });
}

function unknown(code: string, at: string, name: string): CheckFinding {
  return { code, severity: 'error', at, details: { name } };
}

function reservedTags({ terminals }: Circuit): CheckFinding[] {
  return terminals.flatMap(({ tag }, k) =>
    tag === EARTH ? [unknown('circuit.reserved-tag', `terminals.${k}.tag`, tag)] : [],
  );
}

function unknownTags({ terminals, parts, strings }: Circuit): CheckFinding[] {
  const tags = new Set(terminals.map(({ tag }) => tag));
  const inParts = parts.flatMap((part, k) =>
    tagsOf(part)
      .filter((tag) => tag !== EARTH && !tags.has(tag))
      .map((tag) => unknown('circuit.unknown-terminal', `parts.${k}`, tag)),
  );
  const ends = ['from', 'to', 'return', 'supplyReturn'] as const;
  const inStrings = strings.flatMap((line, k) =>
    ends
      .filter((end) => !tags.has(line[end]))
      .map((end) => unknown('circuit.unknown-terminal', `strings.${k}.${end}`, line[end])),
  );
  return [...inParts, ...inStrings];
}

function unknownPlaces({ places, terminals, parts, minutes }: Circuit): CheckFinding[] {
  const names = new Set(places.map(({ name }) => name));
  const check = (at: string, name: string) =>
    names.has(name) ? [] : [unknown('circuit.unknown-place', at, name)];
  return [
    ...terminals.flatMap((terminal, k) =>
      terminal.places.flatMap((name) => check(`terminals.${k}.places`, name)),
    ),
    ...parts.flatMap((part, k) => check(`parts.${k}.place`, part.place)),
    ...Object.entries(minutes).flatMap(([from, ways]) => [
      ...check('minutes', from),
      ...Object.keys(ways).flatMap((to) => check(`minutes.${from}`, to)),
    ]),
  ];
}

function unknownMovers({ parts, conditions }: Circuit, part: Part, k: number): CheckFinding[] {
  if (part.kind !== 'contact') return [];
  const findings: CheckFinding[] = [];
  const { relay, condition } = part;
  if (relay && !parts.some(({ kind, name }) => kind === 'coil' && name === relay.name)) {
    findings.push(unknown('circuit.unknown-relay', `parts.${k}.relay`, relay.name));
  }
  if (condition) {
    const known = conditions.find(({ name }) => name === condition.name);
    if (!known) {
      findings.push(unknown('circuit.unknown-condition', `parts.${k}.condition`, condition.name));
    } else {
      for (const value of condition.closedWhen) {
        if (known.values.includes(value)) continue;
        findings.push(
          unknown('circuit.unknown-condition-value', `parts.${k}.condition.closedWhen`, value),
        );
      }
    }
  }
  return findings;
}
