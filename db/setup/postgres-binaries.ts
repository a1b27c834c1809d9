import { accessSync, constants, readdirSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { installPackages, runAsRoot } from './debian-packages';
import { run, SetupError } from './run';

const DEBIAN_FOLDER = '/usr/lib/postgresql';

/** Debian reads this folder before it makes a cluster of its own beside a fresh install. */
const NO_CLUSTER_FILE = '/etc/postgresql-common/createcluster.d/valveside.conf';

/**
 * The folder that holds `initdb`, `pg_ctl` and `postgres`, installed first when there is none.
 * @param made the major version that made an existing cluster; only that one can open it
 * @throws {SetupError} when none is found and none can be installed
 */
export async function postgresBinaries(made?: string): Promise<string> {
  const same = made && join(DEBIAN_FOLDER, made, 'bin');
  if (same && holdsServer(same)) return same;
  const found = await findPostgresBinaries();
  if (found) return found;
  await installPostgres();
  const installed = await findPostgresBinaries();
  if (!installed) throw new SetupError("PostgreSQL's server was installed but is not found.");
  return installed;
}

/** Looks at VALVESIDE_PG_BIN, Debian's folders from the newest, pg_config and the path. */
export async function findPostgresBinaries(
  debianFolder = DEBIAN_FOLDER,
): Promise<string | undefined> {
  const told = process.env.VALVESIDE_PG_BIN;
  if (told) {
    if (holdsServer(told)) return told;
    throw new SetupError(
      `VALVESIDE_PG_BIN: expected a folder with initdb and postgres, not ${told}`,
    );
  }
  const { code, output } = await run('pg_config', ['--bindir']);
  const path = (process.env.PATH ?? '').split(delimiter);
  return [...debianVersions(debianFolder), ...(code === 0 ? [output] : []), ...path].find(
    holdsServer,
  );
}

function debianVersions(folder: string): string[] {
  try {
    return readdirSync(folder)
      .sort((a, b) => Number(b) - Number(a))
      .map((version) => join(folder, version, 'bin'));
  } catch {
    return [];
  }
}

function holdsServer(folder: string): boolean {
  try {
    for (const program of ['initdb', 'pg_ctl', 'postgres']) {
      accessSync(join(folder, program), constants.X_OK);
    }
    return true;
  } catch {
    return false;
  }
}

/** Debian would also create and start a cluster for the whole machine, which nobody asked for. */
async function installPostgres(): Promise<void> {
  await runAsRoot([
    'sh',
    '-c',
    `mkdir -p ${NO_CLUSTER_FILE.replace(/\/[^/]*$/, '')} && echo 'create_main_cluster = false' > ${NO_CLUSTER_FILE}`,
  ]);
  try {
    await installPackages(['postgresql'], "PostgreSQL's server is not on this machine");
  } finally {
    await runAsRoot(['rm', '-f', NO_CLUSTER_FILE]);
  }
}
