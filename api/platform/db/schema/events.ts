import {
  bigint,
  doublePrecision,
  foreignKey,
  index,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  timestamp,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';
import { organisation } from './organisation';
import { person } from './people';
import { organisationId, organisationOnly } from './policy';
import { digest } from './sessions';

/** The log. Append-only in fact: the application's role may insert and select, nothing else. */
export const caseEvent = pgTable(
  'case_event',
  {
    organisationId: organisationId(),
    /** UUIDv7 made on the device. */
    id: uuid().notNull(),
    caseId: uuid().notNull(),
    device: uuid().notNull(),
    sequence: bigint({ mode: 'number' }).notNull(),
    schema: integer().notNull(),
    type: text().notNull(),
    payload: jsonb().$type<Record<string, unknown>>().notNull(),
    /** ISO 8601 exactly as the device wrote it: evidence, never order. */
    recordedAt: text().notNull(),
    state: jsonb().$type<Record<string, string>>().notNull(),
    actor: uuid().notNull(),
    receivedAt: timestamp({ withTimezone: true }).notNull(),
    clockOffsetSeconds: doublePrecision().notNull(),
    caseVersion: integer().notNull(),
    position: bigint({ mode: 'number' }).notNull(),
    /** SHA-256 of what the device sent: a re-send with another content is refused by it. */
    sentDigest: digest().notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.organisationId, table.id] }),
    unique('case_event_position').on(table.organisationId, table.position),
    unique('case_event_case_version').on(table.organisationId, table.caseId, table.caseVersion),
    unique('case_event_device_sequence').on(table.organisationId, table.device, table.sequence),
    foreignKey({
      columns: [table.organisationId, table.actor],
      foreignColumns: [person.organisationId, person.id],
    }),
    organisationOnly(),
  ],
);

/** Last position given out in an organisation. Locked last but one, and committed at once after. */
export const counter = pgTable(
  'counter',
  {
    organisationId: organisationId(),
    position: bigint({ mode: 'number' }).notNull().default(0),
  },
  (table) => [
    primaryKey({ columns: [table.organisationId] }),
    foreignKey({ columns: [table.organisationId], foreignColumns: [organisation.organisationId] }),
    organisationOnly(),
  ],
);

/** Events that the server refused, as they came. Nothing a device sent is dropped in silence. */
export const quarantine = pgTable(
  'quarantine',
  {
    organisationId: organisationId(),
    id: uuid().notNull(),
    /** The event's own id, where it had one that could be read. */
    eventId: text(),
    device: uuid().notNull(),
    personId: uuid().notNull(),
    code: text().notNull(),
    details: jsonb().$type<Record<string, unknown>>().notNull(),
    event: jsonb().notNull(),
    sentDigest: digest().notNull(),
    receivedAt: timestamp({ withTimezone: true }).notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.organisationId, table.id] }),
    /** The same refused thing sent again is kept once. */
    unique('quarantine_content').on(table.organisationId, table.device, table.sentDigest),
    foreignKey({
      columns: [table.organisationId, table.personId],
      foreignColumns: [person.organisationId, person.id],
    }),
    index('quarantine_by_time').on(table.organisationId, table.receivedAt),
    organisationOnly(),
  ],
);
