import { setTimeout as pause } from 'node:timers/promises';
import { buildStale } from '../api/local/build';
import { removeCluster } from '../api/local/cluster';
import { bring, chromium, ngspice, postgresql } from '../api/local/debianPackages';
import { abandonedFolders } from '../api/local/place';
import { interruptAll, runSuite, type Result } from './runner/runSuite';
import { alone, sideBySide, type Suite } from './runner/suites';

/*
 * `npm test`, by api/local/start.mjs: every suite with its seconds, the words of those that failed, and
 * in the end one line. `npm test -- api browser` runs only the suites named.
 */
const say = (line: string) => void process.stdout.write(`${line}\n`);
const names = process.argv.slice(2);
const wanted = (suites: readonly Suite[]) =>
  suites.filter(({ name }) => names.length === 0 || names.includes(name));

/** Suites that run at a time: one for each of the two cores. */
const LANES = 2;
/** After an interrupt, milliseconds. */
const WORKERS_END = 1_500;
let interrupted = false;
for (const signal of ['SIGINT', 'SIGTERM'] as const) {
  process.on(signal, () => {
    interrupted = true;
    interruptAll();
  });
}

function report(result: Result): Result {
  const { name, passed, failed, seconds, said } = result;
  if (failed > 0) say(said.trimEnd());
  say(
    `${failed > 0 ? 'FAILED' : 'ok    '} ${name.padEnd(10)} ${passed} passed, ${failed} failed, ${seconds.toFixed(1)} s`,
  );
  return result;
}

async function inLanes(suites: readonly Suite[], lanes: number): Promise<Result[]> {
  const waiting = [...suites];
  const results: Result[] = [];
  const lane = async () => {
    for (let next = waiting.shift(); next && !interrupted; next = waiting.shift()) {
      results.push(report(await runSuite(next)));
    }
  };
  await Promise.all(Array.from({ length: lanes }, lane));
  return results;
}

/** The browser's suite serves the built client; that it builds is counted as one check. */
async function build(): Promise<Result> {
  const begun = Date.now();
  const seconds = () => (Date.now() - begun) / 1000;
  try {
    await buildStale();
    return report({ name: 'build', passed: 1, failed: 0, seconds: seconds(), said: '' });
  } catch (error) {
    const said = (error as Error).message;
    return report({ name: 'build', passed: 0, failed: 1, seconds: seconds(), said });
  }
}

try {
  bring(postgresql, chromium, ngspice);
} catch (error) {
  process.stderr.write(`${(error as Error).message}\n`);
  process.exit(1);
}
const results = await inLanes(wanted(sideBySide), LANES);
if (wanted(alone).length > 0 && !interrupted) {
  results.push(await build(), ...(await inLanes(wanted(alone), 1)));
}
// Workers that were interrupted take a moment to end; until then their clusters are not abandoned.
if (interrupted) await pause(WORKERS_END);
for (const folder of abandonedFolders()) await removeCluster(folder);

const sum = (of: (result: Result) => number) => results.reduce((all, one) => all + of(one), 0);
const failed = sum((result) => result.failed) + (interrupted ? 1 : 0);
say(`${sum((result) => result.passed)} passed, ${failed} failed`);
process.exit(failed === 0 ? 0 : 1);
