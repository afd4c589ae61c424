import { execFileSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { chownSync, mkdirSync, readFileSync, readdirSync } from 'node:fs';
import { join } from 'node:path';

/** The account that PostgreSQL runs under; it refuses to run as root. */
export interface Account {
  readonly uid: number;
  readonly gid: number;
}

/** The clone that this process was started in; every command of package.json starts there. */
export const clone = process.cwd();

const isRoot = process.getuid?.() === 0;

/** The account to run PostgreSQL under; undefined: the one that runs this process. */
export function postgresAccount(): Account | undefined {
  if (!isRoot) return undefined;
  const line = readFileSync('/etc/passwd', 'utf8')
    .split('\n')
    .find((entry) => entry.startsWith('postgres:'));
  if (!line)
    throw new Error("PostgreSQL's account is missing: install Debian's postgresql package.");
  const [, , uid, gid] = line.split(':');
  return { uid: Number(uid), gid: Number(gid) };
}

const nameOf = (folder: string) =>
  `lampline-${createHash('sha256').update(folder).digest('hex').slice(0, 12)}`;
/** As root the cluster can't be in the clone: PostgreSQL's account may not enter the folders above it. */
const baseOf = (folder: string) => (isRoot ? '/var/tmp' : join(folder, '.local'));

/** Folder of a clone's lasting cluster, or of the throw-away one of process `pid`. */
export function clusterFolder(use: 'demo' | { readonly test: number }, of = clone): string {
  const name = use === 'demo' ? nameOf(of) : `${nameOf(of)}-test-${use.test}`;
  return join(baseOf(of), name);
}

/** Folders of throw-away clusters whose process has ended without removing them. */
export function abandonedFolders(): string[] {
  const [base, prefix] = [baseOf(clone), `${nameOf(clone)}-test-`];
  let names: string[];
  try {
    names = readdirSync(base);
  } catch {
    return [];
  }
  return names
    .filter((name) => name.startsWith(prefix) && !isAlive(Number(name.slice(prefix.length))))
    .map((name) => join(base, name));
}

/** Creates a folder that only the account may enter. */
export function ownFolder(folder: string, account: Account | undefined): void {
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  if (account) chownSync(folder, account.uid, account.gid);
}

export function isAlive(pid: number): boolean {
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return (error as NodeJS.ErrnoException).code === 'EPERM';
  }
}

/** The command line of a live process; empty when there is none. */
export function commandOf(pid: number): string {
  try {
    return readFileSync(`/proc/${pid}/cmdline`, 'utf8').replaceAll('\0', ' ');
  } catch {
    try {
      return execFileSync('ps', ['-o', 'command=', '-p', String(pid)], { encoding: 'utf8' });
    } catch {
      return '';
    }
  }
}
