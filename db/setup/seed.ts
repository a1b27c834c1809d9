import { join } from 'node:path';
import { projectRoot } from './paths';
import { runTool, SetupError } from './run';

/**
 * Fills a database with the demo, in a process of its own: the app's code keeps one database and one
 * set of settings for the life of a process.
 * @param env every variable that the app reads
 */
export async function seed(env: Readonly<Record<string, string | undefined>>): Promise<void> {
  const script = join(projectRoot, 'db', 'setup', 'seed-process.ts');
  const code = await runTool(process.execPath, ['--import', 'tsx', script], { env: { ...env } });
  if (code !== 0) throw new SetupError('The demo could not be filled in; its words stand above.');
}
