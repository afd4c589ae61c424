import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import pg from 'pg';
import { afterAll, afterEach, beforeEach, describe, expect, it } from 'vitest';
import { removeCluster, startCluster, type Cluster } from './cluster';
import { clusterFolder, isAlive } from './place';

// In the name: the process that runs this file, and not the run's own cluster.
const folder = clusterFolder({ test: process.pid });
const answers = async ({ ownerUrl }: Cluster): Promise<boolean> => {
  const client = new pg.Client({ connectionString: ownerUrl });
  await client.connect();
  const { rowCount } = await client.query('select 1');
  await client.end();
  return rowCount === 1;
};
const pidOf = () =>
  Number(readFileSync(join(folder, 'data/postmaster.pid'), 'utf8').split('\n', 1)[0]);

let cluster: Cluster;
beforeEach(async () => void (cluster = await startCluster(folder)));
afterEach(() => cluster.stop());
afterAll(() => removeCluster(folder));

describe('A cluster of our own', () => {
  it('starts, keeps its passwords, and leaves nothing running', async () => {
    expect(await answers(cluster)).toBe(true);
    const pid = pidOf();
    await cluster.stop();
    expect(isAlive(pid)).toBe(false);
    const before = cluster;
    const again = (cluster = await startCluster(folder));
    expect(new URL(again.ownerUrl).password).toBe(new URL(before.ownerUrl).password);
    expect(again.sessionSecret).toBe(before.sessionSecret);
    expect(await answers(again)).toBe(true);
  });

  it('stops the server that a killed run left, and starts again', async () => {
    const left = pidOf();
    cluster = await startCluster(folder);
    expect(isAlive(left)).toBe(false);
    expect(await answers(cluster)).toBe(true);
  });

  it('starts after a kill -9 of its server', async () => {
    process.kill(pidOf(), 'SIGKILL');
    cluster = await startCluster(folder);
    expect(await answers(cluster)).toBe(true);
  });

  it('never touches a process that is not its own, though the pid file names it', async () => {
    await cluster.stop();
    writeFileSync(join(folder, 'data/postmaster.pid'), `${process.pid}\n`);
    cluster = await startCluster(folder);
    expect(await answers(cluster)).toBe(true);
    expect(isAlive(process.pid)).toBe(true);
  });

  it('refuses a wrong password, on the loopback too', async () => {
    const url = new URL(cluster.ownerUrl);
    url.password = 'wrong';
    await expect(new pg.Client({ connectionString: url.href }).connect()).rejects.toMatchObject({
      code: '28P01',
    });
  });

  it('is removed with its data', async () => {
    const pid = pidOf();
    await removeCluster(folder);
    expect(existsSync(folder)).toBe(false);
    expect(isAlive(pid)).toBe(false);
  });
});
