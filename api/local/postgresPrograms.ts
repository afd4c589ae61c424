import { execFileSync } from 'node:child_process';
import { existsSync, readdirSync } from 'node:fs';
import { join } from 'node:path';

/** Where Debian puts PostgreSQL's server programs, one folder a version. */
const DEBIAN_VERSIONS = '/usr/lib/postgresql';
/** The design was tried on 15; older ones lack what the migrations use. */
const OLDEST_VERSION = 15;

/** Folder with `initdb` and `postgres`, the newest that fits; undefined where there is none. */
export function findPrograms(): string | undefined {
  const versions = existsSync(DEBIAN_VERSIONS) ? readdirSync(DEBIAN_VERSIONS).map(Number) : [];
  const newest = versions
    .filter((version) => version >= OLDEST_VERSION)
    .sort((a, b) => b - a)
    .map((version) => join(DEBIAN_VERSIONS, String(version), 'bin'))
    .find((folder) => existsSync(join(folder, 'initdb')) && existsSync(join(folder, 'postgres')));
  return newest ?? onPath();
}

function onPath(): string | undefined {
  try {
    const folder = execFileSync('pg_config', ['--bindir'], {
      encoding: 'utf8',
      stdio: ['ignore', 'pipe', 'ignore'],
    }).trim();
    return existsSync(join(folder, 'initdb')) ? folder : undefined;
  } catch {
    return undefined;
  }
}
