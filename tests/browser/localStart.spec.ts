import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { mkdtempSync, readdirSync, rmSync, symlinkSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { removeCluster } from '../../api/local/cluster';
import { anyFreePort, isFree } from '../../api/local/freePort';
import { clusterFolder, commandOf } from '../../api/local/place';

/*
 * `npm start` from outside. A folder of links stands for the clone, so that its cluster is not the one of
 * the person who works here; client and bundle are those that were built just before.
 */
const parts = ['api', 'client', 'dist', 'node_modules', 'seeds', 'shared', 'angular.json'];
const files = ['package.json', 'package-lock.json', 'tsconfig.json'];
let clone = '';
let launchers: ChildProcess[] = [];

beforeAll(() => {
  clone = mkdtempSync(join(tmpdir(), 'lampline-start-'));
  for (const part of [...parts, ...files]) symlinkSync(resolve(part), join(clone, part));
});
afterEach(async () => {
  for (const launcher of launchers) await end(launcher, 'SIGINT');
  launchers = [];
});
afterAll(async () => {
  await removeCluster(clusterFolder('demo', clone));
  rmSync(clone, { recursive: true, force: true });
});

interface Started {
  readonly launcher: ChildProcess;
  readonly port: number;
  readonly said: string;
  readonly seconds: number;
}

function launch(environment: Record<string, string> = {}): ChildProcess {
  const tsx = resolve('node_modules/tsx/dist/loader.mjs');
  const launcher = spawn(process.execPath, ['--import', tsx, 'api/local/launch.ts'], {
    cwd: clone,
    env: { ...process.env, ...environment },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  launchers.push(launcher);
  return launcher;
}

/** Starts, and waits for the address. */
async function start(environment?: Record<string, string>): Promise<Started> {
  const begun = Date.now();
  const launcher = launch(environment);
  let said = '';
  return new Promise((ready, fail) => {
    launcher.stderr?.on('data', (part: Buffer) => (said += part.toString()));
    launcher.stdout?.on('data', (part: Buffer) => {
      said += part.toString();
      const port = /http:\/\/localhost:(\d+)/.exec(said)?.[1];
      const whole = said.includes('Ctrl-C stops it.');
      if (port && whole) {
        ready({ launcher, port: Number(port), said, seconds: (Date.now() - begun) / 1000 });
      }
    });
    launcher.once('exit', (code) => fail(new Error(`ended with ${code}: ${said}`)));
  });
}

async function end(launcher: ChildProcess, signal: NodeJS.Signals): Promise<number | null> {
  if (launcher.exitCode === null && launcher.signalCode === null) {
    launcher.kill(signal);
    await once(launcher, 'exit');
  }
  return launcher.exitCode;
}

/** Command lines of processes that name this clone or its cluster. */
const running = () =>
  readdirSync('/proc')
    .filter((name) => /^\d+$/.test(name) && Number(name) !== process.pid)
    .map((name) => commandOf(Number(name)))
    .filter((command) => [clone, clusterFolder('demo', clone)].some((at) => command.includes(at)));

const health = async (port: number) => (await fetch(`http://127.0.0.1:${port}/api/health`)).status;

/** Second start from a prepared folder (architecture.md), seconds. */
const SECOND_START = 5;
/** How often it is timed where another program kept the machine busy: the best time is judged. */
const TIMED_AT_MOST = 3;

describe('npm start', () => {
  it('prints one address and the accounts, serves, and leaves nothing after Ctrl-C', async () => {
    const { launcher, port, said } = await start();
    expect(said.match(/http:\/\//g)).toHaveLength(1);
    for (const role of ['technician', 'engineer', 'supervisor', 'administrator']) {
      expect(said).toMatch(new RegExp(`^\\s+${role}\\s+\\S+@\\S+\\s+\\S+`, 'm'));
    }
    expect(await health(port)).toBe(200);
    expect(await end(launcher, 'SIGINT')).toBe(0);
    expect(running()).toEqual([]);
    expect(await isFree(port)).toBe(true);
  });

  it('starts within seconds the second time', async () => {
    let best = Infinity;
    for (let turn = 0; turn < TIMED_AT_MOST && best >= SECOND_START; turn++) {
      const { launcher, seconds } = await start();
      best = Math.min(best, seconds);
      await end(launcher, 'SIGINT');
    }
    expect(best).toBeLessThan(SECOND_START);
  });

  it('takes the port that it is told, and refuses a second start beside it', async () => {
    const wanted = await anyFreePort();
    const { port } = await start({ PORT: String(wanted) });
    expect(port).toBe(wanted);
    const second = launch({ PORT: String(await anyFreePort()) });
    const [code] = (await once(second, 'exit')) as [number];
    expect(code).toBe(1);
    expect(await health(port)).toBe(200);
  });

  it('ends its API when it is killed, and recovers at the next start', async () => {
    const first = await start();
    await end(first.launcher, 'SIGKILL');
    for (let wait = 0; !(await isFree(first.port)) && wait < 50; wait++) await pause(100);
    expect(await isFree(first.port)).toBe(true);
    const next = await start();
    expect(await health(next.port)).toBe(200);
    expect(await end(next.launcher, 'SIGTERM')).toBe(0);
    expect(running()).toEqual([]);
  });
});
