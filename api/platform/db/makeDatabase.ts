import pg from 'pg';

/** A server on the loopback, and the database that is wanted in it. */
export interface WantedDatabase {
  readonly port: number;
  readonly user: string;
  readonly password: string;
  readonly name: string;
}

/** A server that starts takes the connection, but not the sign-in, for a moment; milliseconds. */
const PATIENCE = 2_000;

/** Makes the database where it is missing; false while the server does not answer. */
export async function makeDatabase({
  port,
  user,
  password,
  name,
}: WantedDatabase): Promise<boolean> {
  const client = new pg.Client({
    host: '127.0.0.1',
    port,
    user,
    password,
    database: 'postgres',
    connectionTimeoutMillis: PATIENCE,
  });
  client.on('error', () => undefined);
  try {
    await client.connect();
    const there = await client.query('select from pg_database where datname = $1', [name]);
    if (there.rowCount === 0)
      await client.query(`create database ${client.escapeIdentifier(name)}`);
    return true;
  } catch {
    return false;
  } finally {
    await client.end().catch(() => undefined);
  }
}
