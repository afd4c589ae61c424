import { sql } from 'drizzle-orm';
import {
  boolean,
  foreignKey,
  integer,
  pgTable,
  primaryKey,
  text,
  timestamp,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';
import type { Role } from '../../../../shared/contract';
import { organisation } from './organisation';
import { organisationId, organisationOnly } from './policy';

/** The pseudonym that events and the audit carry; never erased. */
export const person = pgTable(
  'person',
  {
    organisationId: organisationId(),
    id: uuid().notNull(),
    role: text().$type<Role>().notNull(),
    disabled: boolean().notNull().default(false),
    version: integer().notNull().default(1),
    createdAt: timestamp({ withTimezone: true }).notNull().defaultNow(),
  },
  (table) => [
    primaryKey({ columns: [table.organisationId, table.id] }),
    foreignKey({ columns: [table.organisationId], foreignColumns: [organisation.organisationId] }),
    organisationOnly(),
  ],
);

/** What can be erased without breaking the log: one row beside the person, or none. */
export const personDetails = pgTable(
  'person_details',
  {
    organisationId: organisationId(),
    personId: uuid().notNull(),
    name: text().notNull(),
    /** Unique over all organisations: a person belongs to one. As typed; compared in lower case. */
    email: text().notNull(),
    /** argon2id in its encoded form. */
    passwordHash: text().notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.organisationId, table.personId] }),
    foreignKey({
      columns: [table.organisationId, table.personId],
      foreignColumns: [person.organisationId, person.id],
    }),
    uniqueIndex('person_details_email_everywhere').on(sql`lower(${table.email})`),
    organisationOnly(),
  ],
);
