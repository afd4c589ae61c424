import {
  bigint,
  foreignKey,
  index,
  jsonb,
  pgTable,
  primaryKey,
  text,
  timestamp,
  uuid,
} from 'drizzle-orm/pg-core';
import { organisation } from './organisation';
import { person } from './people';
import { organisationId, organisationOnly } from './policy';
import { digest } from './sessions';

/** Answers of writes that are no events, by the key that the client sent with them. */
export const idempotency = pgTable(
  'idempotency',
  {
    organisationId: organisationId(),
    personId: uuid().notNull(),
    key: text().notNull(),
    /** SHA-256 of method, path, version and body. */
    requestDigest: digest().notNull(),
    /** Null while the first request runs; its transaction holds the row locked until then. */
    answer: jsonb(),
    createdAt: timestamp({ withTimezone: true }).notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.organisationId, table.personId, table.key] }),
    foreignKey({
      columns: [table.organisationId, table.personId],
      foreignColumns: [person.organisationId, person.id],
    }),
    index('idempotency_by_age').on(table.organisationId, table.createdAt),
    organisationOnly(),
  ],
);

/** Who did what, when and with which outcome; a hash chain per organisation. Append-only. */
export const audit = pgTable(
  'audit',
  {
    organisationId: organisationId(),
    /** 1, 2, 3 … without gaps. */
    position: bigint({ mode: 'number' }).notNull(),
    at: timestamp({ withTimezone: true }).notNull(),
    actor: uuid().notNull(),
    action: text().notNull(),
    /** Kind and id of what it was done to. */
    subject: text().notNull(),
    outcome: text().notNull(),
    previousHash: digest().notNull(),
    hash: digest().notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.organisationId, table.position] }),
    foreignKey({
      columns: [table.organisationId, table.actor],
      foreignColumns: [person.organisationId, person.id],
    }),
    organisationOnly(),
  ],
);

/** Last link of the audit chain; locked last of all. */
export const auditHead = pgTable(
  'audit_head',
  {
    organisationId: organisationId(),
    position: bigint({ mode: 'number' }).notNull().default(0),
    hash: digest().notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.organisationId] }),
    foreignKey({ columns: [table.organisationId], foreignColumns: [organisation.organisationId] }),
    organisationOnly(),
  ],
);
