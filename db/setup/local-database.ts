import { migrate } from '../migrate';
import { type Cluster, startCluster } from './cluster';
import { createDatabase, databaseExists, dropDatabase, isEmpty, renameDatabase } from './databases';
import { dataFolder } from './paths';
import type { Stopping } from './stopping';

const DATABASE = 'valveside';
const UNFINISHED = 'valveside_unfinished';

/** Fills the database at an address with the demo. */
export type Seed = (databaseUrl: string) => Promise<void>;

/**
 * The private cluster's database, migrated, with the demo when it is empty.
 * @returns its address
 */
export async function openLocalDatabase(stopping: Stopping, seed: Seed): Promise<string> {
  const starting = startCluster({ parent: dataFolder, name: 'postgres', durable: true });
  stopping.add('PostgreSQL', async () => (await starting).stop());
  const cluster = await starting;
  if (!(await databaseExists(cluster.url('postgres'), DATABASE))) await makeFirst(cluster, seed);
  const url = cluster.url(DATABASE);
  await migrate(url);
  if (await isEmpty(url)) await seed(url);
  return url;
}

/** Gets its name when it is complete, so that a stop in the middle leaves no half of a demo. */
async function makeFirst(cluster: Cluster, seed: Seed): Promise<void> {
  const adminUrl = cluster.url('postgres');
  await dropDatabase(adminUrl, UNFINISHED);
  await createDatabase(adminUrl, UNFINISHED);
  await migrate(cluster.url(UNFINISHED));
  await seed(cluster.url(UNFINISHED));
  await renameDatabase(adminUrl, UNFINISHED, DATABASE);
}
