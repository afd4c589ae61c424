import { doublePrecision, pgTable, text, timestamp } from 'drizzle-orm/pg-core';

/**
 * Leaky buckets of guesses. The one table without an organisation: a guessed account may not exist.
 * The application's role has no grant on it, only on the function that fills a bucket.
 */
export const throttle = pgTable('throttle', {
  /** Digest of what is counted (account, address, both, known device); no personal data. */
  bucket: text().primaryKey(),
  /** Guesses in the bucket at `filledAt`; it leaks from then on. */
  level: doublePrecision().notNull(),
  filledAt: timestamp({ withTimezone: true }).notNull(),
});
