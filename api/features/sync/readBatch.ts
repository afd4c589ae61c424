import { caseEventSchema, MOST_EVENT_BYTES, type CaseEvent } from '@shared/cases';

/** One entry of a batch: an event that can be read, or why it can't. */
export type BatchEntry =
  | { readonly kind: 'event'; readonly event: CaseEvent; readonly sent: unknown }
  | {
      readonly kind: 'refused';
      readonly id: string | null;
      readonly code: 'envelope-invalid' | 'event-too-large' | 'device-not-yours';
      readonly sent: unknown;
    };

const idOf = (sent: unknown): string | null => {
  const id = (sent as { id?: unknown } | null | undefined)?.id;
  return typeof id === 'string' && id.length <= 80 ? id : null;
};

/** Reads each entry by itself: a bad one delays nothing else. */
export function readBatch(device: string, events: readonly unknown[]): readonly BatchEntry[] {
  return events.map((sent): BatchEntry => {
    const refused = (code: Extract<BatchEntry, { kind: 'refused' }>['code']): BatchEntry => ({
      kind: 'refused',
      id: idOf(sent),
      code,
      sent,
    });
    if (Buffer.byteLength(JSON.stringify(sent) ?? '') > MOST_EVENT_BYTES) {
      return refused('event-too-large');
    }
    const parsed = caseEventSchema.safeParse(sent);
    if (!parsed.success) return refused('envelope-invalid');
    if (parsed.data.device !== device) return refused('device-not-yours');
    return { kind: 'event', event: parsed.data, sent };
  });
}

/** Neighbours of one case, in the device's order: each run is one transaction. */
export function runsOf(entries: readonly BatchEntry[]): readonly (readonly BatchEntry[])[] {
  const runs: BatchEntry[][] = [];
  let caseId: string | undefined;
  for (const entry of entries) {
    const own = entry.kind === 'event' ? entry.event.caseId : caseId;
    if (runs.length === 0 || own !== caseId) runs.push([]);
    runs.at(-1)!.push(entry);
    caseId = own;
  }
  return runs;
}
