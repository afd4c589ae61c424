import type { TestProject } from 'vitest/node';
import { removeCluster, startCluster } from '../../api/local/cluster';
import { abandonedFolders, clusterFolder } from '../../api/local/place';
import { prepareDatabase } from '../../api/platform/db/migrate';

declare module 'vitest' {
  export interface ProvidedContext {
    /** The cluster of this run, with its roles; every spec file makes its own database in it. */
    cluster: { readonly ownerUrl: string; readonly applicationUrl: string };
  }
}

/** One throw-away cluster for the whole run, through the same code as `npm start`. */
export default async function setup({ provide }: TestProject): Promise<() => Promise<void>> {
  for (const folder of abandonedFolders()) await removeCluster(folder);
  const folder = clusterFolder({ test: process.pid });
  const cluster = await startCluster(folder);
  await prepareDatabase(cluster.ownerUrl, cluster.applicationUrl);
  provide('cluster', { ownerUrl: cluster.ownerUrl, applicationUrl: cluster.applicationUrl });
  return async () => {
    await cluster.stop();
    await removeCluster(folder);
  };
}
