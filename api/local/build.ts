import { spawn } from 'node:child_process';
import { cpSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { brotliCompressSync } from 'node:zlib';
import { build as bundle } from 'esbuild';
import { buildIfStale, digestOfSources } from './sources';

/** Where `ng build` puts the client; an absolute path. */
export const clientFolder = resolve('dist/client/browser');
export const apiBundle = resolve('dist/api/main.js');

const settings = ['package-lock.json', 'tsconfig.json'];
const clientSources = ['client', 'shared', 'angular.json', 'ngsw-config.json', ...settings];
const apiSources = ['api', 'shared', ...settings];

export interface Built {
  /** Stamp of this build: what health answers. */
  readonly stamp: string;
  /** What was built now, for the words on the terminal. */
  readonly rebuilt: readonly string[];
}

/** Builds client and API bundle where their sources have changed since. */
export async function buildStale(): Promise<Built> {
  const [client, api] = [digestOfSources(clientSources), digestOfSources(apiSources)];
  const [builtClient, builtApi] = await Promise.all([
    buildIfStale('dist/client/.sources', client, buildClient),
    buildIfStale('dist/api/.sources', api, buildApi),
  ]);
  const rebuilt = [...(builtClient ? ['client'] : []), ...(builtApi ? ['API'] : [])];
  return { stamp: `${client.slice(0, 6)}${api.slice(0, 6)}`, rebuilt };
}

async function buildApi(): Promise<void> {
  rmSync('dist/api', { recursive: true, force: true });
  await bundle({
    entryPoints: ['api/main.ts'],
    outfile: apiBundle,
    bundle: true,
    platform: 'node',
    target: 'node20',
    format: 'esm',
    packages: 'external',
    alias: { '@shared': resolve('shared'), '@api': resolve('api') },
    sourcemap: true,
    logLevel: 'warning',
  });
  cpSync('api/platform/db/migrations', 'dist/api/migrations', { recursive: true });
}

async function buildClient(): Promise<void> {
  await run(process.execPath, ['node_modules/@angular/cli/bin/ng.js', 'build', '--no-progress']);
  compress(clientFolder);
}

/** Beside each text of the client its brotli form; what is small already is left alone. */
const COMPRESSED = /\.(js|css|html|svg|json|webmanifest)$/;
/** Smaller files gain less than a header costs, bytes. */
const WORTH_COMPRESSING = 1000;

function compress(folder: string): void {
  for (const entry of readdirSync(folder, { withFileTypes: true, recursive: true })) {
    const path = join(entry.parentPath, entry.name);
    if (!entry.isFile() || !COMPRESSED.test(entry.name)) continue;
    const content = readFileSync(path);
    if (content.length >= WORTH_COMPRESSING) {
      writeFileSync(`${path}.br`, brotliCompressSync(content));
    }
  }
}

/** Runs to the end; its words are shown only when it fails. */
function run(program: string, words: readonly string[]): Promise<void> {
  return new Promise((done, fail) => {
    const child = spawn(program, words, {
      env: { ...process.env, NG_CLI_ANALYTICS: 'false' },
      stdio: ['ignore', 'pipe', 'pipe'],
    });
    let said = '';
    child.stdout.on('data', (part: Buffer) => (said += part.toString()));
    child.stderr.on('data', (part: Buffer) => (said += part.toString()));
    child.once('error', fail);
    child.once('close', (code) =>
      code === 0 ? done() : fail(new Error(`The client could not be built:\n${said}`)),
    );
  });
}
