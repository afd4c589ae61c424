import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { commandOf, isAlive } from './place';

interface Running {
  readonly pid: number;
  readonly url?: string;
}

const fileOf = (folder: string) => join(folder, 'launcher.json');

/** The start that already runs from this clone, if one does; a file that a killed one left is ignored. */
export function runningLauncher(folder: string): Running | undefined {
  if (!existsSync(fileOf(folder))) return undefined;
  try {
    const running = JSON.parse(readFileSync(fileOf(folder), 'utf8')) as Running;
    const ours = isAlive(running.pid) && /start\.mjs|launch\.ts/.test(commandOf(running.pid));
    return ours && running.pid !== process.pid ? running : undefined;
  } catch {
    return undefined;
  }
}

export function sayRunning(folder: string, url?: string): void {
  writeFileSync(fileOf(folder), JSON.stringify({ pid: process.pid, url }), { mode: 0o600 });
}

export function sayStopped(folder: string): void {
  rmSync(fileOf(folder), { force: true });
}
