import { existsSync } from 'node:fs';
import { run, SetupError } from './run';

/**
 * Installs packages of the running Debian, as root or by a sudo that asks for no password.
 * @throws {SetupError} naming what to type when neither is possible or apt fails
 */
export async function installPackages(packages: readonly string[], why: string): Promise<void> {
  const byHand = `apt-get install ${packages.join(' ')}`;
  if (!existsSync('/usr/bin/apt-get')) {
    throw new SetupError(`${why}, and this is no Debian system. Install: ${packages.join(', ')}.`);
  }
  const prefix = await rootPrefix();
  if (!prefix) {
    throw new SetupError(
      `${why}. Installing needs root, or a sudo that asks for no password.\nType this once: sudo ${byHand}`,
    );
  }
  console.log(`${why}: installing ${packages.join(' ')} from Debian's packages …`);
  await apt(prefix, ['update'], byHand);
  await apt(prefix, ['install', '-y', '--no-install-recommends', ...packages], byHand);
}

/** Runs one command as root, the way `installPackages` does; false when that is not possible. */
export async function runAsRoot(command: readonly string[]): Promise<boolean> {
  const prefix = await rootPrefix();
  if (!prefix) return false;
  const [program = '', ...args] = [...prefix, ...command];
  return (await run(program, args)).code === 0;
}

async function rootPrefix(): Promise<string[] | undefined> {
  if (process.getuid?.() === 0) return [];
  return (await run('sudo', ['-n', 'true'])).code === 0 ? ['sudo', '-n'] : undefined;
}

async function apt(prefix: readonly string[], args: readonly string[], byHand: string) {
  const [program = '', ...rest] = [
    ...prefix,
    'env',
    'DEBIAN_FRONTEND=noninteractive',
    'apt-get',
    // Another install may be running; wait for it rather than fail.
    '-o',
    'DPkg::Lock::Timeout=180',
    '-q',
    ...args,
  ];
  const { code, output } = await run(program, rest);
  if (code !== 0) {
    const tail = output.split('\n').slice(-15).join('\n');
    throw new SetupError(`apt-get ${args[0]} failed:\n${tail}\nTry by hand: ${byHand}`);
  }
}
