import type { Circuit } from './circuit';

/** Minutes of a technician, whose lift or stairs are in the matrix of the circuit. */
export interface Travel {
  /**
   * From standing at one place to being ready at another: the shortest way, over other places where
   * that is quicker, and the set-up of the place of arrival, paid once for the stay. 0 where one stands.
   * Infinity where no way is known.
   */
  minutes(from: string, to: string): number;
  /** The same and one reading there. */
  minutesToRead(from: string, to: string): number;
}

/** A pair given in one direction only counts for both. */
export function travelOf(circuit: Circuit): Travel {
  const names = circuit.places.map(({ name }) => name);
  const index = new Map(names.map((name, k) => [name, k]));
  const ways = names.map((from) =>
    names.map((to) =>
      from === to
        ? 0
        : (circuit.minutes[from]?.[to] ?? circuit.minutes[to]?.[from] ?? Number.POSITIVE_INFINITY),
    ),
  );
  for (let over = 0; over < names.length; over++) {
    for (const way of ways) {
      for (let to = 0; to < names.length; to++) {
        way[to] = Math.min(way[to]!, way[over]! + ways[over]![to]!);
      }
    }
  }
  const minutes = (from: string, to: string): number => {
    if (from === to) return 0;
    const a = index.get(from);
    const b = index.get(to);
    if (a === undefined || b === undefined) return Number.POSITIVE_INFINITY;
    return ways[a]![b]! + circuit.places[b]!.setUpMinutes;
  };
  return {
    minutes,
    minutesToRead: (from, to) => minutes(from, to) + circuit.readingMinutes,
  };
}
