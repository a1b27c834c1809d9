import { randomUUID } from 'node:crypto';
import { QueryTypes, type Transaction } from 'sequelize';
import { type AirProfile, ENGINE_VERSION } from '~/air';
import type { Replayed } from '~/fill/replay';
import { sequelize } from '~/models/database.server';
import { Run } from '~/models/run.server';
import { loadLog } from '~/queries/run-log.server';
import { log } from '~/services/log.server';
import { ReplayEnded, replay } from '~/services/replay-pool.server';

/**
 * Replays a fill that has ended and keeps its result, as a new row, with the version of the engine
 * and the last number that it was computed from; and what it taught about the coach's air, unless
 * it overlapped another fill. Answers what was replayed.
 * @param runId of a fill that has ended
 */
export async function computeResult(runId: string): Promise<Replayed> {
  const run = await Run.findByPk(runId);
  if (!run) throw new Error(`run ${runId} is gone`);
  const events = (await loadLog(runId)).filter(({ seq }) => seq <= run.lastSeq);
  const replayed = await replay({ setup: run.setup, log: events });
  if (replayed.result.outcome === null) return replayed;
  await sequelize.transaction(async (transaction) => {
    await keepResult(run, replayed, transaction);
    await keepProfile(run, replayed, transaction);
  });
  return replayed;
}

const insertResult = `
  INSERT INTO run_results (id, run_id, engine_version, last_seq, result)
  VALUES (:id, :runId, :engineVersion, :lastSeq, CAST(:result AS jsonb))
  ON CONFLICT (run_id, engine_version, last_seq) DO NOTHING`;

async function keepResult(run: Run, { result }: Replayed, transaction: Transaction): Promise<void> {
  await sequelize.query(insertResult, {
    replacements: {
      id: randomUUID(),
      runId: run.id,
      engineVersion: ENGINE_VERSION,
      lastSeq: run.lastSeq,
      result: JSON.stringify(result),
    },
    type: QueryTypes.INSERT,
    transaction,
  });
}

// Learned when the fill ended, not when it was computed: an older fill that is computed late must
// not count as the newest. Overlapping is asked here, under the run's lock, since another fill may
// have come in meanwhile.
const insertProfile = `
  INSERT INTO air_profiles
    (id, coach_id, rig_key, run_id, schema_version, engine_version, profile, learned_at)
  SELECT :id, coach_id, rig_key, id, :schema, :engineVersion, CAST(:profile AS jsonb),
    started_at + :seconds * interval '1 second'
  FROM runs WHERE id = :runId AND NOT overlapping FOR SHARE
  ON CONFLICT (run_id) DO UPDATE SET schema_version = excluded.schema_version,
    engine_version = excluded.engine_version, profile = excluded.profile,
    learned_at = excluded.learned_at`;

async function keepProfile(
  run: Run,
  { profile, result }: Replayed,
  transaction: Transaction,
): Promise<void> {
  await sequelize.query(insertProfile, {
    replacements: {
      id: randomUUID(),
      runId: run.id,
      engineVersion: ENGINE_VERSION,
      schema: (profile satisfies AirProfile).schema,
      profile: JSON.stringify(profile),
      seconds: result.seconds,
    },
    type: QueryTypes.INSERT,
    transaction,
  });
}

/** Results that are on their way, by run. */
const computing = new Map<string, { again: boolean; done: Promise<void> }>();

/** Computes a fill's result soon and answers at once; what is added meanwhile is computed too. */
export function queueResult(runId: string): void {
  const known = computing.get(runId);
  if (known) known.again = true;
  else computing.set(runId, { again: false, done: work(runId) });
}

async function work(runId: string): Promise<void> {
  try {
    await computeResult(runId);
  } catch (fault) {
    // A server that stops leaves the result to the first view.
    if (!(fault instanceof ReplayEnded)) log.error({ err: fault, runId }, 'no result was computed');
  }
  const again = computing.get(runId)?.again;
  computing.delete(runId);
  if (again) queueResult(runId);
}

/** Waits until no result is on its way. */
export async function resultsSettled(): Promise<void> {
  while (computing.size > 0) await Promise.all([...computing.values()].map(({ done }) => done));
}
