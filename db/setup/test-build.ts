import { existsSync, mkdirSync, readdirSync, rmSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { build, isBuilt, sourceHash } from './build';
import { testDataFolder } from './paths';

/** Builds of older sources are removed after this time; another run may still use a younger one. */
const KEEP_MS = 2 * 3_600_000;

/**
 * A build of the present sources for tests, apart from the one that a start serves. Kept by the
 * sources' hash, so a second run of the same sources builds nothing.
 */
export async function testBuild(): Promise<string> {
  const builds = join(testDataFolder, 'builds');
  mkdirSync(builds, { recursive: true });
  removeOld(builds);
  const hash = sourceHash().slice(0, 16);
  const known = readdirSync(builds).find(
    (name) => name.startsWith(hash) && isBuilt(join(builds, name)),
  );
  if (known) {
    console.log('These sources are built already.');
    return join(builds, known);
  }
  // Never renamed: the server's bundle names the folder that its assets are served from.
  const folder = join(builds, `${hash}-${process.pid}`);
  await build(folder);
  return folder;
}

function removeOld(builds: string): void {
  for (const name of readdirSync(builds)) {
    const folder = join(builds, name);
    if (existsSync(folder) && Date.now() - statSync(folder).mtimeMs > KEEP_MS) {
      rmSync(folder, { recursive: true, force: true });
    }
  }
}
