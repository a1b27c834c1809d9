import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { commandLine, exists } from './processes';

/** Above any number that Linux gives to a process. */
const NO_PROCESS = 2 ** 22 + 1;

/**
 * The port of a server that still runs on this data folder, as after a kill of everything else.
 *
 * PostgreSQL refuses to start while the process number in `postmaster.pid` exists and belongs to
 * the same user, even when that number went to some other program meanwhile, which is common where
 * numbers are low, or when it ended and its parent has not taken notice. In that case the number is replaced by one that cannot exist, and the rest of the
 * file is left as it is, because PostgreSQL checks the shared memory named in it: removing the file
 * would remove that safeguard.
 */
export function readRunning(data: string): number | undefined {
  const file = join(data, 'postmaster.pid');
  if (!existsSync(file)) return undefined;
  const lines = readFileSync(file, 'utf8').split('\n');
  const pid = Number(lines[0]);
  const port = Number(lines[3]);
  if (!Number.isInteger(pid) || pid <= 0 || !exists(pid)) return undefined;
  if (commandLine(pid).includes(data)) return port > 0 ? port : undefined;
  writeFileSync(file, [String(NO_PROCESS), ...lines.slice(1)].join('\n'));
  return undefined;
}
