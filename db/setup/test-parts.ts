import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { runTool } from './run';
import { startTestApp } from './test-app';
import { testBuild } from './test-build';
import type { Counts, Run } from './test-run';

export type Part = (run: Run) => Promise<Counts>;

/** In the order in which they run. Typecheck, lint and build count as one test each. */
export const parts = {
  typecheck: () => script('typecheck'),
  lint: () => script('lint'),
  unit: (run) => vitest('unit', run),
  build: async () => {
    await testBuild();
    return { passed: 1, failed: 0 };
  },
  integration: (run) => vitest('integration', run),
  e2e: playwright,
} satisfies Record<string, Part>;

export type PartName = keyof typeof parts;

async function script(name: string): Promise<Counts> {
  const code = await runTool('npm', ['run', '--silent', name]);
  return code === 0 ? { passed: 1, failed: 0 } : { passed: 0, failed: 1 };
}

async function vitest(project: string, { folder, rest }: Run): Promise<Counts> {
  const report = join(folder, `${project}.json`);
  const code = await runTool('npx', [
    ...['--no-install', 'vitest', 'run', '--project', project],
    ...['--reporter=default', '--reporter=json', `--outputFile.json=${report}`, ...rest],
  ]);
  const { numPassedTests = 0, numFailedTests = 0 } = readReport(report);
  return settle(code, Number(numPassedTests), Number(numFailedTests));
}

async function playwright(run: Run): Promise<Counts> {
  const report = join(run.folder, 'e2e.json');
  const env = await startTestApp(run);
  const code = await runTool('npx', ['--no-install', 'playwright', 'test', ...run.rest], {
    env: { ...process.env, ...env, E2E_REPORT: report },
  });
  const stats = readReport(report).stats as Record<string, number> | undefined;
  const { expected = 0, unexpected = 0, flaky = 0 } = stats ?? {};
  // What passed at the second try has passed; Playwright's own lines name it flaky.
  return settle(code, expected + flaky, unexpected);
}

/** A file that does not even load has no failed test of its own, and still fails the run. */
function settle(code: number, passed: number, failed: number): Counts {
  return { passed, failed: code !== 0 && failed === 0 ? 1 : failed };
}

function readReport(file: string): Record<string, unknown> {
  return existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : {};
}
