import { testEnvironment } from '../db/setup/test-app';
import { server } from './setup/server';

// The factories of `tests/` reach the database through the app's own models, which read where it is
// at their first question. Import this file before using them.
Object.assign(
  process.env,
  testEnvironment({
    databaseUrl: server.databaseUrl,
    smtpUrl: server.smtpUrl,
    port: Number(new URL(server.url).port),
  }),
);

/** Signs the browser of a test in as somebody: `cookie` is what `createLoginSession` answers. */
export const cookieOf = (cookie: string) => {
  const at = cookie.indexOf('=');
  return { name: cookie.slice(0, at), value: cookie.slice(at + 1), url: server.url };
};
