import type { CaseState, FoldedEvent } from './caseState';
import { readEvent, type KnownEvent } from './event';
import { handlers } from './handlers';

/** Event types that *undo* may withdraw: what a technician can mistake, nothing that others rely on. */
const WITHDRAWABLE: ReadonlySet<string> = new Set([
  'arrival checked',
  'reading taken',
  'relay seen',
  'device seen',
  'could not reach',
  'suggestion declined',
  'finding stated',
  'repair done',
  'device proven',
  'returned to service',
  'note written',
]);

/** A device that did not stop the lift is a danger: it is released by a supervisor, never undone. */
export const withdrawable = ({ type, payload }: Pick<FoldedEvent, 'type' | 'payload'>): boolean =>
  WITHDRAWABLE.has(type) && payload['result'] !== 'did not stop';

/**
 * A case after one more event. Pure. The first event must open the case; before it nothing folds.
 * A withdrawal folds the log anew without what it withdraws, so that step by step and all at once agree.
 */
export function applyEvent(
  state: CaseState | undefined,
  event: FoldedEvent,
): CaseState | undefined {
  if (state && event.type === 'event withdrawn') return foldCase([...state.log, event]);
  const next = step(state, event);
  return (
    next && { ...next, log: [...(state?.log ?? []), event], version: (state?.version ?? 0) + 1 }
  );
}

/** The case that its events make, in the server's order; undefined if none opens it. */
export function foldCase(events: readonly FoldedEvent[]): CaseState | undefined {
  const withdrawn = withdrawnIds(events);
  let state: CaseState | undefined;
  const log: FoldedEvent[] = [];
  for (const event of events) {
    const next = withdrawn.has(event.id) ? state : step(state, event);
    if (!next) continue;
    log.push(event);
    state = next;
  }
  return state && { ...state, log, version: log.length };
}

function withdrawnIds(events: readonly FoldedEvent[]): ReadonlySet<string> {
  const before = new Map<string, FoldedEvent>();
  const withdrawn = new Set<string>();
  for (const event of events) {
    const read = event.type === 'event withdrawn' ? readEvent(event) : undefined;
    if (read?.kind === 'known' && read.event.type === 'event withdrawn') {
      const of = before.get(read.event.payload.of);
      if (of && withdrawable(of)) withdrawn.add(of.id);
    }
    before.set(event.id, event);
  }
  return withdrawn;
}

function step(state: CaseState | undefined, event: FoldedEvent): CaseState | undefined {
  const read = readEvent(event);
  if (read.kind !== 'known') {
    return state && { ...state, unknown: [...state.unknown, event] };
  }
  const known = { ...read.event, actor: event.actor } as KnownEvent & { actor?: string };
  if (known.type === 'case opened') return state ?? opened(known);
  if (!state) return undefined;
  const changed = handlers[known.type](state, known as never);
  return {
    ...changed,
    undoable: withdrawable(event) ? [...state.undoable, known.id] : state.undoable,
  };
}

function opened(event: KnownEvent & { type: 'case opened'; actor?: string }): CaseState {
  const { liftId, circuitId, circuitRevision, complaint, practice } = event.payload;
  return {
    id: event.caseId,
    liftId,
    circuitId,
    circuitRevision,
    complaint,
    practice,
    openedAt: event.recordedAt,
    openedBy: event.actor,
    status: 'open',
    state: event.state,
    seen: [],
    unreachable: [],
    declined: [],
    acknowledged: [],
    advice: [],
    dangers: [],
    links: [],
    disturbed: [],
    people: [],
    repairs: [],
    proven: [],
    notes: [],
    reviews: [],
    unknown: [],
    undoable: [],
    version: 0,
    log: [],
  };
}
