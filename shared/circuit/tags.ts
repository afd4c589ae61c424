import type { Part } from './circuit';

/** Every tag that a part names, in the order in which its kind lists them. */
export function tagsOf(part: Part): readonly string[] {
  return part.kind === 'transformer' ? [...part.primary, ...part.secondary] : part.between;
}
