import { createServer } from 'node:http';
import { v7 } from 'uuid';
import { createApp } from './app';
import { readConfig, type Config } from './config';
import { createLogger } from './platform/logger';
import { warmUp } from './platform/password';
import { checkDatabase } from './platform/db/bootCheck';
import { openDatabase } from './platform/db/doors';

/** Only the loopback: a TLS proxy on the same machine is the way in (deployment notes). */
const HOST = '127.0.0.1';
/** Requests that run get this long to end before connections are cut, milliseconds. */
const DRAIN_LIMIT = 10_000;

const configuration = (): Config => {
  try {
    return readConfig(process.env);
  } catch (error) {
    process.stderr.write(`${(error as Error).message}\n`);
    process.exit(1);
  }
};

const config = configuration();
const logger = createLogger(config.logLevel);

const findings = await checkDatabase(config.databaseUrl);
if (findings.length > 0) {
  const named = findings.map(({ code, what }) => `${code}: ${what}`).join('; ');
  process.stderr.write(`The database must not be served like this: ${named}.\n`);
  process.exit(1);
}

const database = openDatabase(config.databaseUrl, (error) =>
  logger.warn({ err: error }, 'an idle database connection broke'),
);
const { app } = createApp({ config, database, clock: () => new Date(), ids: v7, logger });
await warmUp();

const server = createServer(app);
server.once('error', (error) => {
  process.stderr.write(`The port ${config.port} can't be used: ${error.message}\n`);
  process.exit(1);
});
server.listen(config.port, HOST, () => {
  logger.info({ port: config.port, build: config.build }, 'serving');
  // The local start waits for it.
  process.send?.('serving');
});

let draining = false;
/** Takes no new connection, lets running requests end, then closes the database. */
async function drain(): Promise<void> {
  if (draining) return;
  draining = true;
  logger.info('draining');
  const cut = setTimeout(() => server.closeAllConnections(), DRAIN_LIMIT);
  await new Promise<void>((resolve) => {
    server.close(() => resolve());
    server.closeIdleConnections();
  });
  clearTimeout(cut);
  await database.close();
  process.exit(0);
}
process.on('SIGTERM', () => void drain());
process.on('SIGINT', () => void drain());
// Started by the local start: when that one is killed, nobody else would end this process.
if (process.connected) process.on('disconnect', () => void drain());
