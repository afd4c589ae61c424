import type { CaseState } from '@shared/cases';

/** What a touch on *undo* beside the pad takes back; larger steps are taken back where they were made. */
const BESIDE_THE_PAD: ReadonlySet<string> = new Set([
  'reading taken',
  'relay seen',
  'device seen',
  'could not reach',
  'suggestion declined',
]);

/** Id of the entry that *undo* beside the pad would withdraw; undefined if there is none. */
export function undoneNext(state: CaseState): string | undefined {
  const last = state.undoable.at(-1);
  const type = state.log.find(({ id }) => id === last)?.type ?? '';
  return BESIDE_THE_PAD.has(type) ? last : undefined;
}
