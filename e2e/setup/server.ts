import type { QueryResultRow } from 'pg';
import { withConnection } from '../../db/setup/databases';
import * as folder from '../../db/setup/mail-folder';

/** Where the app under test is; `npm run test:e2e` starts it and says so. */
export const server = {
  url: told('E2E_URL'),
  databaseUrl: told('E2E_DATABASE_URL'),
  smtpUrl: told('E2E_SMTP_URL'),
  mailFolder: told('E2E_MAIL_FOLDER'),
  build: told('E2E_BUILD'),
};

/** Rows straight from the app's database, to find there what the screens say. */
export function query<Row extends QueryResultRow>(
  sql: string,
  values: readonly unknown[] = [],
): Promise<Row[]> {
  return withConnection(server.databaseUrl, async (client) => {
    return (await client.query<Row>(sql, [...values])).rows;
  });
}

/** Waits for the sign-in code in the newest mail to an address. Give every test its own address. */
export const codeFor = (address: string, count = 1) =>
  folder.codeFor(server.mailFolder, address, count);

function told(name: string): string {
  const value = process.env[name];
  if (!value) throw new Error(`${name} is missing: start these tests with npm run test:e2e`);
  return value;
}
