import { DEFAULT_PORT } from '../config';
import { prepareDatabase } from '../platform/db/migrate';
import { startApi, type ApiProcess } from './apiProcess';
import { apiBundle, buildStale, clientFolder } from './build';
import { startCluster, type Cluster } from './cluster';
import { bring, postgresql } from './debianPackages';
import { demoAccounts } from './demo';
import { freePortFrom, isFree } from './freePort';
import { runningLauncher, sayRunning, sayStopped } from './launcherLock';
import { clusterFolder, ownFolder, postgresAccount } from './place';

const say = (line: string) => void process.stdout.write(`${line}\n`);

/** What has been started, in the order of starting; stopped in the other order. */
const started: { readonly stop: () => Promise<void> }[] = [];
let stopping: Promise<void> | undefined;

function stopAll(): Promise<void> {
  stopping ??= (async () => {
    for (const thing of started.splice(0).reverse()) {
      await thing.stop().catch((error: Error) => process.stderr.write(`${error.message}\n`));
    }
  })();
  return stopping;
}

for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) {
  process.on(signal, () => void stopAll().then(() => process.exit(0)));
}

async function launch(): Promise<void> {
  if (process.env['DATABASE_URL']) await serveGiven();
  else await serveLocal();
}

/** Another database than ours was named: it is used as it is. */
async function serveGiven(): Promise<void> {
  const { DATABASE_URL = '', DATABASE_OWNER_URL } = process.env;
  if (DATABASE_OWNER_URL) await prepareDatabase(DATABASE_OWNER_URL, DATABASE_URL);
  const { stamp } = await buildStale();
  say(`Lampline is at ${await serve({ BUILD: stamp, CLIENT_FOLDER: clientFolder })}`);
}

/** Everything on this machine, with the demo company. */
async function serveLocal(): Promise<void> {
  bring(postgresql);
  const folder = clusterFolder('demo');
  const running = runningLauncher(folder);
  if (running) {
    throw new Error(
      `Lampline already runs from this folder (process ${running.pid}${running.url ? `, ${running.url}` : ''}). Stop that one first.`,
    );
  }
  ownFolder(folder, postgresAccount());
  sayRunning(folder);
  started.push({ stop: async () => sayStopped(folder) });

  const building = buildStale();
  // Looked at below; until then a failure must not end the process before all is stopped.
  building.catch(() => undefined);
  const cluster = await startCluster(folder);
  started.push(cluster);
  await prepareDatabase(cluster.ownerUrl, cluster.applicationUrl);
  const accounts = await demoAccounts(folder, cluster.ownerUrl);
  const { stamp, rebuilt } = await building;
  if (rebuilt.length > 0) say(`Built: ${rebuilt.join(' and ')}.`);

  const url = await serve({ ...environmentOf(cluster), BUILD: stamp });
  sayRunning(folder, url);
  say(`\nLampline is at ${url}\n`);
  for (const { role, email, password } of accounts) {
    say(`  ${role.padEnd(14)} ${email.padEnd(36)} ${password}`);
  }
  say('\nCtrl-C stops it.');
}

const environmentOf = (cluster: Cluster) => ({
  DATABASE_URL: cluster.applicationUrl,
  SESSION_SECRET: cluster.sessionSecret,
  CLIENT_FOLDER: clientFolder,
  LOG_LEVEL: process.env['LOG_LEVEL'] ?? 'warn',
});

/** How often another port is tried when somebody takes the free one first. */
const PORT_ATTEMPTS = 3;

/** Starts the API on PORT, or on the first free port from the usual one; answers the address. */
async function serve(environment: Readonly<Record<string, string>>): Promise<string> {
  const wanted = process.env['PORT'];
  if (wanted !== undefined && !/^[1-9]\d{0,4}$/.test(wanted)) {
    throw new Error(`PORT is a number from 1 to 65535, not "${wanted}".`);
  }
  if (wanted !== undefined && !(await isFree(Number(wanted)))) {
    throw new Error(`PORT ${wanted} is taken by another program: name another, or none.`);
  }
  for (let attempt = 1; ; attempt++) {
    const port = wanted === undefined ? await freePortFrom(DEFAULT_PORT) : Number(wanted);
    try {
      watch(await startApi(apiBundle, { ...environment, PORT: String(port) }));
      return `http://localhost:${port}`;
    } catch (error) {
      if (wanted !== undefined || attempt === PORT_ATTEMPTS || (await isFree(port))) throw error;
    }
  }
}

/** An API that ends by itself takes everything down: nothing is left half running. */
function watch(api: ApiProcess): void {
  started.push(api);
  api.child.once('exit', (code) => {
    if (stopping) return;
    process.stderr.write(`The API ended by itself (${code ?? 'killed'}).\n`);
    void stopAll().then(() => process.exit(1));
  });
}

try {
  await launch();
} catch (error) {
  await stopAll();
  process.stderr.write(`${(error as Error).message}\n`);
  process.exit(1);
}
