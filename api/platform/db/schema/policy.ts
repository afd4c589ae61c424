import { sql } from 'drizzle-orm';
import { pgPolicy, pgRole, uuid } from 'drizzle-orm/pg-core';

/** The role that the application signs in with. It owns nothing and cannot bypass row security. */
export const applicationRole = pgRole('lampline_app').existing();

/** First column of every table, and of every one of its keys. */
export const organisationId = () => uuid().notNull();

const ofThisOrganisation = sql`organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid`;

/**
 * The wall of every table that has an organisation. After a local setting ends it is `''`, not null:
 * hence `nullif`, so that a connection outside the door sees no row instead of failing.
 */
export const organisationOnly = () =>
  pgPolicy('organisation_only', {
    as: 'permissive',
    for: 'all',
    to: applicationRole,
    using: ofThisOrganisation,
    withCheck: ofThisOrganisation,
  });
