import { createHash } from 'node:crypto';
import { chmodSync, chownSync, lstatSync, mkdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { run, SetupError } from './run';

/** Whom PostgreSQL runs as. It refuses root, so root hands over to the user of its package. */
export interface Runner {
  readonly uid: number;
  readonly gid: number;
  /** Spawn options: set when the process must become that user first. */
  readonly spawn: { readonly cwd: string; readonly uid?: number; readonly gid?: number };
}

export function postgresRunner(): Runner {
  const uid = process.getuid?.() ?? 0;
  const gid = process.getgid?.() ?? 0;
  if (uid !== 0) return { uid, gid, spawn: { cwd: '/' } };
  const entry = readFileSync('/etc/passwd', 'utf8')
    .split('\n')
    .map((line) => line.split(':'))
    .find(([name]) => name === 'postgres');
  if (!entry) {
    throw new SetupError(
      'PostgreSQL does not run as root, and there is no user called postgres to run it.\n' +
        "Install Debian's package postgresql, or start as an ordinary user.",
    );
  }
  const user = { uid: Number(entry[2]), gid: Number(entry[3]) };
  return { ...user, spawn: { cwd: '/', ...user } };
}

/**
 * A private folder for a cluster: inside `parent` where PostgreSQL's user can get there, else under
 * /var/tmp, named after the place that it stands for.
 * @param parent a folder of the project, made with `makePassable`
 * @param name what to call it there
 */
export async function clusterFolder(
  parent: string,
  name: string,
  runner: Runner,
  fallback = '/var/tmp',
): Promise<string> {
  const inside = join(parent, name);
  if (await canEnter(parent, runner)) return makePrivate(inside, runner);
  const hash = createHash('sha256').update(inside).digest('hex').slice(0, 16);
  return makePrivate(join(fallback, `valveside-${hash}`), runner);
}

async function canEnter(folder: string, runner: Runner): Promise<boolean> {
  return (await run('test', ['-x', folder], runner.spawn)).code === 0;
}

/** A link, or a folder of somebody else's, could make us write where we should not. */
function makePrivate(folder: string, runner: Runner): string {
  try {
    mkdirSync(folder, { mode: 0o700 });
    if (process.getuid?.() === 0) chownSync(folder, runner.uid, runner.gid);
  } catch (error) {
    if (!(error instanceof Error && 'code' in error && error.code === 'EEXIST')) throw error;
  }
  const found = lstatSync(folder);
  if (!found.isDirectory()) throw new SetupError(`${folder} is not a folder. Remove it first.`);
  if (found.uid !== runner.uid) {
    throw new SetupError(
      `${folder} belongs to another user (${found.uid}), so its data stays closed to you.\n` +
        'Start as that user, or remove the folder to begin anew.',
    );
  }
  chmodSync(folder, 0o700);
  return folder;
}
