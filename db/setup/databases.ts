import pg from 'pg';

/** Opens one connection, uses it and closes it. */
export async function withConnection<T>(
  url: string,
  use: (client: pg.Client) => Promise<T>,
): Promise<T> {
  const client = new pg.Client({ connectionString: url, connectionTimeoutMillis: 10_000 });
  await client.connect();
  try {
    return await use(client);
  } finally {
    await client.end();
  }
}

/** @param adminUrl a database of the same cluster, usually `postgres` */
export function databaseExists(adminUrl: string, name: string): Promise<boolean> {
  return withConnection(adminUrl, async (client) => {
    const found = await client.query('SELECT 1 FROM pg_database WHERE datname = $1', [name]);
    return found.rowCount === 1;
  });
}

/** @param template a database to copy, which nobody may be connected to */
export function createDatabase(adminUrl: string, name: string, template?: string): Promise<void> {
  return admin(adminUrl, (quote) =>
    template
      ? `CREATE DATABASE ${quote(name)} TEMPLATE ${quote(template)}`
      : `CREATE DATABASE ${quote(name)}`,
  );
}

/** Ends its connections first. No error when there is none of this name. */
export function dropDatabase(adminUrl: string, name: string): Promise<void> {
  return admin(adminUrl, (quote) => `DROP DATABASE IF EXISTS ${quote(name)} WITH (FORCE)`);
}

export function renameDatabase(adminUrl: string, from: string, to: string): Promise<void> {
  return admin(adminUrl, (quote) => `ALTER DATABASE ${quote(from)} RENAME TO ${quote(to)}`);
}

/** True when no table but the list of migrations holds a row. */
export function isEmpty(url: string): Promise<boolean> {
  return withConnection(url, async (client) => {
    const tables = await client.query<{ name: string }>(
      `SELECT quote_ident(tablename) AS name FROM pg_tables
        WHERE schemaname = 'public' AND tablename <> 'schema_migrations'`,
    );
    for (const { name } of tables.rows) {
      const row = await client.query(`SELECT 1 FROM public.${name} LIMIT 1`);
      if (row.rowCount) return false;
    }
    return true;
  });
}

async function admin(url: string, statement: (quote: (name: string) => string) => string) {
  await withConnection(url, async (client) => {
    await client.query(statement((name) => client.escapeIdentifier(name)));
  });
}
