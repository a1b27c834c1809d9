/**
 * `npm start` and `npm run dev`.
 *
 * On a developer's machine every setting that is missing gets a local stand-in: a private PostgreSQL
 * cluster, a mail fake, a secret, the loopback address. With NODE_ENV=production nothing is made up:
 * a missing setting stops the start and is named.
 */
import { existsSync, rmSync } from 'node:fs';
import { join, relative, resolve } from 'node:path';
import { EnvError, parseEnv } from '../../app/env.server';
import { migrate } from '../migrate';
import { demoPeople } from '../seed/demo-coaches';
import { type AppServer, startAppServer } from './app-server';
import { build, isBuilt } from './build';
import { localSettings, type Variables } from './local-settings';
import { dataFolder, projectRoot } from './paths';
import { isPortTaken } from './ports';
import { SetupError, wait } from './run';
import { takeStartLock } from './start-lock';
import { Stopping } from './stopping';

const SERVER_LOG = join(dataFolder, 'server.log');

const stopping = new Stopping();

try {
  await start(process.argv.includes('--dev'));
} catch (error) {
  if (!stopping.isStopping) {
    const known = error instanceof SetupError || error instanceof EnvError;
    console.error(known ? error.message : error);
  }
  await stopping.exit(1);
}

async function start(dev: boolean): Promise<void> {
  const file = join(projectRoot, '.env');
  if (existsSync(file)) process.loadEnvFile(file);
  const production = !dev && process.env.NODE_ENV === 'production';
  if (production) parseEnv(process.env);
  const { port, host } = readListening();
  const url = `http://${host === '127.0.0.1' ? 'localhost' : host}:${port}`;
  await takeStartLock({ pid: process.pid, url });
  await refuseTakenPort(port, host);

  const env = production ? process.env : await localSettings(process.env, port, stopping);
  const { DATABASE_URL, PUBLIC_URL } = parseEnv(env);
  await migrate(DATABASE_URL);
  const server = await serve({ dev, production, port, host, env });
  if (production) console.log(`Valveside is ready: ${PUBLIC_URL.origin}`);
  else announce(PUBLIC_URL.origin);
  const code = await server.ended;
  await stopping.exit(code || 1, `The server ended by itself, with code ${code}.`);
}

function readListening(): { port: number; host: string } {
  const text = process.env.PORT || '3000';
  const port = Number(text);
  if (!/^\d+$/.test(text) || port < 1 || port > 65_535) {
    throw new SetupError(`PORT: expected a port number between 1 and 65535, not "${text}"`);
  }
  return { port, host: process.env.HOST || '127.0.0.1' };
}

async function refuseTakenPort(port: number, host: string): Promise<void> {
  // The server of a start that was killed a moment ago is still letting go of it.
  for (let tries = 0; tries < 15; tries++) {
    if (!(await isPortTaken(port, host))) return;
    await wait(200);
  }
  throw new SetupError(
    `Port ${port} is in use by another program. Choose another: PORT=${port + 1} npm start`,
  );
}

interface Serving {
  readonly dev: boolean;
  readonly production: boolean;
  readonly port: number;
  readonly host: string;
  readonly env: Variables;
}

async function serve({ dev, production, port, host, env }: Serving): Promise<AppServer> {
  const folder = resolve(projectRoot, process.env.VALVESIDE_BUILD_DIR || 'build');
  if (!dev && !isBuilt(folder)) {
    console.log('Building …');
    await build(folder);
  }
  const starting = startAppServer({
    port,
    host,
    ...(dev ? {} : { build: folder }),
    ...(dev || production ? {} : { log: freshLog() }),
    env: { ...env, NODE_ENV: dev ? 'development' : 'production' },
  });
  stopping.add('app server', async () => (await starting).stop());
  return starting;
}

/** The server writes a line for every request; on the terminal they would bury the sign-in code. */
function freshLog(): string {
  rmSync(SERVER_LOG, { force: true });
  return SERVER_LOG;
}

function announce(url: string): void {
  const demo = process.env.DATABASE_URL ? 'yourself' : `${demoPeople.owner.email}, or as yourself`;
  const mail = process.env.SMTP_URL
    ? 'the code comes by mail'
    : `the code appears here and in ${relative(projectRoot, dataFolder)}/mail/`;
  console.log(
    [
      `\nValveside is ready: ${url}`,
      `  Practice, with no account: ${url}/practice`,
      `  Sign in as ${demo}: ${mail}`,
      '  Ctrl-C stops everything.',
    ].join('\n'),
  );
}
