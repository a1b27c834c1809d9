import { expect, inject, test } from 'vitest';
import { readReadiness } from '~/queries/readiness.server';
import { loader as healthz } from '~/routes/health/healthz';
import { loader as readyz } from '~/routes/health/readyz';
import { migrationNames } from '../db/migrate';
import { dropDatabase } from '../db/setup/databases';

const database = () => new URL(process.env.DATABASE_URL ?? '').pathname.slice(1);

test('a migrated database is ready', async () => {
  const answer = await readyz();
  expect(answer.status).toBe(200);
  expect(await answer.json()).toEqual({ status: 'ready' });
});

test('a migration that is not applied is named, and the server is not ready', async () => {
  const names = [...migrationNames(), '9999-from-tomorrow'];
  expect(await readReadiness(names)).toEqual({
    ready: false,
    detail: 'Migrations to be applied: 9999-from-tomorrow.',
  });
});

test('without its database the server is alive, not ready, and gives no address away', async () => {
  await dropDatabase(inject('adminUrl'), database());
  const answer = await readyz();
  expect(answer.status).toBe(503);
  expect(answer.headers.get('Content-Type')).toBe('application/problem+json');
  const problem = await answer.json();
  expect(problem).toMatchObject({ status: 503, code: 'not-ready' });
  expect(JSON.stringify(problem)).not.toMatch(/127\.0\.0\.1|postgres|test_/);
  expect(healthz().status).toBe(200);
});
