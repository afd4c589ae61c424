// The one plain script: it runs before any package exists. It brings the packages in, then hands over to
// TypeScript: `node api/local/start.mjs [file.ts [argument …]]`, by default to launch.ts beside it.
import { spawnSync } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import { dirname, join, resolve } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';

const OLDEST_NODE = [20, 19];
const clone = resolve(dirname(fileURLToPath(import.meta.url)), '../..');
process.chdir(clone);

const [major, minor] = process.versions.node.split('.').map(Number);
if (major < OLDEST_NODE[0] || (major === OLDEST_NODE[0] && minor < OLDEST_NODE[1])) {
  stop(
    `Lampline needs Node.js ${OLDEST_NODE.join('.')} or later; this is ${process.versions.node}.`,
  );
}

if (!packagesFit()) {
  process.stdout.write('Installing the packages …\n');
  const npm = spawnSync('npm', ['ci', '--no-audit', '--no-fund'], {
    stdio: ['ignore', 'inherit', 'inherit'],
  });
  if (npm.status !== 0)
    stop('npm ci did not succeed: its words are above. Start again when it can.');
}

const { register } = await import('tsx/esm/api');
register();
const entry = resolve(process.argv[2] ?? 'api/local/launch.ts');
process.argv.splice(1, 2, entry);
await import(pathToFileURL(entry).href);

/** Whether what is installed has the versions of the lock file; an npm that was killed leaves no list. */
function packagesFit() {
  const list = join(clone, 'node_modules/.package-lock.json');
  if (!existsSync(list)) return false;
  const wanted = JSON.parse(readFileSync(join(clone, 'package-lock.json'), 'utf8')).packages;
  const there = JSON.parse(readFileSync(list, 'utf8')).packages;
  return Object.entries(wanted).every(
    ([path, { version, optional, peer }]) =>
      path === '' ||
      (there[path] === undefined ? Boolean(optional || peer) : there[path].version === version),
  );
}

function stop(sentence) {
  process.stderr.write(`${sentence}\n`);
  process.exit(1);
}
