import { type ChildProcess, fork } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { type Job, runJob } from './job';
import type { FillOutcome } from './outcome';

export interface Result {
  job: Job;
  outcomes: FillOutcome[];
}

/** Runs all jobs, here or on that many workers; results come in the order of the jobs. */
export async function runAll(
  jobs: Job[],
  workers: number,
  progress: (done: number) => void,
): Promise<Result[]> {
  const results: (Result | undefined)[] = jobs.map(() => undefined);
  let next = 0;
  let done = 0;
  const lane = async (run: (job: Job) => Promise<FillOutcome[]>) => {
    for (let index = next++; index < jobs.length; index = next++) {
      const job = jobs[index]!;
      results[index] = { job, outcomes: await run(job) };
      progress(++done);
    }
  };
  if (workers <= 1) await lane(runJob);
  else await Promise.all(Array.from({ length: workers }, () => withWorker(lane)));
  return results.filter((result) => result !== undefined);
}

async function withWorker(
  lane: (run: (job: Job) => Promise<FillOutcome[]>) => Promise<void>,
): Promise<void> {
  // A process and not a thread: a thread does not inherit the loader that reads TypeScript.
  const worker = fork(fileURLToPath(new URL('./worker.ts', import.meta.url)), {
    execArgv: process.execArgv,
    serialization: 'advanced',
  });
  try {
    await lane((job) => ask(worker, job));
  } finally {
    worker.kill();
  }
}

function ask(worker: ChildProcess, job: Job): Promise<FillOutcome[]> {
  return new Promise((resolve, reject) => {
    const settle = (finish: () => void) => {
      worker.removeAllListeners();
      finish();
    };
    worker.once('message', (outcomes: FillOutcome[]) => settle(() => resolve(outcomes)));
    worker.once('exit', (code) => settle(() => reject(new Error(`worker ended with ${code}`))));
    worker.send(job);
  });
}
