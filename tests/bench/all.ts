import { readdirSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';

// `npm run bench`: every figure of this folder, one after the other, so that none disturbs another.
const folder = dirname(fileURLToPath(import.meta.url));
for (const name of readdirSync(folder)
  .filter((file) => file.endsWith('.bench.ts'))
  .sort()) {
  process.stdout.write(`\n${name}\n`);
  await import(pathToFileURL(join(folder, name)).href);
}
