import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { projectRoot } from './paths';
import { runTool, SetupError } from './run';

/** Everything that a build is made from. */
const SOURCES = [
  'app',
  'db/migrations',
  'public',
  'package.json',
  'package-lock.json',
  'react-router.config.ts',
  'tsconfig.json',
  'vite.config.ts',
];

/** One hash of the names and contents of all sources. */
export function sourceHash(root = projectRoot): string {
  const hash = createHash('sha256');
  for (const source of SOURCES) addTo(hash, root, source);
  return hash.digest('hex');
}

function addTo(hash: ReturnType<typeof createHash>, root: string, path: string): void {
  const full = join(root, path);
  if (!existsSync(full)) return;
  if (statSync(full).isDirectory()) {
    for (const name of readdirSync(full).sort()) addTo(hash, root, join(path, name));
    return;
  }
  hash.update(`${path}\0`).update(readFileSync(full)).update('\0');
}

const stampOf = (folder: string) => join(folder, 'sources.sha256');

export function isBuilt(folder: string): boolean {
  const stamp = stampOf(folder);
  return existsSync(stamp) && readFileSync(stamp, 'utf8') === sourceHash();
}

/**
 * Builds into a folder. The stamp goes first and comes last, so a build that was cut short counts
 * as none.
 */
export async function build(folder: string): Promise<void> {
  rmSync(stampOf(folder), { force: true });
  const hash = sourceHash();
  const code = await runTool('npm', ['run', '--silent', 'build'], {
    env: { ...process.env, NODE_ENV: 'production', VALVESIDE_BUILD_DIR: folder },
    quiet: true,
  });
  if (code !== 0) throw new SetupError('The build failed; its words stand above.');
  writeFileSync(stampOf(folder), hash);
}
