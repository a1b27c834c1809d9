import { QueryTypes } from 'sequelize';
import { expect, test } from 'vitest';
import { sequelize } from '~/models/database.server';
import { migrate, migrationNames } from '../db/migrate';

async function applied(): Promise<string[]> {
  const rows = await sequelize.query<{ name: string }>(
    'SELECT name FROM schema_migrations ORDER BY name',
    { type: QueryTypes.SELECT },
  );
  return rows.map(({ name }) => name);
}

test('a test file gets a database with every migration applied', async () => {
  expect(await applied()).toEqual(migrationNames());
});

test('migrations are stored without extension, so a second run applies none again', async () => {
  expect(await migrate(process.env.DATABASE_URL ?? '')).toEqual([]);
  for (const name of await applied()) expect(name).toMatch(/^\d{4}-[a-z0-9-]+$/);
});
