import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';

/** Specs are no part of what is built. */
const notBuilt = /\.spec\.ts$/;

function* filesIn(path: string): Generator<string> {
  const entries = readdirSync(path, { withFileTypes: true }).sort((a, b) =>
    a.name < b.name ? -1 : 1,
  );
  for (const entry of entries) {
    const below = join(path, entry.name);
    if (entry.isDirectory()) yield* filesIn(below);
    else if (entry.isFile() && !notBuilt.test(entry.name)) yield below;
  }
}

/** A digest of folders and files, names and contents: what a build was made of. */
export function digestOfSources(places: readonly string[]): string {
  const hash = createHash('sha256');
  for (const place of places) {
    if (!existsSync(place)) continue;
    const files = /\.[^/]+$/.test(place) ? [place] : filesIn(place);
    for (const file of files)
      hash.update(file).update('\0').update(readFileSync(file)).update('\0');
  }
  return hash.digest('hex').slice(0, 16);
}

/** Runs `build` unless `stamp` says that it was done from these very sources. Says whether it ran. */
export async function buildIfStale(
  stamp: string,
  digest: string,
  build: () => Promise<void>,
): Promise<boolean> {
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === digest) return false;
  await build();
  mkdirSync(dirname(stamp), { recursive: true });
  writeFileSync(stamp, digest);
  return true;
}
