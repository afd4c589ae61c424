import { randomBytes } from 'node:crypto';
import pg from 'pg';
import { inject } from 'vitest';

export interface FreshDatabase {
  readonly ownerUrl: string;
  readonly applicationUrl: string;
  drop(): Promise<void>;
}

/**
 * A migrated, empty database of the run's cluster: a copy of the one that was migrated at the start
 * (0.1 s), so that spec files can't disturb each other.
 */
export async function freshDatabase(): Promise<FreshDatabase> {
  const { ownerUrl, applicationUrl } = inject('cluster');
  const name = `spec_${randomBytes(6).toString('hex')}`;
  const admin = async (statement: string) => {
    const client = new pg.Client({ connectionString: at(ownerUrl, 'postgres') });
    await client.connect();
    try {
      // Two copies of one template at a time are refused: spec files take turns.
      await client.query('select pg_advisory_lock(1)');
      await client.query(statement);
    } finally {
      await client.end();
    }
  };
  await admin(`create database ${name} template lampline`);
  return {
    ownerUrl: at(ownerUrl, name),
    applicationUrl: at(applicationUrl, name),
    drop: () => admin(`drop database ${name} with (force)`),
  };
}

function at(url: string, database: string): string {
  const changed = new URL(url);
  changed.pathname = `/${database}`;
  return changed.href;
}
