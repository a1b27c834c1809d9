import { setTimeout as pause } from 'node:timers/promises';
import type { Actor } from '~/access/can';
import type { FillSetup } from '~/air';
import { computeResult } from '~/commands/compute-result.server';
import type { FillResult, Replayed, TraceSample } from '~/fill/replay';
import type { StoredEvent } from '~/fill/wire';
import type { WheelPosition } from '~/loads';
import { Coach } from '~/models/coach.server';
import { Round } from '~/models/round.server';
import type { Run } from '~/models/run.server';
import { RunResult } from '~/models/run-result.server';
import { notFound } from '~/services/refusal.server';
import { replay } from '~/services/replay-pool.server';
import { requireRun } from './round-access.server';
import { loadLog } from './run-log.server';

/** A fill looked back at. Pressures are gauge kPa. */
export interface Review {
  id: string;
  coachId: string;
  coachName: string;
  roundId: string;
  position: WheelPosition;
  startedAt: Date;
  /** Of the round, such as America/Denver. */
  timeZone: string;
  place: string;
  setup: FillSetup;
  /** Another fill was open on the coach at the same time: this one taught the profile nothing. */
  overlapping: boolean;
  /** By number. */
  log: StoredEvent[];
  /** What the engine believed, by time, from the start to the end. */
  samples: TraceSample[];
  /** Null while the fill is open. */
  result: (FillResult & { engineVersion: string; lastSeq: number }) | null;
  /** The replay is still at work: there are no samples yet, and perhaps no result. */
  pending: boolean;
}

/**
 * A fill with its log, its trace and its result. A result that is missing, or was computed before
 * the log's last event, is computed now.
 * @param patienceMs after this time it answers without the trace, which is then `pending`
 * @throws Refusal `fill-not-found` to those who may not see the coach; `not-allowed` to a helper
 */
export async function loadReview(
  actor: Actor,
  fillId: string,
  patienceMs = 60_000,
): Promise<Review> {
  const run = await requireRun(actor, 'log:see', fillId);
  const [coach, round, log] = await Promise.all([
    Coach.findByPk(run.coachId),
    Round.findByPk(run.roundId),
    loadLog(run.id),
  ]);
  if (!coach || !round) throw notFound('fill');
  const replayed = await Promise.race([
    traceOf(run, log),
    pause(patienceMs, undefined, { ref: false }),
  ]);
  const { id, coachId, roundId, position, startedAt, setup, overlapping } = run;
  const { timeZone, place } = round;
  return {
    ...{ id, coachId, coachName: coach.name, roundId, position, startedAt, timeZone, place },
    ...{ setup, overlapping, log, samples: replayed?.samples ?? [] },
    ...{ result: await resultOf(run), pending: !replayed },
  };
}

/** Traces of the fills looked at last: each costs the engine half a second or more. */
const traces = new Map<string, Promise<Replayed>>();
const mostTraces = 16;

function traceOf(run: Run, log: readonly StoredEvent[]): Promise<Replayed> {
  const key = `${run.id} ${log.at(-1)?.seq ?? 0}`;
  const known = traces.get(key);
  if (known) return known;
  const made = replayOf(run, log);
  traces.set(key, made);
  made.catch(() => traces.delete(key));
  if (traces.size > mostTraces) traces.delete([...traces.keys()][0] ?? '');
  return made;
}

async function replayOf(run: Run, log: readonly StoredEvent[]): Promise<Replayed> {
  const isComputed = run.endedSeq === null || (await resultOf(run));
  return isComputed ? replay({ setup: run.setup, log }) : computeResult(run.id);
}

/** The newest result, when it counts all of the log; another version's counts as well. */
async function resultOf(run: Run): Promise<Review['result']> {
  const row = await RunResult.findOne({
    where: { runId: run.id, lastSeq: run.lastSeq },
    order: [['computedAt', 'DESC']],
  });
  if (!row) return null;
  const { engineVersion, lastSeq } = row;
  return { ...(row.result as FillResult), engineVersion, lastSeq };
}
