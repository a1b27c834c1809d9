import { randomBytes } from 'node:crypto';
import { afterAll, inject } from 'vitest';
import { createDatabase, dropDatabase } from '../../db/setup/databases';

/**
 * Runs before each integration file: a migrated database of the file's own, and the environment that
 * points the app at it. So files run in parallel and never see each other's rows.
 */
const adminUrl = inject('adminUrl');
const name = `test_${randomBytes(6).toString('hex')}`;
await createDatabase(adminUrl, name, 'template_valveside');

Object.assign(process.env, {
  VALVESIDE_MODE: 'test',
  NODE_ENV: 'test',
  DATABASE_URL: Object.assign(new URL(adminUrl), { pathname: `/${name}` }).href,
  SMTP_URL: inject('smtpUrl'),
  MAIL_FROM: 'Valveside <no-reply@valveside.example>',
  SESSION_SECRET: 'a secret for tests, which guards nothing at all',
  PUBLIC_URL: 'http://localhost:3000',
  LOG_LEVEL: 'silent',
});

afterAll(async () => {
  const { sequelize } = await import('~/models/database.server');
  await sequelize.close();
  await dropDatabase(adminUrl, name);
});
