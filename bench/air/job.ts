import { type CreateFill, roundsByCrew } from './crew-round';
import type { Watch } from './fill-run';
import type { Habits } from './habits';
import type { Who } from './options';
import type { FillOutcome } from './outcome';
import { roundByEye } from './people-round';
import { EXPERT, PLAIN } from './person-traits';

/** One coach for one actor: what a worker is handed. */
export interface Job {
  who: Who;
  coach: number;
  rounds: number;
  habits: Habits;
}

export async function runJob(
  job: Job,
  watch?: (tire: number) => Watch | undefined,
): Promise<FillOutcome[]> {
  if (job.who === 'plain') return roundByEye(job.coach, PLAIN, 1);
  if (job.who === 'expert') return roundByEye(job.coach, EXPERT, 2);
  const { habits, rounds } = job;
  if (job.who === 'all-seeing') {
    return roundsByCrew(job.coach, { habits, rounds: 1, createFill: null, watch });
  }
  return roundsByCrew(job.coach, { habits, rounds, createFill: await theProduct(), watch });
}

/** Loaded when wanted, so that people can be measured without an engine. */
async function theProduct(): Promise<CreateFill> {
  const { createFill } = await import('../../app/air/index');
  return createFill;
}
