import { parentPort } from 'node:worker_threads';
import { type Job, runJob } from './job';

parentPort?.on('message', (job: Job) => {
  runJob(job).then((outcomes) => parentPort?.postMessage(outcomes));
});
