import type { Circuit } from './circuit';
import type { CheckFinding } from './finding';
import { CONTROLLER, stringTags } from './sections';
import { travelOf } from './travel';

/** Whether a technician can get where the probes go, and reach with both. */
export function checkReach(circuit: Circuit): readonly CheckFinding[] {
  return [
    ...waysFromController(circuit),
    ...contactsWithoutPlace(circuit),
    ...placesWithoutReturn(circuit),
  ];
}

function waysFromController(circuit: Circuit): CheckFinding[] {
  if (!circuit.places.some(({ name }) => name === CONTROLLER)) {
    return [{ code: 'circuit.no-controller', severity: 'error', at: 'places' }];
  }
  const travel = travelOf(circuit);
  return circuit.places.flatMap(({ name }, k): CheckFinding[] =>
    Number.isFinite(travel.minutes(CONTROLLER, name))
      ? []
      : [
          {
            code: 'circuit.place-without-way',
            severity: 'warning',
            at: `places.${k}`,
            details: { name },
          },
        ],
  );
}

/**
 * A contact that no one place reaches on both sides can't be read across; a core between two places
 * never can, so it is not named here.
 */
function contactsWithoutPlace(circuit: Circuit): CheckFinding[] {
  const placesOf = new Map(
    circuit.terminals.map(({ tag, reachable, places }) => [tag, reachable ? places : []]),
  );
  return circuit.parts.flatMap((part, k): CheckFinding[] => {
    if (part.kind !== 'contact') return [];
    const [red, black] = part.between;
    const other = placesOf.get(black) ?? [];
    if (placesOf.get(red)?.some((place) => other.includes(place))) return [];
    return [
      {
        code: 'circuit.pair-without-place',
        severity: 'warning',
        at: `parts.${k}`,
        details: { part: part.name, red, black },
      },
    ];
  });
}

/** Places where a string's tags are but not its return: there black has nothing to rest on. */
function placesWithoutReturn(circuit: Circuit): CheckFinding[] {
  const reached = circuit.terminals.filter(({ reachable }) => reachable);
  return circuit.strings.flatMap((line, k): CheckFinding[] => {
    const tags = new Set(stringTags(circuit, line));
    const withString = new Set(
      reached.filter(({ tag }) => tags.has(tag)).flatMap(({ places }) => places),
    );
    const withReturn = new Set(
      reached.filter(({ tag }) => tag === line.return).flatMap(({ places }) => places),
    );
    const without = [...withString].filter((place) => !withReturn.has(place));
    if (without.length === 0) return [];
    return [
      {
        code: 'circuit.places-without-return',
        severity: 'warning',
        at: `strings.${k}`,
        details: { string: line.name, places: without.join(', ') },
      },
    ];
  });
}
