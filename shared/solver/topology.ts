import { EARTH, type Circuit, type Part } from '../circuit/circuit';
import { tagsOf } from '../circuit/tags';

/** Node number of earth, which is the reference and has no row of its own. */
export const EARTH_NODE = -1;

/**
 * Which nodes a circuit joins, and the order of their elimination, worked out once: states and faults
 * change values only, since what is open stays as a very large resistance.
 * Nodes are numbered in the order of elimination; the last `kept` ones are those of bridges and
 * transformers, and of capacitors beside a bridge, on which the rest is solved.
 */
export interface Topology {
  readonly nodes: ReadonlyMap<string, number>;
  readonly size: number;
  readonly kept: number;
  readonly edges: number;
  /** The edge between two nodes, or -1. */
  edge(a: number, b: number): number;
  /** Neighbours of node k among the later ones are `neighbour[start[k] .. start[k+1])`. */
  readonly start: Int32Array;
  readonly neighbour: Int32Array;
  /** The edge to each neighbour, in step with `neighbour`. */
  readonly toNeighbour: Int32Array;
  /** Edges between the neighbours of k, pair by pair, from `pairStart[k]` on. */
  readonly pairStart: Int32Array;
  readonly pairEdge: Int32Array;
}

const known = new WeakMap<Circuit, Topology>();

/** A circuit's topology; kept as long as the (immutable) circuit object lives. */
export function topologyOf(circuit: Circuit): Topology {
  let topology = known.get(circuit);
  if (!topology) {
    topology = buildTopology(circuit);
    known.set(circuit, topology);
  }
  return topology;
}

function buildTopology(circuit: Circuit): Topology {
  const tags = new Set(circuit.terminals.map(({ tag }) => tag));
  const keptTags = new Set<string>();
  const links = new Map<string, Set<string>>();
  const rectified = circuit.parts.some(({ kind }) => kind === 'bridge');
  const isKept = ({ kind }: Part) =>
    kind === 'bridge' || kind === 'transformer' || (rectified && kind === 'capacitor');
  const link = (a: string, b: string) => {
    if (a === b || a === EARTH || b === EARTH) return;
    links.get(a)!.add(b);
    links.get(b)!.add(a);
  };
  for (const part of circuit.parts) for (const tag of tagsOf(part)) tags.add(tag);
  tags.delete(EARTH);
  for (const tag of tags) links.set(tag, new Set());
  for (const part of circuit.parts) {
    if (part.kind !== 'bridge' && part.kind !== 'transformer') link(...part.between);
    if (isKept(part)) for (const tag of tagsOf(part)) if (tag !== EARTH) keptTags.add(tag);
  }
  const kept = [...keptTags];
  for (const a of kept) for (const b of kept) link(a, b);

  const order: string[] = [];
  const later = new Map<string, readonly string[]>();
  const waiting = new Set([...tags].filter((tag) => !keptTags.has(tag)));
  const take = (tag: string) => {
    const around = [...links.get(tag)!];
    later.set(tag, around);
    order.push(tag);
    for (const a of around) links.get(a)!.delete(tag);
    for (const a of around) for (const b of around) link(a, b);
  };
  while (waiting.size > 0) {
    // The node with the fewest neighbours first: a series string then stays a string.
    let best = '';
    let fewest = Infinity;
    for (const tag of waiting) {
      const count = links.get(tag)!.size;
      if (count < fewest) [best, fewest] = [tag, count];
    }
    waiting.delete(best);
    take(best);
  }
  kept.forEach(take);
  return numbered(order, later, kept.length);
}

function numbered(
  order: readonly string[],
  later: ReadonlyMap<string, readonly string[]>,
  kept: number,
): Topology {
  const size = order.length;
  const nodes = new Map(order.map((tag, index) => [tag, index]));
  const edgeIds = new Map<number, number>();
  const key = (a: number, b: number) => (a < b ? a * size + b : b * size + a);
  const around = order.map((tag) => later.get(tag)!.map((other) => nodes.get(other)!));
  around.forEach((list, k) => {
    for (const j of list) edgeIds.set(key(k, j), edgeIds.size);
  });
  const start: number[] = [0];
  const pairStart: number[] = [0];
  const neighbour: number[] = [];
  const toNeighbour: number[] = [];
  const pairEdge: number[] = [];
  around.forEach((list, k) => {
    list.forEach((j, position) => {
      neighbour.push(j);
      toNeighbour.push(edgeIds.get(key(k, j))!);
      for (const i of list.slice(position + 1)) pairEdge.push(edgeIds.get(key(j, i))!);
    });
    start.push(neighbour.length);
    pairStart.push(pairEdge.length);
  });
  return {
    nodes,
    size,
    kept,
    edges: edgeIds.size,
    edge: (a, b) => edgeIds.get(key(a, b)) ?? -1,
    start: Int32Array.from(start),
    neighbour: Int32Array.from(neighbour),
    toNeighbour: Int32Array.from(toNeighbour),
    pairStart: Int32Array.from(pairStart),
    pairEdge: Int32Array.from(pairEdge),
  };
}
