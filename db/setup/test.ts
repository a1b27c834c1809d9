/**
 * `npm test`: sets up what is missing, runs every part and closes with `N passed, N failed`.
 *
 *   npm test                                       all parts
 *   npm run test:unit -- app/units                 Vitest's unit project; paths and flags go to Vitest
 *   npm run test:integration -- tests/rounds.test.ts
 *   npm run test:e2e -- e2e/sign-in.spec.ts        paths and flags go to Playwright
 *   npm run validate                               typecheck, lint and unit tests
 *
 * Underneath: `node db/setup/bootstrap.mjs test --only PART[,PART] [what the part's tool takes]`,
 * with the parts typecheck, lint, unit, integration, build and e2e. In an installed clone
 * `npx vitest run tests/rounds.test.ts` works as well; Playwright needs the app that this starts.
 *
 * A run makes its own cluster, mail fake, ports and databases in a folder of its own under
 * `.test-data/` and removes them. So several runs in one clone don't meet, and none touches `.data/`,
 * `build/` or a running start.
 */

import { SetupError } from './run';
import { Stopping } from './stopping';
import { makeTestFolder, removeTestFolder } from './test-folder';
import { type Part, type PartName, parts } from './test-parts';
import type { Counts, Run } from './test-run';

const stopping = new Stopping();

try {
  const code = await runTests(process.argv.slice(2));
  await stopping.exit(code);
} catch (error) {
  console.error(error instanceof SetupError ? error.message : error);
  console.log('0 passed, 1 failed');
  await stopping.exit(1);
}

async function runTests(args: readonly string[]): Promise<number> {
  const { names, rest } = readArguments(args);
  const folder = await makeTestFolder();
  stopping.add('test folder', () => removeTestFolder(folder));
  const run: Run = { folder, rest, stopping };
  const results: Result[] = [];
  for (const name of names) results.push(await timed(name, parts[name], run));
  const sum = (key: 'passed' | 'failed') => results.reduce((total, part) => total + part[key], 0);
  console.log(
    `\n${results.map((part) => `${part.name.padEnd(12)} ${part.seconds.toFixed(1).padStart(6)} s  ${part.passed} passed, ${part.failed} failed`).join('\n')}\n`,
  );
  console.log(`${sum('passed')} passed, ${sum('failed')} failed`);
  return sum('failed') === 0 ? 0 : 1;
}

interface Result extends Counts {
  readonly name: PartName;
  readonly seconds: number;
}

/** A part that breaks counts as one failure, and the parts after it still run. */
async function timed(name: PartName, part: Part, run: Run): Promise<Result> {
  console.log(`\n── ${name}`);
  const start = performance.now();
  let counts = { passed: 0, failed: 1 };
  try {
    counts = await part(run);
  } catch (error) {
    console.error(error instanceof SetupError ? error.message : error);
  }
  return { name, ...counts, seconds: (performance.now() - start) / 1000 };
}

function readArguments(args: readonly string[]): { names: PartName[]; rest: readonly string[] } {
  const all = Object.keys(parts) as PartName[];
  const [flag, list = '', ...rest] = args;
  if (flag === undefined) return { names: all, rest: [] };
  const names = list.split(',').map((text) => all.find((name) => name === text));
  const known = names.filter((name) => name !== undefined);
  if (flag !== '--only' || known.length !== names.length) {
    throw new SetupError(`expected nothing, or --only with some of ${all.join(', ')}`);
  }
  return { names: known, rest };
}
