import { readdirSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { QueryTypes, Sequelize } from 'sequelize';
import { Umzug } from 'umzug';

/**
 * Brings a database to the newest schema. A migration is `db/migrations/NNNN-name.ts` with
 * `export async function up({ context }: { context: Sequelize })`. Each runs in a transaction of
 * its own, which it must not open itself, so an unclean stop leaves no half of one.
 */
interface Migration {
  up(run: { context: Sequelize }): Promise<void>;
}

const folder = join(dirname(fileURLToPath(import.meta.url)), 'migrations');

/** Any number serves, as long as nothing else in the database takes a lock with it. */
const LOCK = 7_205_118;

/** Names in the order in which they are applied, without the file's extension. */
export function migrationNames(): string[] {
  return readdirSync(folder)
    .filter((file) => /^\d{4}-[a-z0-9-]+\.ts$/.test(file))
    .map((file) => file.replace(/\.ts$/, ''))
    .sort();
}

/**
 * Applies what is missing and answers its names. Two processes at once take turns.
 * @param databaseUrl a `postgres://` address
 */
export async function migrate(databaseUrl: string): Promise<string[]> {
  // One connection and no eviction: the advisory lock and the transaction live on it.
  const context = new Sequelize(databaseUrl, {
    logging: false,
    pool: { max: 1, min: 1, idle: 3_600_000 },
  });
  try {
    await context.query('SELECT pg_advisory_lock(:lock)', { replacements: { lock: LOCK } });
    await context.query(`CREATE TABLE IF NOT EXISTS schema_migrations (
      name text PRIMARY KEY, applied_at timestamptz NOT NULL DEFAULT now())`);
    const applied = await new Umzug({
      migrations: migrationNames().map((name) => ({ name, up: () => apply(context, name) })),
      context,
      storage: storage(context),
      logger: undefined,
    }).up();
    return applied.map(({ name }) => name);
  } finally {
    await context.close();
  }
}

async function apply(context: Sequelize, name: string): Promise<void> {
  const migration: Migration = await import(pathToFileURL(join(folder, `${name}.ts`)).href);
  await context.query('BEGIN');
  try {
    await migration.up({ context });
    await context.query('INSERT INTO schema_migrations (name) VALUES (:name)', {
      replacements: { name },
    });
    await context.query('COMMIT');
  } catch (error) {
    await context.query('ROLLBACK');
    throw error;
  }
}

/** The row is written by `apply`, in the same transaction as the migration itself. */
function storage(context: Sequelize) {
  return {
    logMigration: async () => {},
    unlogMigration: async () => {
      throw new Error('Migrations go forward only: write a new one.');
    },
    executed: async () => {
      const rows = await context.query<{ name: string }>('SELECT name FROM schema_migrations', {
        type: QueryTypes.SELECT,
      });
      return rows.map(({ name }) => name);
    },
  };
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const url = process.env.DATABASE_URL;
  if (!url) throw new Error('DATABASE_URL: missing, expected a PostgreSQL address, postgres://…');
  const applied = await migrate(url);
  console.log(applied.length === 0 ? 'The database is up to date.' : `Applied: ${applied}`);
}
