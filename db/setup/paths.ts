import { mkdirSync } from 'node:fs';
import { dirname, join, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';

/** The project's own folder. */
export const projectRoot = dirname(dirname(dirname(fileURLToPath(import.meta.url))));

/**
 * What a start keeps between runs: cluster, mail, secret. Tests never look at it; those that test
 * the start itself name another folder.
 */
export const dataFolder = resolve(projectRoot, process.env.VALVESIDE_DATA_DIR || '.data');

/** What test runs make and remove again. */
export const testDataFolder = join(projectRoot, '.test-data');

/**
 * Makes one of the two folders. Others may pass through but not list it: PostgreSQL runs as a
 * user of its own when the set-up runs as root.
 */
export function makePassable(folder: string): string {
  mkdirSync(folder, { recursive: true, mode: 0o711 });
  return folder;
}
