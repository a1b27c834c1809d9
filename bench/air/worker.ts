import { type Job, runJob } from './job';

/** A process of its own: takes a job, answers with its outcomes, until the bench lets go. */
process.on('message', (job: Job) => {
  runJob(job).then((outcomes) => process.send?.(outcomes));
});
