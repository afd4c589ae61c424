import { randomBytes } from 'node:crypto';
import { apiBundle, buildStale, clientFolder } from '../../api/local/build';
import { startApi, type ApiProcess } from '../../api/local/apiProcess';
import { anyFreePort } from '../../api/local/freePort';
import { loadDemo } from '../../seeds/load';
import { freshDatabase } from '../api/freshDatabase';

/** The product as built, with the demo in a database of its own; the API can be stopped and started. */
export interface DemoSite {
  readonly url: string;
  startServer(): Promise<void>;
  stopServer(): Promise<void>;
  close(): Promise<void>;
}

export async function startDemoSite(): Promise<DemoSite> {
  const { stamp } = await buildStale();
  const database = await freshDatabase();
  await loadDemo(database.ownerUrl);
  const port = await anyFreePort();
  const environment = {
    PORT: String(port),
    DATABASE_URL: database.applicationUrl,
    SESSION_SECRET: randomBytes(32).toString('base64url'),
    CLIENT_FOLDER: clientFolder,
    BUILD: stamp,
    LOG_LEVEL: 'silent',
  };
  let api: ApiProcess | undefined = await startApi(apiBundle, environment);
  const stopServer = async () => {
    await api?.stop();
    api = undefined;
  };
  return {
    // By name: secure cookies work on localhost over plain HTTP.
    url: `http://localhost:${port}`,
    stopServer,
    startServer: async () => void (api ??= await startApi(apiBundle, environment)),
    async close() {
      await stopServer();
      await database.drop();
    },
  };
}
