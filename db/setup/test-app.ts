import { join } from 'node:path';
import { migrate } from '../migrate';
import { startAppServer } from './app-server';
import { ensureChromium } from './chromium';
import { startCluster } from './cluster';
import { createDatabase } from './databases';
import { startMailFake } from './mail-fake';
import { freePort } from './ports';
import { seed } from './seed';
import { testBuild } from './test-build';
import type { Run } from './test-run';

const DATABASE = 'valveside';

/**
 * Starts the built app for the end-to-end tests, with a database, a mail fake and a port of its own.
 * @returns the variables by which the tests find it; `e2e/setup/server.ts` reads them
 */
export async function startTestApp({ folder, stopping }: Run): Promise<Record<string, string>> {
  await ensureChromium();
  const build = await testBuild();
  const databaseUrl = await startDatabase(folder, stopping);
  const mailFolder = join(folder, 'mail');
  const mail = await startMailFake({ folder: mailFolder });
  stopping.add('mail fake', () => mail.stop());
  const port = await freePort();
  const env = testEnvironment({ databaseUrl, smtpUrl: mail.url, port });
  await seed(env);
  const log = join(folder, 'server.log');
  const server = await startAppServer({ build, port, host: '127.0.0.1', env, log });
  stopping.add('app server', () => server.stop());
  return {
    E2E_URL: env.PUBLIC_URL ?? '',
    E2E_DATABASE_URL: databaseUrl,
    E2E_MAIL_FOLDER: mailFolder,
    E2E_SMTP_URL: mail.url,
    E2E_BUILD: build,
    E2E_SERVER_LOG: log,
  };
}

async function startDatabase(folder: string, stopping: Run['stopping']): Promise<string> {
  const starting = startCluster({ parent: folder, name: 'cluster', durable: false });
  stopping.add('PostgreSQL', async () => (await starting).stop());
  const cluster = await starting;
  await createDatabase(cluster.url('postgres'), DATABASE);
  await migrate(cluster.url(DATABASE));
  return cluster.url(DATABASE);
}

/** What the app reads when a test starts it. */
export function testEnvironment(given: {
  readonly databaseUrl: string;
  readonly smtpUrl: string;
  readonly port: number;
}): Record<string, string | undefined> {
  return {
    PATH: process.env.PATH,
    HOME: process.env.HOME,
    NODE_ENV: 'production',
    VALVESIDE_MODE: 'test',
    DATABASE_URL: given.databaseUrl,
    SMTP_URL: given.smtpUrl,
    MAIL_FROM: 'Valveside <no-reply@valveside.example>',
    SESSION_SECRET: 'a secret for tests, which guards nothing at all',
    PUBLIC_URL: `http://localhost:${given.port}`,
    LOG_LEVEL: 'warn',
  };
}
