import { join } from 'node:path';
import { type AppServer, startAppServer } from '../../db/setup/app-server';
import { freePort } from '../../db/setup/ports';
import { testEnvironment } from '../../db/setup/test-app';
import { server } from './server';

/** An app server that a test may kill and start again, on the database that all tests share. */
export interface OwnApp {
  readonly url: string;
  /** As a power cut would. */
  kill(): Promise<void>;
  /** On the same port; answers when it is ready. */
  startAgain(): Promise<void>;
  stop(): Promise<void>;
}

export async function startOwnApp(): Promise<OwnApp> {
  const port = await freePort();
  const start = (): Promise<AppServer> =>
    startAppServer({
      build: server.build,
      port,
      host: '127.0.0.1',
      env: testEnvironment({ databaseUrl: server.databaseUrl, smtpUrl: server.smtpUrl, port }),
      log: join(server.mailFolder, '..', `server-${port}.log`),
    });
  let running = await start();
  return {
    url: `http://localhost:${port}`,
    kill: () => running.kill(),
    startAgain: async () => {
      running = await start();
    },
    stop: () => running.stop(),
  };
}
