import {
  applyEvent,
  foldCase,
  isReviewType,
  refusalOf,
  type CaseEvent,
  type CaseState,
  type StoredEvent,
} from '@shared/cases';
import type { EventResult, Role } from '@shared/contract';
import { appendAudit } from '../../platform/db/audit';
import type { InOrganisation } from '../../platform/db/doors';
import { saveProjection } from '../cases/projection';
import { revisionOf } from '../circuits/repository';
import { liftById } from '../lifts/repository';
import type { BatchEntry } from './readBatch';
import {
  deviceStanding,
  eventsLike,
  eventsOfCase,
  insertEvents,
  largestVersion,
  lockCase,
  setAside,
  takePositions,
} from './repository';
import { sentDigest, storedEvent } from '../../platform/db/storedEvent';

export interface RunContext {
  readonly role: Role;
  readonly device: string;
  readonly now: Date;
  readonly ids: () => string;
}

interface Accepted {
  readonly event: CaseEvent;
  readonly digest: Buffer;
}

type Verdict =
  | { readonly kind: 'accepted' }
  | { readonly kind: 'duplicate'; readonly stored: StoredEvent }
  | { readonly kind: 'rejected'; readonly code: string; readonly details: Record<string, unknown> };

/**
 * Takes one run of a batch, neighbours of one case, in one transaction. Lock order, the same everywhere:
 * case line, projections, counter, events, quarantine, audit chain last.
 * @returns one result for each entry, in order
 */
export async function storeRun(
  org: InOrganisation,
  entries: readonly BatchEntry[],
  context: RunContext,
): Promise<EventResult[]> {
  const events = entries.flatMap((entry) => (entry.kind === 'event' ? [entry.event] : []));
  const caseId = events[0]?.caseId;
  if (caseId !== undefined) await lockCase(org, caseId);
  const known = await eventsLike(org, context.device, events);
  const standing = await deviceStanding(org, context.device);
  const before = caseId === undefined ? [] : await eventsOfCase(org, caseId);
  let state = foldCase(before);
  let largest = standing?.sequence ?? 0;
  const accepted: Accepted[] = [];
  const verdicts: Verdict[] = [];

  for (const entry of entries) {
    if (entry.kind === 'refused') {
      verdicts.push({ kind: 'rejected', code: entry.code, details: {} });
      continue;
    }
    const { event } = entry;
    const digest = sentDigest(event);
    const verdict =
      foreignDevice(org, standing) ??
      seenBefore(event, digest, known, accepted) ??
      behind(event, largest) ??
      (await refusedByRules(org, state, event, context.role));
    verdicts.push(verdict ?? { kind: 'accepted' });
    if (verdict) continue;
    accepted.push({ event, digest });
    largest = event.sequence;
    state = applyEvent(state, { ...event, actor: org.personId });
  }

  const stored = await write(org, state, accepted, context);
  await keepRefused(org, entries, verdicts, context);
  await auditReviews(org, accepted, context.now);
  return verdicts.map((verdict, k) => resultOf(entries[k]!, verdict, stored));
}

function foreignDevice(
  org: InOrganisation,
  standing: { readonly actor: string } | undefined,
): Verdict | undefined {
  const foreign = standing !== undefined && standing.actor !== org.personId;
  return foreign ? { kind: 'rejected', code: 'device-not-yours', details: {} } : undefined;
}

/** A re-send is a duplicate only if it is the same by content. */
function seenBefore(
  event: CaseEvent,
  digest: Buffer,
  known: Awaited<ReturnType<typeof eventsLike>>,
  accepted: readonly Accepted[],
): Verdict | undefined {
  const byId = known.find(({ id }) => id === event.id);
  if (byId) {
    return byId.sentDigest.equals(digest)
      ? { kind: 'duplicate', stored: storedEvent(byId) }
      : { kind: 'rejected', code: 'id-reuse', details: {} };
  }
  if (accepted.some((each) => each.event.id === event.id)) {
    return { kind: 'rejected', code: 'id-reuse', details: {} };
  }
  const sameNumber = ({ device, sequence }: { device: string; sequence: number }) =>
    device === event.device && sequence === event.sequence;
  const taken = known.some(sameNumber) || accepted.some((each) => sameNumber(each.event));
  return taken ? { kind: 'rejected', code: 'sequence-reuse', details: {} } : undefined;
}

