import { existsSync, mkdirSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { clusterFolder, postgresRunner } from './cluster-folder';
import { makePassable, testDataFolder } from './paths';
import { commandLine, startTicks } from './processes';
import { wait } from './run';

/**
 * A folder of one test run, named by the process that owns it, so that several runs in one clone
 * never meet. What killed runs left behind is removed first.
 */
export async function makeTestFolder(): Promise<string> {
  makePassable(testDataFolder);
  await sweep();
  // One process can hold several: a test of the set-up does.
  const count = readdirSync(testDataFolder).filter((name) => name.startsWith(ownPrefix())).length;
  const folder = join(testDataFolder, `${ownPrefix()}${count}`);
  mkdirSync(folder, { mode: 0o711 });
  return folder;
}

/** Removes a run's folder, and its cluster (called `name`) where that had to go elsewhere. */
export async function removeTestFolder(folder: string, name = 'cluster'): Promise<void> {
  const cluster = await clusterFolder(folder, name, postgresRunner());
  await endServer(cluster);
  rmSync(cluster, { recursive: true, force: true });
  rmSync(folder, { recursive: true, force: true });
}

const ownPrefix = () => `run-${process.pid}-${startTicks(process.pid) ?? 0}-`;

async function sweep(): Promise<void> {
  for (const name of readdirSync(testDataFolder)) {
    const [, pid, ticks] = /^run-(\d+)-(\d+)-\d+$/.exec(name) ?? [];
    if (!pid || startTicks(Number(pid)) === ticks) continue;
    await removeTestFolder(join(testDataFolder, name));
  }
}

/** A test's data is thrown away, so its server may be killed. */
async function endServer(cluster: string): Promise<void> {
  const file = join(cluster, 'data', 'postmaster.pid');
  if (!existsSync(file)) return;
  const pid = Number(readFileSync(file, 'utf8').split('\n')[0]);
  for (let tries = 0; tries < 40 && commandLine(pid).includes(join(cluster, 'data')); tries++) {
    process.kill(pid, tries < 20 ? 'SIGQUIT' : 'SIGKILL');
    await wait(100);
  }
}
