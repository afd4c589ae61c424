import { createHash } from 'node:crypto';
import { and, eq, lt } from 'drizzle-orm';
import { Refusal } from '../refusal';
import type { Database, InOrganisation } from './doors';
import { idempotency } from './schema';

/** A write that may be sent again: its key, and what it was. */
export interface KeyedRequest {
  readonly key: string;
  /** SHA-256 of method, path, version and body. */
  readonly digest: Buffer;
  readonly now: Date;
}

/** Answers older than this are forgotten, milliseconds: a client gives up long before. */
const KEPT = 7 * 24 * 3600 * 1000;

export const digestOf = (parts: readonly unknown[]): Buffer =>
  createHash('sha256').update(JSON.stringify(parts)).digest();

/**
 * Does `work` once for a key and stores its answer in the same transaction; sent again, the stored answer
 * comes back. A second request that comes while the first one runs waits for it.
 *
 * @throws Refusal `key_reused` where the key was used for another request
 */
export async function answerOnce<T>(
  database: Database,
  caller: { readonly organisationId: string; readonly personId: string },
  { key, digest, now }: KeyedRequest,
  work: (org: InOrganisation) => Promise<T>,
): Promise<T> {
  const { organisationId, personId } = caller;
  return database.inOrganisation(organisationId, personId, async (org) => {
    const ofKey = and(
      eq(idempotency.organisationId, organisationId),
      eq(idempotency.personId, personId),
      eq(idempotency.key, key),
    );
    const taken = await org.db
      .insert(idempotency)
      .values({ organisationId, personId, key, requestDigest: digest, createdAt: now })
      .onConflictDoNothing()
      .returning({ key: idempotency.key });
    if (taken.length === 0) {
      // A new statement: the row was invisible to the one that waited for it.
      const [stored] = await org.db.select().from(idempotency).where(ofKey);
      if (!stored?.requestDigest.equals(digest)) throw new Refusal('key_reused');
      return stored.answer as T;
    }
    const answer = await work(org);
    await org.db.update(idempotency).set({ answer }).where(ofKey);
    await org.db
      .delete(idempotency)
      .where(
        and(
          eq(idempotency.organisationId, organisationId),
          eq(idempotency.personId, personId),
          lt(idempotency.createdAt, new Date(now.getTime() - KEPT)),
        ),
      );
    return answer;
  });
}
