import { spawn } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Suite } from './suites';

export interface Result {
  readonly name: string;
  readonly passed: number;
  readonly failed: number;
  readonly seconds: number;
  /** What the programs said; shown when something failed. */
  readonly said: string;
}

/** No suite runs longer, milliseconds: a hang is a failure. */
const SUITE_LIMIT = 10 * 60 * 1000;

/** Process groups at work, to be ended with us. */
const groups = new Set<number>();

/** Ends what runs; each program ends what it started itself. */
export function interruptAll(): void {
  for (const group of groups) signal(group, 'SIGINT');
}

export async function runSuite(suite: Suite): Promise<Result> {
  const begun = Date.now();
  const folder = mkdtempSync(join(tmpdir(), 'lampline-suite-'));
  const json = join(folder, 'result.json');
  let said = '';
  let code = 0;
  for (const command of suite.commands) {
    const words = command.map((word) => word.replace('{json}', json));
    code = await run(words, (part) => (said += part));
    if (code !== 0) break;
  }
  const counted = suite.counts === 'check' ? { passed: 1, failed: 0 } : countsIn(json);
  rmSync(folder, { recursive: true, force: true });
  const seconds = (Date.now() - begun) / 1000;
  if (code === 0) return { name: suite.name, ...counted, seconds, said };
  const passed = suite.counts === 'check' ? 0 : counted.passed;
  return { name: suite.name, passed, failed: Math.max(1, counted.failed), seconds, said };
}

function run(words: readonly string[], hear: (part: string) => void): Promise<number> {
  return new Promise((resolve) => {
    const [program = '', ...rest] = words;
    const child = spawn(program, rest, {
      detached: true,
      env: { ...process.env, NG_CLI_ANALYTICS: 'false', FORCE_COLOR: '0', CI: '1' },
      stdio: ['ignore', 'pipe', 'pipe'],
    });
    const group = child.pid;
    if (group !== undefined) groups.add(group);
    const limit = setTimeout(() => {
      hear(`\nStopped after ${SUITE_LIMIT / 60_000} minutes.\n`);
      if (group !== undefined) signal(group, 'SIGKILL');
    }, SUITE_LIMIT);
    const end = (code: number) => {
      clearTimeout(limit);
      // What a program left behind in its group goes with it.
      if (group !== undefined) signal(group, 'SIGTERM');
      if (group !== undefined) groups.delete(group);
      resolve(code);
    };
    child.stdout.on('data', (part: Buffer) => hear(part.toString()));
    child.stderr.on('data', (part: Buffer) => hear(part.toString()));
    child.once('error', (error) => {
      hear(error.message);
      end(1);
    });
    child.once('close', (code) => end(code ?? 1));
  });
}

function signal(group: number, name: NodeJS.Signals): void {
  try {
    process.kill(-group, name);
  } catch {
    // It has ended already.
  }
}

interface Written {
  readonly numPassedTests: number;
  readonly numFailedTests: number;
  readonly testResults: readonly {
    readonly status: string;
    readonly assertionResults: readonly unknown[];
  }[];
}

/** Tests, and files that failed before their first test. */
function countsIn(json: string): { passed: number; failed: number } {
  if (!existsSync(json)) return { passed: 0, failed: 1 };
  const written = JSON.parse(readFileSync(json, 'utf8')) as Written;
  const broken = written.testResults.filter(
    ({ status, assertionResults }) => status === 'failed' && assertionResults.length === 0,
  );
  return {
    passed: written.numPassedTests,
    failed: written.numFailedTests + broken.length,
  };
}
