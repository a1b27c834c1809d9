import { type SpawnOptions, spawn } from 'node:child_process';

export interface Finished {
  readonly code: number;
  readonly output: string;
}

/** Runs a program to its end and keeps what it wrote. It never reads from the terminal. */
export function run(
  command: string,
  args: readonly string[],
  options: SpawnOptions = {},
): Promise<Finished> {
  return new Promise((resolve) => {
    const child = spawn(command, args, { ...options, stdio: ['ignore', 'pipe', 'pipe'] });
    let output = '';
    child.stdout?.on('data', (chunk) => {
      output += chunk;
    });
    child.stderr?.on('data', (chunk) => {
      output += chunk;
    });
    child.on('error', (error) => resolve({ code: 127, output: error.message }));
    child.on('close', (code) => resolve({ code: code ?? 1, output: output.trim() }));
  });
}

/** As `run`, and throws with the program's own words when it fails. */
export async function runOrThrow(
  command: string,
  args: readonly string[],
  options: SpawnOptions = {},
): Promise<string> {
  const { code, output } = await run(command, args, options);
  if (code !== 0) throw new Error(`${command} ${args.join(' ')} failed (${code}):\n${output}`);
  return output;
}

export const wait = (milliseconds: number) =>
  new Promise<void>((resolve) => {
    setTimeout(resolve, milliseconds);
  });

/** What stops a command with words for the person who typed it, and no stack. */
export class SetupError extends Error {
  override readonly name = 'SetupError';
}
