import {
  customType,
  foreignKey,
  index,
  pgTable,
  primaryKey,
  text,
  timestamp,
  uuid,
} from 'drizzle-orm/pg-core';
import { person } from './people';
import { organisationId, organisationOnly } from './policy';

/** A SHA-256, 32 bytes. */
export const digest = customType<{ data: Buffer; driverData: Buffer }>({
  dataType: () => 'bytea',
});

/** One sign-in on one device: the family of all refresh tokens that follow from it. */
export const session = pgTable(
  'session',
  {
    organisationId: organisationId(),
    id: uuid().notNull(),
    personId: uuid().notNull(),
    startedAt: timestamp({ withTimezone: true }).notNull(),
    /** Last time that a token was taken; an idle family ends. */
    refreshedAt: timestamp({ withTimezone: true }).notNull(),
    endedAt: timestamp({ withTimezone: true }),
    endedBecause: text().$type<'signed out' | 'reuse' | 'disabled'>(),
  },
  (table) => [
    primaryKey({ columns: [table.organisationId, table.id] }),
    foreignKey({
      columns: [table.organisationId, table.personId],
      foreignColumns: [person.organisationId, person.id],
    }),
    index('session_by_person').on(table.organisationId, table.personId),
    organisationOnly(),
  ],
);

/** Refresh tokens by their digest only. A used one names no successor: that is derived again. */
export const refreshToken = pgTable(
  'refresh_token',
  {
    organisationId: organisationId(),
    digest: digest().notNull(),
    sessionId: uuid().notNull(),
    issuedAt: timestamp({ withTimezone: true }).notNull(),
    usedAt: timestamp({ withTimezone: true }),
  },
  (table) => [
    primaryKey({ columns: [table.organisationId, table.digest] }),
    foreignKey({
      columns: [table.organisationId, table.sessionId],
      foreignColumns: [session.organisationId, session.id],
    }).onDelete('cascade'),
    index('refresh_token_by_session').on(table.organisationId, table.sessionId),
    organisationOnly(),
  ],
);
