import {
  foreignKey,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';
import type { Fault } from '../../../../shared/circuit';
import { circuitRevision } from './circuits';
import { organisation } from './organisation';
import { organisationId, organisationOnly } from './policy';

export const site = pgTable(
  'site',
  {
    organisationId: organisationId(),
    id: uuid().notNull(),
    name: text().notNull(),
    address: text().notNull(),
    version: integer().notNull().default(1),
  },
  (table) => [
    primaryKey({ columns: [table.organisationId, table.id] }),
    foreignKey({ columns: [table.organisationId], foreignColumns: [organisation.organisationId] }),
    organisationOnly(),
  ],
);

export const lift = pgTable(
  'lift',
  {
    organisationId: organisationId(),
    id: uuid().notNull(),
    siteId: uuid().notNull(),
    name: text().notNull(),
    /** Seven letters and digits in the machine room; unique within the organisation. */
    label: text().notNull(),
    maker: text().notNull(),
    controller: text().notNull(),
    /** From the lowest upwards. */
    landings: jsonb().$type<string[]>().notNull(),
    hazards: jsonb().$type<string[]>().notNull(),
    notes: text().notNull().default(''),
    circuitId: uuid(),
    circuitRevision: integer(),
    /** The hidden faults of a demo lift; null on a real one. */
    practiceFaults: jsonb().$type<Fault[]>(),
    version: integer().notNull().default(1),
  },
  (table) => [
    primaryKey({ columns: [table.organisationId, table.id] }),
    unique('lift_label').on(table.organisationId, table.label),
    foreignKey({
      columns: [table.organisationId, table.siteId],
      foreignColumns: [site.organisationId, site.id],
    }),
    foreignKey({
      columns: [table.organisationId, table.circuitId, table.circuitRevision],
      foreignColumns: [
        circuitRevision.organisationId,
        circuitRevision.circuitId,
        circuitRevision.revision,
      ],
    }),
    organisationOnly(),
  ],
);
