import { type ChildProcess, type SpawnOptions, spawn } from 'node:child_process';
import { projectRoot } from './paths';

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

const tools = new Set<ChildProcess>();

export interface ToolOptions {
  readonly env?: NodeJS.ProcessEnv;
  /** Keeps its lines to itself unless it fails. */
  readonly quiet?: boolean;
}

/**
 * Runs a tool of the project in its folder, with its lines on the terminal.
 * @returns its exit code
 */
export function runTool(
  command: string,
  args: readonly string[],
  { env = process.env, quiet = false }: ToolOptions = {},
): Promise<number> {
  const output = quiet ? 'pipe' : 'inherit';
  const child = spawn(command, args, {
    cwd: projectRoot,
    env,
    // A group of its own, so that stopping it takes along whatever it started.
    detached: true,
    stdio: ['ignore', output, output],
  });
  tools.add(child);
  const kept: Buffer[] = [];
  child.stdout?.on('data', (chunk: Buffer) => kept.push(chunk));
  child.stderr?.on('data', (chunk: Buffer) => kept.push(chunk));
  return new Promise((resolve) => {
    const end = (code: number) => {
      if (code !== 0) process.stderr.write(Buffer.concat(kept));
      tools.delete(child);
      resolve(code);
    };
    child.on('error', () => end(127));
    child.on('close', (code) => end(code ?? 1));
  });
}

/** Ends every tool that is still running, with its descendants. */
export function endTools(): void {
  for (const { pid } of tools) {
    try {
      if (pid) process.kill(-pid, 'SIGTERM');
    } catch {
      // It ended in the meantime.
    }
  }
}

export const wait = (milliseconds: number) =>
  new Promise<void>((resolve) => {
    setTimeout(resolve, milliseconds);
  });

/** What stops a command with words for the person who typed it, and no stack. */
export class SetupError extends Error {
  override readonly name = 'SetupError';
}
