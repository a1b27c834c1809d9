import { QueryTypes, type Transaction } from 'sequelize';
import { AirProfileRow } from '~/models/air-profile.server';
import { sequelize } from '~/models/database.server';
import type { Run } from '~/models/run.server';

/** Fills of two phones may touch by this much: their clocks differ a little. Seconds. */
const clockSlack = 10;

// A fill without an end is open until now.
const overlapping = `
  UPDATE runs SET overlapping = true
  WHERE coach_id = :coachId AND kind = 'fill' AND id <> :runId
    AND started_at < CAST(:endedAt AS timestamptz) - :slack * interval '1 second'
    AND coalesce(
      (SELECT started_at + at_ms * interval '1 millisecond' FROM run_events
       WHERE run_id = runs.id AND seq = runs.ended_seq), 'infinity')
      > CAST(:startedAt AS timestamptz) + :slack * interval '1 second'
  RETURNING id`;

/**
 * Marks the fill that has just ended, and every other fill of its coach that was open at the same
 * time. Begun without signal, they may arrive one after the other, each already ended.
 */
export async function markOverlaps(
  run: Run,
  endAtMs: number,
  transaction: Transaction,
): Promise<void> {
  const { id: runId, coachId, startedAt } = run;
  const endedAt = new Date(startedAt.getTime() + endAtMs);
  const others = await sequelize.query<{ id: string }>(overlapping, {
    replacements: { coachId, runId, startedAt, endedAt, slack: clockSlack },
    type: QueryTypes.SELECT,
    transaction,
  });
  if (others.length === 0) return;
  await run.update({ overlapping: true }, { transaction });
  await forgetProfiles([runId, ...others.map(({ id }) => id)], transaction);
}

/** What two fills at once taught is not to be trusted. */
async function forgetProfiles(runIds: readonly string[], transaction: Transaction): Promise<void> {
  await AirProfileRow.destroy({ where: { runId: [...runIds] }, transaction });
}
