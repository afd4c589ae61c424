import { applyEvent, foldCase, type CaseState, type StoredEvent } from '@shared/cases';
import type { JournalEntry } from './case-journal';
import type { OwnEvent } from './device-database';

/** One case as this phone has it: the server's log first, then what this phone has not sent. Immutable. */
export interface CaseRecord {
  readonly caseId: string;
  readonly state: CaseState | undefined;
  readonly entries: readonly JournalEntry[];
}

const ofStored = (event: StoredEvent, late: boolean): JournalEntry => ({
  id: event.id,
  type: event.type,
  recordedAt: event.recordedAt,
  kept: 'sent',
  late,
});

const ofOwn = ({ event, kept, code }: OwnEvent): JournalEntry => ({
  id: event.id,
  type: event.type,
  recordedAt: event.recordedAt,
  kept,
  code,
  late: false,
});

/**
 * @param stored events of this case in the server's order
 * @param own events of this phone that are not in the log, by sequence; refused ones are shown, not folded
 * @param actor person id of who works with this phone
 */
export function caseRecord(
  caseId: string,
  stored: readonly StoredEvent[],
  own: readonly OwnEvent[],
  actor: string,
): CaseRecord {
  const waiting = own
    .filter(({ kept }) => kept !== 'refused')
    .map(({ event }) => ({ ...event, actor }));
  let latest: StoredEvent | undefined;
  const entries = stored.map((event) => {
    const earlier = latest !== undefined && event.recordedAt < latest.recordedAt;
    const late = earlier && event.device !== latest?.device;
    if (!earlier) latest = event;
    return ofStored(event, late);
  });
  return {
    caseId,
    state: foldCase([...stored, ...waiting]),
    entries: [...entries, ...own.map(ofOwn)],
  };
}

/** The record after one more event of this phone was kept. */
export function withOwn(record: CaseRecord, own: OwnEvent, actor: string): CaseRecord {
  return {
    caseId: record.caseId,
    state: applyEvent(record.state, { ...own.event, actor }),
    entries: [...record.entries, ofOwn(own)],
  };
}
