import type { Circuit, Part, StringLine } from './circuit';
import { PART_KINDS } from './partKinds';

/** The place whose terminals divide a string into sections. */
export const CONTROLLER = 'controller';

/** Steps of the search for a string's path before the longest way found so far is taken. */
const MAX_STEPS = 20_000;

/** From one tag of a string to the next: the part, or parts side by side, that join them. */
export interface StringStep {
  readonly from: string;
  readonly to: string;
  readonly parts: readonly string[];
}

/** Neighbouring tags that can be reached at one place, and the parts between, in the order wired. */
export interface Section {
  readonly from: string;
  readonly to: string;
  readonly parts: readonly string[];
  /** All tags from `from` to `to`. */
  readonly tags: readonly string[];
}

/**
 * A string's steps from its first terminal to its last, through parts that carry its current. Where
 * several ways lead there the longest is the string, since a bypass has fewer devices than what it
 * bypasses. Empty where there is none. Derived from the parts each time, never stored.
 */
export function stringSteps(circuit: Circuit, line: StringLine): readonly StringStep[] {
  const joined = new Map<string, Map<string, string[]>>();
  const join = (from: string, to: string, part: string) => {
    const around = joined.get(from) ?? new Map<string, string[]>();
    around.set(to, [...(around.get(to) ?? []), part]);
    joined.set(from, around);
  };
  for (const part of circuit.parts) {
    const ends = seriesEnds(part);
    if (!ends) continue;
    join(ends[0], ends[1], part.name);
    join(ends[1], ends[0], part.name);
  }
  const tags = longestWay(line.from, line.to, (tag) => [...(joined.get(tag)?.keys() ?? [])]);
  return tags.slice(1).map((to, k) => {
    const from = tags[k]!;
    return { from, to, parts: joined.get(from)!.get(to)! };
  });
}

/** The string's tags in the order wired, first and last included. */
export function stringTags(circuit: Circuit, line: StringLine): readonly string[] {
  const steps = stringSteps(circuit, line);
  return steps.length === 0 ? [] : [steps[0]!.from, ...steps.map(({ to }) => to)];
}

/**
 * A string's sections between the tags reached at a place; without a place, between all its tags that
 * can be reached at all. The string's first and last tag always bound a section.
 */
export function sectionsOf(
  circuit: Circuit,
  line: StringLine,
  place = CONTROLLER,
): readonly Section[] {
  const bounds = new Set(
    circuit.terminals
      .filter(({ reachable, places }) => reachable && places.includes(place))
      .map(({ tag }) => tag),
  );
  return grouped(stringSteps(circuit, line), bounds);
}

/** Sections between all tags that can be reached anywhere: as fine as readings can tell. */
export function finestSections(circuit: Circuit, line: StringLine): readonly Section[] {
  const bounds = new Set(
    circuit.terminals
      .filter(({ reachable, places }) => reachable && places.length > 0)
      .map(({ tag }) => tag),
  );
  return grouped(stringSteps(circuit, line), bounds);
}

function grouped(steps: readonly StringStep[], bounds: ReadonlySet<string>): readonly Section[] {
  const sections: Section[] = [];
  let tags: string[] = [];
  let parts: string[] = [];
  steps.forEach((step, k) => {
    if (tags.length === 0) tags.push(step.from);
    tags.push(step.to);
    parts.push(...step.parts);
    if (bounds.has(step.to) || k === steps.length - 1) {
      sections.push({ from: tags[0]!, to: step.to, parts, tags });
      tags = [];
      parts = [];
    }
  });
  return sections;
}

function seriesEnds(part: Part): readonly [string, string] | undefined {
  if (!PART_KINDS[part.kind].series || part.kind === 'transformer' || part.kind === 'bridge') {
    return undefined;
  }
  return part.between;
}

function longestWay(
  from: string,
  to: string,
  around: (tag: string) => readonly string[],
): readonly string[] {
  let best: readonly string[] = [];
  let steps = 0;
  const way: string[] = [from];
  const onWay = new Set(way);
  const go = (tag: string): void => {
    if (tag === to) {
      if (way.length > best.length) best = [...way];
      return;
    }
    for (const next of around(tag)) {
      if (onWay.has(next) || ++steps > MAX_STEPS) continue;
      way.push(next);
      onWay.add(next);
      go(next);
      onWay.delete(next);
      way.pop();
    }
  };
  if (from !== to) go(from);
  return best;
}
