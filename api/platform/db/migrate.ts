import { fileURLToPath } from 'node:url';
import { drizzle } from 'drizzle-orm/node-postgres';
import { migrate } from 'drizzle-orm/node-postgres/migrator';
import pg from 'pg';

/** Beside this file, in the sources and in the bundle. */
const migrationsFolder = fileURLToPath(new URL('./migrations', import.meta.url));
/** Key of the advisory lock that lets one process migrate at a time; any number, always the same. */
const MIGRATION_LOCK = 4_300_215;

/**
 * Creates the roles where they are missing, sets the application role's password to the one of its URL,
 * and brings the tables to this build's state. Safe to run by several processes at once, and again.
 *
 * @param ownerUrl role that may create roles and tables
 * @param applicationUrl its user must be `lampline_app`
 */
export async function prepareDatabase(ownerUrl: string, applicationUrl: string): Promise<void> {
  const client = new pg.Client({
    connectionString: ownerUrl,
    application_name: 'lampline migrate',
  });
  await client.connect();
  try {
    await client.query('select pg_advisory_lock($1)', [MIGRATION_LOCK]);
    await prepareRoles(client, decodeURIComponent(new URL(applicationUrl).password));
    await migrate(drizzle(client), { migrationsFolder });
  } finally {
    await client.end();
  }
}

async function prepareRoles(client: pg.Client, password: string): Promise<void> {
  await client.query(`
    do $$ begin
      if not exists (select from pg_roles where rolname = 'lampline_app') then
        create role lampline_app login nosuperuser nobypassrls nocreatedb nocreaterole;
      end if;
      if not exists (select from pg_roles where rolname = 'lampline_door') then
        create role lampline_door nologin nosuperuser nobypassrls nocreatedb nocreaterole;
      end if;
    end $$`);
  // Only a member of a role may give it functions to own.
  await client.query('grant lampline_door to current_user');
  await client.query(`alter role lampline_app password ${client.escapeLiteral(password)}`);
}
