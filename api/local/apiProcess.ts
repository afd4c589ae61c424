import { fork, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';

/** An API process that serves. */
export interface ApiProcess {
  readonly child: ChildProcess;
  /** Lets it drain, and waits for its end. */
  stop(): Promise<void>;
}

/** After this long without an end it is killed, milliseconds; its own drain takes ten seconds at most. */
const STOP_LIMIT = 15_000;

/**
 * Starts the bundle and waits until it serves. It runs in a process group of its own, so that a terminal's
 * Ctrl-C reaches it only through us; when this process is killed it sees its channel close, and ends.
 *
 * @throws Error when it ends before it serves
 */
export async function startApi(
  bundle: string,
  environment: Readonly<Record<string, string>>,
): Promise<ApiProcess> {
  const child = fork(bundle, {
    detached: true,
    execArgv: ['--enable-source-maps'],
    env: { ...process.env, ...environment },
    stdio: ['ignore', 'inherit', 'inherit', 'ipc'],
  });
  const ended = once(child, 'exit');
  const first = await Promise.race([once(child, 'message'), ended.then(() => 'ended' as const)]);
  if (first === 'ended')
    throw new Error('The API ended before it could serve: its words are above.');
  return {
    child,
    async stop() {
      if (child.exitCode !== null || child.signalCode !== null) return;
      child.kill('SIGTERM');
      const kill = setTimeout(() => child.kill('SIGKILL'), STOP_LIMIT);
      await ended;
      clearTimeout(kill);
    },
  };
}
