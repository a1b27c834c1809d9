import { type ChildProcess, spawn } from 'node:child_process';
import { closeSync, openSync } from 'node:fs';
import { join } from 'node:path';
import { projectRoot } from './paths';
import { SetupError, wait } from './run';

export interface AppServer {
  readonly url: string;
  readonly pid: number;
  /** Ends with the server, whatever ended it. */
  readonly ended: Promise<number>;
  /** Asks first, and kills after six seconds. */
  stop(): Promise<void>;
  /** As a power cut would. */
  kill(): Promise<void>;
}

export interface AppServerOptions {
  /** Where the build is; without one it is Vite's dev server. */
  readonly build?: string;
  readonly port: number;
  readonly host: string;
  /** Every variable that the app reads, PORT and HOST excepted. */
  readonly env: Readonly<Record<string, string | undefined>>;
  /** A file for the server's own lines; without one they go to the terminal. */
  readonly log?: string;
}

const READY_WITHIN_MS = 60_000;

/** Starts the app as the design names it, by `react-router-serve`, and waits until it is ready. */
export async function startAppServer(options: AppServerOptions): Promise<AppServer> {
  const server = launch(options);
  try {
    await waitUntilReady(server);
    return server;
  } catch (error) {
    await server.stop();
    throw error;
  }
}

/** Starts it and waits for nothing. */
export function launch(options: AppServerOptions): AppServer {
  const log = options.log ? openSync(options.log, 'a', 0o600) : 'inherit';
  const child = spawn(process.execPath, programFor(options), {
    cwd: projectRoot,
    // A group of its own: Ctrl-C reaches the command alone, which then stops all in order.
    detached: true,
    stdio: ['pipe', log, log],
    env: { ...options.env, PORT: String(options.port), HOST: options.host },
  });
  if (typeof log === 'number') closeSync(log);
  const ended = new Promise<number>((resolve) => {
    child.on('error', () => resolve(1));
    child.on('exit', (code) => resolve(code ?? 1));
  });
  return {
    url: `http://${options.host}:${options.port}`,
    pid: child.pid ?? 0,
    ended,
    stop: () => stop(child, ended),
    kill: async () => {
      child.kill('SIGKILL');
      await ended;
    },
  };
}

function programFor({ build, port, host }: AppServerOptions): string[] {
  const modules = join(projectRoot, 'node_modules', '@react-router');
  const leash = ['--import', join(projectRoot, 'db', 'setup', 'leash.mjs')];
  return build
    ? [...leash, join(modules, 'serve', 'bin.js'), join(build, 'server', 'index.js')]
    : [
        ...leash,
        join(modules, 'dev', 'bin.js'),
        ...['dev', '--port', String(port), '--host', host, '--strictPort'],
      ];
}

async function stop(child: ChildProcess, ended: Promise<number>): Promise<void> {
  child.kill('SIGTERM');
  const kill = setTimeout(() => child.kill('SIGKILL'), 6000);
  await ended;
  clearTimeout(kill);
}

async function waitUntilReady(server: AppServer): Promise<void> {
  const until = Date.now() + READY_WITHIN_MS;
  let gone: number | undefined;
  server.ended.then((code) => {
    gone = code;
  });
  let last = 'no answer';
  while (Date.now() < until) {
    if (gone !== undefined) throw new SetupError(`The server ended at once, with code ${gone}.`);
    try {
      const answer = await fetch(`${server.url}/readyz`, { signal: AbortSignal.timeout(5000) });
      if (answer.ok) return;
      last = `${answer.status} ${(await answer.text()).slice(0, 500)}`;
    } catch (error) {
      last = error instanceof Error ? error.message : String(error);
    }
    await wait(100);
  }
  throw new SetupError(`The server is not ready after ${READY_WITHIN_MS / 1000} s: ${last}`);
}