/** L3: what a device made before may not come after. */
function behind(event: CaseEvent, largest: number): Verdict | undefined {
  return event.sequence <= largest
    ? { kind: 'rejected', code: 'sequence-behind', details: { largest } }
    : undefined;
}

async function refusedByRules(
  org: InOrganisation,
  state: CaseState | undefined,
  event: CaseEvent,
  role: Role,
): Promise<Verdict | undefined> {
  const refusal = refusalOf(state, { ...event, actor: org.personId }, { role });
  if (refusal) return { kind: 'rejected', code: refusal.code, details: { ...refusal.details } };
  if (event.type !== 'case opened') return undefined;
  const { liftId, circuitId, circuitRevision } = event.payload as {
    liftId: string;
    circuitId: string;
    circuitRevision: number;
  };
  if (!(await liftById(org, liftId)))
    return { kind: 'rejected', code: 'unknown-lift', details: {} };
  return (await revisionOf(org, circuitId, circuitRevision))
    ? undefined
    : { kind: 'rejected', code: 'unknown-circuit', details: {} };
}

async function write(
  org: InOrganisation,
  state: CaseState | undefined,
  accepted: readonly Accepted[],
  { now }: RunContext,
): Promise<ReadonlyMap<string, StoredEvent>> {
  if (accepted.length === 0 || !state) return new Map();
  const version = await largestVersion(org, state.id);
  await saveProjection(org, state);
  const position = await takePositions(org, accepted.length);
  const rows = accepted.map(({ event, digest }, k) => ({
    ...event,
    actor: org.personId,
    receivedAt: now,
    clockOffsetSeconds: (Date.parse(event.recordedAt) - now.getTime()) / 1000,
    caseVersion: version + k + 1,
    position: position + k + 1,
    sentDigest: digest,
  }));
  await insertEvents(org, rows);
  const { organisationId } = org;
  return new Map(rows.map((row) => [row.id, storedEvent({ ...row, organisationId })]));
}

async function keepRefused(
  org: InOrganisation,
  entries: readonly BatchEntry[],
  verdicts: readonly Verdict[],
  { device, now, ids }: RunContext,
): Promise<void> {
  for (const [k, verdict] of verdicts.entries()) {
    if (verdict.kind !== 'rejected') continue;
    const entry = entries[k]!;
    await setAside(org, {
      id: ids(),
      eventId: entry.kind === 'event' ? entry.event.id : entry.id,
      device,
      code: verdict.code,
      details: verdict.details,
      event: entry.sent ?? null,
      sentDigest: sentDigest(entry.sent),
      receivedAt: now,
    });
  }
}

async function auditReviews(
  org: InOrganisation,
  accepted: readonly Accepted[],
  at: Date,
): Promise<void> {
  for (const { event } of accepted) {
    if (!isReviewType(event.type)) continue;
    const subject = `case ${event.caseId}`;
    await appendAudit(org, { action: event.type, subject, outcome: 'done', at });
  }
}

function resultOf(
  entry: BatchEntry,
  verdict: Verdict,
  stored: ReadonlyMap<string, StoredEvent>,
): EventResult {
  const id = entry.kind === 'event' ? entry.event.id : entry.id;
  switch (verdict.kind) {
    case 'accepted':
      return { id, outcome: 'accepted', stored: stored.get(id!) };
    case 'duplicate':
      return { id, outcome: 'duplicate', stored: verdict.stored };
    case 'rejected':
      return { id, outcome: 'rejected', code: verdict.code, details: verdict.details };
  }
}
