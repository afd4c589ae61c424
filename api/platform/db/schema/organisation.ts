import { pgTable, primaryKey, text, timestamp } from 'drizzle-orm/pg-core';
import { organisationId, organisationOnly } from './policy';

export const organisation = pgTable(
  'organisation',
  {
    organisationId: organisationId(),
    name: text().notNull(),
    /** IANA name; dates are shown in it. */
    timeZone: text().notNull(),
    createdAt: timestamp({ withTimezone: true }).notNull().defaultNow(),
  },
  (table) => [primaryKey({ columns: [table.organisationId] }), organisationOnly()],
);
