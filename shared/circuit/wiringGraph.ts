/** A connection between two tags. */
export interface Edge {
  readonly a: string;
  readonly b: string;
  readonly part: string;
  /** A tag that feeds this edge without touching it: the primary of its winding. */
  readonly coupled?: string;
}

/** By tag, the number of the connected piece it is in; windings on one core count as connected. */
export function piecesOf(edges: readonly Edge[]): ReadonlyMap<string, number> {
  const around = new Map<string, string[]>();
  const join = (a: string, b: string) => {
    around.set(a, [...(around.get(a) ?? []), b]);
    around.set(b, [...(around.get(b) ?? []), a]);
  };
  for (const { a, b, coupled } of edges) {
    join(a, b);
    if (coupled !== undefined) join(a, coupled);
  }
  const pieces = new Map<string, number>();
  let piece = 0;
  for (const first of around.keys()) {
    if (pieces.has(first)) continue;
    const waiting = [first];
    pieces.set(first, piece);
    for (let tag = waiting.pop(); tag !== undefined; tag = waiting.pop()) {
      for (const next of around.get(tag)!) {
        if (pieces.has(next)) continue;
        pieces.set(next, piece);
        waiting.push(next);
      }
    }
    piece++;
  }
  return pieces;
}

/**
 * By edge, the number of its block: two edges share one exactly where some loop without a repeated tag
 * runs through both (Hopcroft & Tarjan 1973). Edges from a tag to itself are blocks of their own.
 */
export function blocksOf(edges: readonly Edge[]): readonly number[] {
  const around = new Map<string, number[]>();
  const blocks = new Array<number>(edges.length).fill(-1);
  let count = 0;
  edges.forEach(({ a, b }, k) => {
    if (a === b) {
      blocks[k] = count++;
      return;
    }
    around.set(a, [...(around.get(a) ?? []), k]);
    around.set(b, [...(around.get(b) ?? []), k]);
  });
  const depth = new Map<string, number>();
  const open: number[] = [];
  const visit = (tag: string, from: number, level: number): number => {
    depth.set(tag, level);
    let lowest = level;
    for (const k of around.get(tag)!) {
      if (k === from) continue;
      const other = edges[k]!.a === tag ? edges[k]!.b : edges[k]!.a;
      const known = depth.get(other);
      if (known !== undefined) {
        if (known < level) {
          open.push(k);
          lowest = Math.min(lowest, known);
        }
        continue;
      }
      open.push(k);
      const low = visit(other, k, level + 1);
      lowest = Math.min(lowest, low);
      if (low >= level) {
        const block = count++;
        for (let edge = -1; edge !== k;) {
          edge = open.pop()!;
          blocks[edge] = block;
        }
      }
    }
    return lowest;
  };
  for (const tag of around.keys()) if (!depth.has(tag)) visit(tag, -1, 0);
  return blocks;
}
