import { spawnSync } from 'node:child_process';
import { existsSync, mkdirSync, writeFileSync } from 'node:fs';
import { findPrograms } from './postgresPrograms';

/** A program that npm can't bring: how to see that it is there, and Debian's package of it. */
interface FromDebian {
  readonly name: string;
  readonly package: string;
  readonly isThere: () => boolean;
}

const folders = (process.env['PATH'] ?? '').split(':').concat('/usr/bin', '/usr/local/bin');
const onPath = (program: string) => folders.some((folder) => existsSync(`${folder}/${program}`));

export const postgresql: FromDebian = {
  name: 'PostgreSQL',
  package: 'postgresql',
  isThere: () => findPrograms() !== undefined,
};
export const chromium: FromDebian = {
  name: 'Chromium',
  package: 'chromium',
  isThere: () => onPath('chromium'),
};
export const ngspice: FromDebian = {
  name: 'ngspice',
  package: 'ngspice',
  isThere: () => onPath('ngspice'),
};

/**
 * Brings what is missing: as root by apt-get, else it says the one command to run.
 * @throws Error with that sentence
 */
export function bring(...wanted: readonly FromDebian[]): void {
  const missing = wanted.filter(({ isThere }) => !isThere());
  if (missing.length === 0) return;
  const names = missing.map(({ name }) => name).join(' and ');
  const packages = missing.map((one) => one.package);
  const install = ['install', '-y', '--no-install-recommends', ...packages];
  if (process.getuid?.() !== 0) {
    throw new Error(
      `${names} is missing. Run once, then start again: sudo apt-get ${install.join(' ')}`,
    );
  }
  process.stdout.write(`Installing ${names} from Debian's packages …\n`);
  if (packages.includes(postgresql.package)) keepDebianFromStartingOne();
  apt(['update']);
  apt(install);
  const still = missing.filter(({ isThere }) => !isThere());
  if (still.length > 0) {
    throw new Error(`apt-get ran, but ${still.map(({ name }) => name).join(' and ')} is missing.`);
  }
}

function apt(words: readonly string[]): void {
  const { status, stderr } = spawnSync('apt-get', ['-q', ...words], {
    env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' },
    stdio: ['ignore', 'ignore', 'pipe'],
    encoding: 'utf8',
  });
  if (status !== 0) throw new Error(`apt-get ${words.join(' ')} did not succeed:\n${stderr}`);
}

/** Debian's package makes and starts a cluster of its own; nobody asked for that one. */
function keepDebianFromStartingOne(): void {
  const folder = '/etc/postgresql-common/createcluster.d';
  const file = `${folder}/lampline.conf`;
  if (existsSync('/etc/postgresql-common/createcluster.conf') || existsSync(file)) return;
  mkdirSync(folder, { recursive: true });
  writeFileSync(file, 'create_main_cluster = false\n');
}
