import { createHash } from 'node:crypto';
import { asc, eq } from 'drizzle-orm';
import type { InOrganisation } from './doors';
import { audit, auditHead } from './schema';

/** Who did what, with which outcome. No bodies, no tokens, no names: ids and codes. */
export interface AuditEntry {
  readonly action: string;
  /** Kind and id, as `person 0190…`. */
  readonly subject: string;
  readonly outcome: string;
  readonly at: Date;
}

/**
 * Adds a link to the organisation's chain. Last statement of a transaction, always: it locks the chain's
 * head until the commit.
 */
export async function appendAudit(
  { db, organisationId, personId }: InOrganisation,
  entry: AuditEntry,
): Promise<void> {
  const [head] = await db
    .select()
    .from(auditHead)
    .where(eq(auditHead.organisationId, organisationId))
    .for('update');
  if (!head) throw new Error(`Organisation ${organisationId} has no audit chain.`);
  const link = { ...entry, actor: personId, position: head.position + 1 };
  const hash = hashOf(head.hash, link);
  await db.insert(audit).values({ organisationId, ...link, previousHash: head.hash, hash });
  await db
    .update(auditHead)
    .set({ position: link.position, hash })
    .where(eq(auditHead.organisationId, organisationId));
}

/** Position of the first link that does not follow from the one before; undefined for a whole chain. */
export async function firstBrokenLink(org: InOrganisation): Promise<number | undefined> {
  const { db, organisationId } = org;
  const links = await db
    .select()
    .from(audit)
    .where(eq(audit.organisationId, organisationId))
    .orderBy(asc(audit.position));
  let previous: Buffer = Buffer.alloc(32);
  for (const [index, link] of links.entries()) {
    const follows =
      link.position === index + 1 &&
      link.previousHash.equals(previous) &&
      link.hash.equals(hashOf(previous, link));
    if (!follows) return index + 1;
    previous = link.hash;
  }
  const [head] = await db
    .select()
    .from(auditHead)
    .where(eq(auditHead.organisationId, organisationId));
  const whole = head?.position === links.length && head.hash.equals(previous);
  return whole ? undefined : links.length + 1;
}

type Link = AuditEntry & { readonly actor: string; readonly position: number };

function hashOf(previous: Buffer, { position, at, actor, action, subject, outcome }: Link): Buffer {
  return createHash('sha256')
    .update(previous)
    .update(JSON.stringify([position, at.toISOString(), actor, action, subject, outcome]))
    .digest();
}
