import { QueryTypes } from 'sequelize';
import { sequelize } from '~/models/database.server';

export interface Readiness {
  readonly ready: boolean;
  /** Why not, without addresses or passwords. */
  readonly detail: string;
}

/** Longer than this counts as out of reach: whoever asks asks again soon. */
const ANSWER_WITHIN_MS = 3000;

/** The names of the migrations that were there at build time. They are listed, never loaded. */
const known = Object.keys(import.meta.glob('/db/migrations/*.ts')).map((path) =>
  path.replace(/^.*\/|\.ts$/g, ''),
);

/** Whether the database answers and has every migration that this build knows. */
export async function readReadiness(expected: readonly string[] = known): Promise<Readiness> {
  try {
    const applied = await within(ANSWER_WITHIN_MS, appliedMigrations());
    const missing = expected.filter((name) => !applied.has(name));
    if (missing.length === 0) return { ready: true, detail: '' };
    return { ready: false, detail: `Migrations to be applied: ${missing.join(', ')}.` };
  } catch {
    return { ready: false, detail: 'The database does not answer.' };
  }
}

async function appliedMigrations(): Promise<Set<string>> {
  const rows = await sequelize.query<{ name: string }>('SELECT name FROM schema_migrations', {
    type: QueryTypes.SELECT,
  });
  return new Set(rows.map(({ name }) => name));
}

async function within<T>(milliseconds: number, promise: Promise<T>): Promise<T> {
  let timer: ReturnType<typeof setTimeout> | undefined;
  const late = new Promise<never>((_, reject) => {
    timer = setTimeout(() => reject(new Error('late')), milliseconds);
  });
  try {
    return await Promise.race([promise, late]);
  } finally {
    clearTimeout(timer);
  }
}
