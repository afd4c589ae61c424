import type { CaseRefusal, CaseState, FoldedEvent } from './caseState';
import { closingNeeds } from './closingNeeds';
import { readEvent, type KnownEvent } from './event';
import { isReviewType } from './payloads';

/** Who wants to write the event. */
export interface Writer {
  readonly role: string;
}

/** What may still be added to a closed case: a word. */
const AFTER_CLOSING: ReadonlySet<string> = new Set(['note written']);
const REVIEWER = 'supervisor';
/** Their cases are the field's; an administrator looks after people and sites. */
const WRITERS: ReadonlySet<string> = new Set(['technician', 'engineer', 'supervisor']);

const refusal = (code: string, details: CaseRefusal['details'] = {}): CaseRefusal => ({
  code,
  details,
});

/**
 * Why an event may not be added to a case as it stands now; undefined if it may. The same rules on the
 * device, before it is kept, and on the server, where late events of others may have changed the case.
 */
export function refusalOf(
  state: CaseState | undefined,
  event: FoldedEvent,
  writer: Writer,
): CaseRefusal | undefined {
  const read = readEvent(event);
  if (!WRITERS.has(writer.role)) return refusal('role-not-allowed', { role: writer.role });
  if (isReviewType(event.type) && writer.role !== REVIEWER) return refusal('review-not-allowed');
  if (read.kind === 'invalid') return refusal('payload-invalid', { problems: read.problems });
  if (!state) {
    return event.type === 'case opened' ? undefined : refusal('case-unknown');
  }
  if (read.kind === 'unknown') return undefined;
  return refusalOfKnown(state, read.event);
}

function refusalOfKnown(state: CaseState, event: KnownEvent): CaseRefusal | undefined {
  if (event.type === 'case opened') return refusal('case-already-open');
  if (isReviewType(event.type)) {
    return state.status === 'closed'
      ? undefined
      : refusal('case-not-to-review', { status: state.status });
  }
  const closed = state.status === 'closed' || state.status === 'accepted';
  if (closed && !AFTER_CLOSING.has(event.type)) {
    return refusal('case-closed', { status: state.status });
  }
  switch (event.type) {
    case 'event withdrawn':
      return refusalOfWithdrawal(state, event.payload.of);
    case 'link fitted':
      if (event.payload.from === event.payload.to) {
        return refusal('link-on-one-tag', { tag: event.payload.from });
      }
      return state.links.some(({ link }) => link === event.payload.link)
        ? refusal('link-already-entered', { mark: event.payload.mark })
        : undefined;
    case 'link removed': {
      const link = state.links.find(({ link }) => link === event.payload.link);
      return link && !link.removedAt ? undefined : refusal('link-not-out');
    }
    case 'thing restored': {
      const thing = state.disturbed.find(({ thing }) => thing === event.payload.thing);
      return thing && !thing.restoredAt ? undefined : refusal('thing-not-disturbed');
    }
    case 'person left': {
      const entry = state.people.find(({ entry }) => entry === event.payload.entry);
      return entry && !entry.left ? undefined : refusal('person-not-inside');
    }
    case 'reading taken':
      return event.payload.red === event.payload.black
        ? refusal('probes-on-one-tag', { tag: event.payload.red })
        : undefined;
    case 'finding stated': {
      const { proof } = event.payload;
      const measured =
        proof.kind !== 'measured' ||
        state.seen.some(({ observation }) => observation.id === proof.reading);
      return measured ? undefined : refusal('proof-not-in-case');
    }
    case 'repair done':
      return state.finding ? undefined : refusal('repair-before-finding');
    case 'case closed': {
      const needs = closingNeeds(state, event.payload.outcome);
      return needs.length === 0
        ? undefined
        : refusal('case-not-ready', { needs: needs.map(({ code }) => code) });
    }
    default:
      return undefined;
  }
}

function refusalOfWithdrawal(state: CaseState, of: string): CaseRefusal | undefined {
  if (!state.undoable.includes(of)) return refusal('nothing-to-withdraw');
  const proof = state.finding?.proof;
  return proof?.kind === 'measured' && proof.reading === of
    ? refusal('reading-proves-finding')
    : undefined;
}
