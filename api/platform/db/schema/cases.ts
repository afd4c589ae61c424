import {
  boolean,
  doublePrecision,
  foreignKey,
  index,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  timestamp,
  uuid,
} from 'drizzle-orm/pg-core';
import type { CaseStatus, OutcomeOfCase } from '../../../../shared/cases';
import type { Weakness } from '../../../../shared/contract';
import { lift } from './lifts';
import { person } from './people';
import { organisationId, organisationOnly } from './policy';

/** One line per case, folded from its events: can be dropped and rebuilt at any time. */
export const caseRow = pgTable(
  'case_row',
  {
    organisationId: organisationId(),
    id: uuid().notNull(),
    liftId: uuid().notNull(),
    circuitId: uuid().notNull(),
    circuitRevision: integer().notNull(),
    status: text().$type<CaseStatus>().notNull(),
    complaint: text().notNull(),
    device: text(),
    cause: text(),
    outcome: text().$type<OutcomeOfCase>(),
    practice: boolean().notNull(),
    openedAt: timestamp({ withTimezone: true }).notNull(),
    closedAt: timestamp({ withTimezone: true }),
    openedBy: uuid().notNull(),
    readings: integer().notNull(),
    dangers: integer().notNull(),
    weaknesses: jsonb().$type<Weakness[]>().notNull(),
    /** Larger is reviewed first. */
    risk: doublePrecision().notNull(),
    /** Number of events folded in. */
    version: integer().notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.organisationId, table.id] }),
    foreignKey({
      columns: [table.organisationId, table.liftId],
      foreignColumns: [lift.organisationId, lift.id],
    }),
    foreignKey({
      columns: [table.organisationId, table.openedBy],
      foreignColumns: [person.organisationId, person.id],
    }),
    index('case_row_by_lift').on(table.organisationId, table.liftId, table.openedAt),
    index('case_row_by_status').on(table.organisationId, table.status, table.openedAt),
    organisationOnly(),
  ],
);
