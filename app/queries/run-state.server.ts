import { type Actor, can } from '~/access/can';
import type { RunState } from '~/fill/store';
import type { Run } from '~/models/run.server';
import { loadLog } from './run-log.server';

/** A fill with its whole log, as the store of this person's phone keeps it. */
export async function loadRunState(actor: Actor, run: Run): Promise<RunState> {
  const { id, kind, roundId, coachId, tireId, position, setup, engineVersion, deviceId } = run;
  const startedAt = run.startedAt.toISOString();
  // Whoever sees the fill sees it now: a helper only while the round is open.
  const mayEnd = can(actor, 'round:run', { id: coachId, roundOpen: true });
  const log = await loadLog(id);
  return {
    ...{ id, kind, roundId, coachId, tireId, position, startedAt },
    ...{ setup, engineVersion, deviceId, mayEnd, log },
  };
}
