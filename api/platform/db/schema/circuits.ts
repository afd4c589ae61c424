import {
  foreignKey,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  timestamp,
  uuid,
} from 'drizzle-orm/pg-core';
import type { Circuit } from '../../../../shared/circuit';
import { organisation } from './organisation';
import { organisationId, organisationOnly } from './policy';

export const circuit = pgTable(
  'circuit',
  {
    organisationId: organisationId(),
    id: uuid().notNull(),
    name: text().notNull(),
    version: integer().notNull().default(1),
  },
  (table) => [
    primaryKey({ columns: [table.organisationId, table.id] }),
    foreignKey({ columns: [table.organisationId], foreignColumns: [organisation.organisationId] }),
    organisationOnly(),
  ],
);

/** Issued once and never changed: the application's role has no UPDATE on it. */
export const circuitRevision = pgTable(
  'circuit_revision',
  {
    organisationId: organisationId(),
    circuitId: uuid().notNull(),
    revision: integer().notNull(),
    issuedAt: timestamp({ withTimezone: true }).notNull(),
    circuit: jsonb().$type<Circuit>().notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.organisationId, table.circuitId, table.revision] }),
    foreignKey({
      columns: [table.organisationId, table.circuitId],
      foreignColumns: [circuit.organisationId, circuit.id],
    }),
    organisationOnly(),
  ],
);
