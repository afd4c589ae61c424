import { EARTH, type Circuit, type Part } from './circuit';
import type { CheckFinding } from './finding';
import { PART_KINDS } from './partKinds';
import { stringSteps } from './sections';
import { tagsOf } from './tags';
import { blocksOf, piecesOf, type Edge } from './wiringGraph';

/** What does not hang together: taken as drawn, with every contact closed. */
export function checkWiring(circuit: Circuit): readonly CheckFinding[] {
  const edges = circuit.parts.flatMap(edgesOf);
  const pieces = piecesOf(edges);
  const fed = new Set(
    circuit.parts
      .filter((part) => PART_KINDS[part.kind].source)
      .map((part) => pieces.get(tagsOf(part)[0]!)!),
  );
  const isFed = (tag: string) => fed.has(pieces.get(tag) ?? -1);
  return [
    ...onOneTerminal(circuit),
    ...looseParts(circuit, isFed),
    ...looseTerminals(circuit),
    ...deadStrings(circuit, isFed),
    ...deadCoils(circuit, edges),
  ];
}

/** The pairs of tags that a part joins: all of a bridge's, the two windings of a transformer. */
function edgesOf(part: Part): Edge[] {
  const id = part.name;
  switch (part.kind) {
    case 'transformer':
      return [
        { a: part.primary[0], b: part.primary[1], part: id },
        { a: part.secondary[0], b: part.secondary[1], part: id, coupled: part.primary[0] },
      ];
    case 'bridge': {
      const [a1, a2, plus, minus] = part.between;
      return [
        { a: a1, b: plus, part: id },
        { a: a2, b: plus, part: id },
        { a: minus, b: a1, part: id },
        { a: minus, b: a2, part: id },
      ];
    }
    default:
      return [{ a: part.between[0], b: part.between[1], part: id }];
  }
}

function onOneTerminal({ parts }: Circuit): CheckFinding[] {
  return parts.flatMap((part, k): CheckFinding[] => {
    const tags = tagsOf(part);
    const ends = part.kind === 'transformer' ? [part.primary, part.secondary] : [tags];
    if (ends.every((list) => new Set(list).size === list.length)) return [];
    return [
      {
        code: 'circuit.part-on-one-terminal',
        severity: 'error',
        at: `parts.${k}`,
        details: { part: part.name },
      },
    ];
  });
}

function looseParts({ parts }: Circuit, isFed: (tag: string) => boolean): CheckFinding[] {
  return parts.flatMap((part, k): CheckFinding[] =>
    tagsOf(part).some(isFed)
      ? []
      : [
          {
            code: 'circuit.floating-part',
            severity: 'error',
            at: `parts.${k}`,
            details: { part: part.name },
          },
        ],
  );
}

function looseTerminals({ terminals, parts }: Circuit): CheckFinding[] {
  const counts = new Map<string, number>();
  for (const part of parts) {
    for (const tag of new Set(tagsOf(part))) counts.set(tag, (counts.get(tag) ?? 0) + 1);
  }
  return terminals.flatMap(({ tag }, k): CheckFinding[] => {
    const count = counts.get(tag) ?? 0;
    if (count > 1) return [];
    const code = count === 0 ? 'circuit.terminal-without-part' : 'circuit.terminal-with-one-part';
    return [{ code, severity: 'warning', at: `terminals.${k}`, details: { tag } }];
  });
}

function deadStrings(circuit: Circuit, isFed: (tag: string) => boolean): CheckFinding[] {
  return circuit.strings.flatMap((line, k): CheckFinding[] => {
    const details = { string: line.name };
    const at = `strings.${k}`;
    const findings: CheckFinding[] = [];
    if (!isFed(line.from)) {
      findings.push({ code: 'circuit.string-without-supply', severity: 'error', at, details });
    }
    if (stringSteps(circuit, line).length === 0) {
      findings.push({ code: 'circuit.string-path-not-found', severity: 'error', at, details });
    }
    return findings;
  });
}

/** A coil carries current only on a loop with something that drives one: both are then in one block. */
function deadCoils({ parts }: Circuit, edges: readonly Edge[]): CheckFinding[] {
  const blocks = blocksOf(edges);
  const driving = new Set(
    parts
      .filter(({ kind }) => PART_KINDS[kind].source || kind === 'transformer')
      .flatMap((part) => edges.flatMap((edge, k) => (edge.part === part.name ? [blocks[k]!] : []))),
  );
  return parts.flatMap((part, k): CheckFinding[] => {
    if (part.kind !== 'coil' || part.between.every((tag) => tag === EARTH)) return [];
    const block = blocks[edges.findIndex((edge) => edge.part === part.name)]!;
    if (driving.has(block)) return [];
    return [
      {
        code: 'circuit.coil-never-energised',
        severity: 'error',
        at: `parts.${k}`,
        details: { part: part.name },
      },
    ];
  });
}
