import { Sequelize } from 'sequelize';
import { env } from '~/env.server';

/** Connections of one app server; PostgreSQL's own default leaves room for about ten servers. */
const POOL_SIZE = 10;

const kept = globalThis as typeof globalThis & { valvesideDatabase?: Sequelize };

function open(): Sequelize {
  return new Sequelize({
    dialect: 'postgres',
    logging: false,
    pool: { max: POOL_SIZE, min: 0, idle: 10_000, acquire: 15_000 },
    hooks: {
      // The address is read when the first connection is opened, so that a unit test may import a
      // model without a database.
      beforeConnect: (config) => {
        Object.assign(config, connectionOf(env.DATABASE_URL));
      },
    },
  });
}

function connectionOf(address: string) {
  const url = new URL(address);
  return {
    host: url.hostname.replace(/^\[|\]$/g, ''),
    port: url.port || '5432',
    database: decodeURIComponent(url.pathname.slice(1)),
    username: decodeURIComponent(url.username),
    password: decodeURIComponent(url.password),
    dialectOptions: { ssl: encryptionOf(url.searchParams.get('sslmode')) },
  };
}

/** As libpq reads `sslmode`: `require` encrypts, the verifying modes also check the certificate. */
function encryptionOf(mode: string | null): boolean | { rejectUnauthorized: boolean } {
  if (mode === 'verify-full' || mode === 'verify-ca') return true;
  return mode === 'require' ? { rejectUnauthorized: false } : false;
}

/** The one Sequelize instance of this process, kept across reloads of the dev server. */
kept.valvesideDatabase ??= open();
export const sequelize: Sequelize = kept.valvesideDatabase;
