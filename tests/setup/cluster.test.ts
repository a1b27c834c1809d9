import { mkdirSync, readFileSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type Cluster, startCluster } from '../../db/setup/cluster';
import { clusterFolder, postgresRunner } from '../../db/setup/cluster-folder';
import { withConnection } from '../../db/setup/databases';
import { isAlive } from '../../db/setup/processes';
import { wait } from '../../db/setup/run';
import { makeTestFolder, removeTestFolder } from '../../db/setup/test-folder';

let parent: string;
let cluster: Cluster;

/** As `npm start` does it, fsync included. */
const start = () => startCluster({ parent, name: 'cluster', durable: true });
const pidFile = () => join(cluster.folder, 'data', 'postmaster.pid');
const postmaster = () => Number(readFileSync(pidFile(), 'utf8').split('\n')[0]);
const ask = (sql: string) =>
  withConnection(cluster.url('postgres'), async (client) => (await client.query(sql)).rows);

async function killServer(): Promise<void> {
  const pid = postmaster();
  process.kill(pid, 'SIGKILL');
  while (isAlive(pid)) await wait(20);
}

beforeAll(async () => {
  parent = await makeTestFolder();
  // What an initdb that was cut short leaves behind.
  const folder = await clusterFolder(parent, 'cluster', postgresRunner());
  mkdirSync(join(folder, 'unfinished'));
  writeFileSync(join(folder, 'unfinished', 'PG_VERSION'), 'half');
  cluster = await start();
  await ask('CREATE TABLE kept (n integer)');
});

afterAll(async () => {
  await cluster.stop();
  await removeTestFolder(parent);
});

test('a cluster whose creation was cut short is created anew', async () => {
  expect(await ask('SELECT count(*)::int AS n FROM kept')).toEqual([{ n: 0 }]);
});

test('it keeps what it was told on the disk, listens on loopback only and asks for a password', async () => {
  expect(await ask('SHOW fsync')).toEqual([{ fsync: 'on' }]);
  expect(await ask('SHOW listen_addresses')).toEqual([{ listen_addresses: '127.0.0.1' }]);
  const wrong = Object.assign(new URL(cluster.url('postgres')), { password: 'wrong' }).href;
  await expect(withConnection(wrong, async () => {})).rejects.toThrow(/password/);
});

test('a second start takes over the server that still runs, on the same port', async () => {
  const before = postmaster();
  const again = await start();
  expect(again.port).toBe(cluster.port);
  expect(postmaster()).toBe(before);
});

test('after a kill of the server nothing that was stored is missing', async () => {
  await ask('INSERT INTO kept VALUES (1), (2)');
  await killServer();
  cluster = await start();
  expect(await ask('SELECT n FROM kept ORDER BY n')).toEqual([{ n: 1 }, { n: 2 }]);
});

test('a pid file that names some other program does not keep it from starting', async () => {
  await killServer();
  const [, ...rest] = readFileSync(pidFile(), 'utf8').split('\n');
  // This test's own number: alive, and no PostgreSQL.
  writeFileSync(pidFile(), [String(process.pid), ...rest].join('\n'));
  cluster = await start();
  expect(await ask('SELECT count(*)::int AS n FROM kept')).toEqual([{ n: 2 }]);
  expect(postmaster()).not.toBe(process.pid);
});

test('a pid file of a process that is gone does not keep it from starting', async () => {
  const stale = readFileSync(pidFile(), 'utf8');
  await cluster.stop();
  writeFileSync(pidFile(), stale);
  cluster = await start();
  expect(await ask('SELECT count(*)::int AS n FROM kept')).toEqual([{ n: 2 }]);
});

test('a link in the place of its folder is refused', async () => {
  const link = join(parent, 'link');
  symlinkSync('/var/tmp', link);
  await expect(clusterFolder(parent, 'link', postgresRunner())).rejects.toThrow(/not a folder/);
  rmSync(link);
});

test.runIf(process.getuid?.() === 0)(
  'a project folder that its user cannot enter sends it to a private folder elsewhere',
  async () => {
    const closed = join(parent, 'closed');
    const elsewhere = join(parent, 'elsewhere');
    mkdirSync(closed, { mode: 0o700 });
    mkdirSync(elsewhere, { mode: 0o711 });
    const folder = await clusterFolder(closed, 'cluster', postgresRunner(), elsewhere);
    expect(folder).toMatch(/elsewhere\/valveside-[0-9a-f]{16}$/);
    expect(await clusterFolder(closed, 'cluster', postgresRunner(), elsewhere)).toBe(folder);
  },
);
