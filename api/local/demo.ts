import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

/** One line of what the start prints. */
export interface PrintedAccount {
  readonly role: string;
  readonly email: string;
  readonly password: string;
}

/**
 * Loads the demo company into an empty database, once for a cluster, and keeps the accounts as they were
 * loaded beside it: a later start prints them without reading the seeds, which play whole cases with the
 * solver and take a second to load.
 */
export async function demoAccounts(
  folder: string,
  ownerUrl: string,
): Promise<readonly PrintedAccount[]> {
  const file = join(folder, 'accounts.json');
  if (existsSync(file)) return JSON.parse(readFileSync(file, 'utf8')) as PrintedAccount[];
  const { loadDemo } = await import('../../seeds/load');
  const accounts = (await loadDemo(ownerUrl)).map(({ role, email, password }) => ({
    role,
    email,
    password,
  }));
  // Written after the load has been committed: a start that is killed before loads again.
  writeFileSync(file, JSON.stringify(accounts), { mode: 0o600 });
  return accounts;
}
