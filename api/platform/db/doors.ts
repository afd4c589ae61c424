import { AsyncLocalStorage } from 'node:async_hooks';
import { sql, type ExtractTablesWithRelations } from 'drizzle-orm';
import { drizzle, type NodePgDatabase, type NodePgQueryResultHKT } from 'drizzle-orm/node-postgres';
import type { PgTransaction } from 'drizzle-orm/pg-core';
import pg from 'pg';
import * as schema from './schema';

type Schema = typeof schema;
/** A running transaction. Only repositories (and seeds) put statements to it. */
export type Transaction = PgTransaction<
  NodePgQueryResultHKT,
  Schema,
  ExtractTablesWithRelations<Schema>
>;

/**
 * What a repository takes as its first argument: a transaction that sees the rows of one organisation.
 * Predicates name `organisationId` all the same: row security is the second wall, not the first.
 */
export interface InOrganisation {
  readonly organisationId: string;
  /** Who acts. */
  readonly personId: string;
  readonly db: Transaction;
}

/** The door of those who are not signed in yet: only the functions of the schema `door`. */
export interface BeforeSignIn {
  readonly db: Pick<Transaction, 'execute'>;
}

/** Migrations, seeds and roles; sees every organisation. Never opened to serve a request. */
export interface AsOwner {
  readonly db: Transaction;
}

/** The only ways to a handle. Each runs `work` in one transaction; a throw rolls back. */
export interface Database {
  inOrganisation<T>(
    organisationId: string,
    personId: string,
    work: (inside: InOrganisation) => Promise<T>,
  ): Promise<T>;
  beforeSignIn<T>(work: (door: BeforeSignIn) => Promise<T>): Promise<T>;
  close(): Promise<void>;
}

/** The id of the request that runs; it goes to PostgreSQL as the name of the transaction's client. */
export const requestId = new AsyncLocalStorage<string>();

/** Connections of one API process. PostgreSQL's default of 100 serves several processes. */
const MOST_CONNECTIONS = 12;
/** How long a request waits for a connection before it fails as *unavailable*, milliseconds. */
const CONNECTION_WAIT = 5_000;
/** No statement of a request may run longer, milliseconds. */
const STATEMENT_LIMIT = 15_000;

function poolOf(url: string, onError: (error: Error) => void): pg.Pool {
  const pool = new pg.Pool({
    connectionString: url,
    max: MOST_CONNECTIONS,
    connectionTimeoutMillis: CONNECTION_WAIT,
    statement_timeout: STATEMENT_LIMIT,
    idle_in_transaction_session_timeout: STATEMENT_LIMIT,
    application_name: 'lampline',
  });
  // An idle connection that breaks (the server restarts) is replaced at the next use.
  pool.on('error', onError);
  return pool;
}

const open = (pool: pg.Pool): NodePgDatabase<Schema> =>
  drizzle(pool, { schema, casing: 'snake_case' });

/** @param url of the application's role */
export function openDatabase(
  url: string,
  onIdleError: (error: Error) => void = () => undefined,
): Database {
  const pool = poolOf(url, onIdleError);
  const db = open(pool);
  return {
    inOrganisation: (organisationId, personId, work) =>
      db.transaction(async (transaction) => {
        // Local to the transaction: pgbouncer may give the connection to another one afterwards.
        await transaction.execute(
          sql`select set_config('app.organisation_id', ${organisationId}, true),
                     set_config('app.person_id', ${personId}, true),
                     set_config('application_name', ${`lampline ${requestId.getStore() ?? ''}`}, true)`,
        );
        return work({ organisationId, personId, db: transaction });
      }),
    beforeSignIn: (work) => db.transaction((transaction) => work({ db: transaction })),
    close: () => pool.end(),
  };
}

/**
 * Opens the owner's door once, for one piece of work in one transaction.
 * @param ownerUrl of a role that owns the tables and may bypass row security
 */
export async function asOwner<T>(
  ownerUrl: string,
  work: (owner: AsOwner) => Promise<T>,
): Promise<T> {
  const pool = new pg.Pool({
    connectionString: ownerUrl,
    max: 1,
    application_name: 'lampline owner',
  });
  try {
    return await open(pool).transaction((transaction) => work({ db: transaction }));
  } finally {
    await pool.end();
  }
}
