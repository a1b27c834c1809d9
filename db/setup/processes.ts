import { readFileSync } from 'node:fs';

/** True while the process runs, whoever owns it. */
export function isAlive(pid: number): boolean {
  return exists(pid) && stateOf(pid) !== 'Z';
}

/** True while its number is taken: also after its end, until its parent has taken notice. */
export function exists(pid: number): boolean {
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return error instanceof Error && 'code' in error && error.code === 'EPERM';
  }
}

/** The words that started a process, or none when it is gone. */
export function commandLine(pid: number): string[] {
  try {
    return readFileSync(`/proc/${pid}/cmdline`, 'utf8').split('\0');
  } catch {
    return [];
  }
}

/** When a process began, in the kernel's ticks: tells it from a later one with the same number. */
export function startTicks(pid: number): string | undefined {
  return fieldsOf(pid)[19];
}

function stateOf(pid: number): string | undefined {
  return fieldsOf(pid)[0];
}

/** The fields of `/proc/…/stat` from the state on. */
function fieldsOf(pid: number): string[] {
  try {
    // The name in brackets may hold spaces, so the fields are counted from behind it.
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    return stat.slice(stat.lastIndexOf(')') + 2).split(' ');
  } catch {
    return [];
  }
}
