import { type Actor, can } from '~/access/can';
import type { RunState } from '~/fill/store';
import { requireRun } from './round-access.server';
import { loadRunState } from './run-state.server';

/** Everything that the live screen starts from. */
export interface FillPage {
  run: RunState;
  mayTap: boolean;
  /** Of the coach: its log and so the fill's review. */
  maySeeLog: boolean;
}

/**
 * A fill with its log.
 * @throws Refusal `fill-not-found` to those who may not see the coach
 */
export async function loadFill(actor: Actor, fillId: string): Promise<FillPage> {
  const run = await requireRun(actor, 'fill:see', fillId);
  const coach = { id: run.coachId, roundOpen: true };
  return {
    run: await loadRunState(actor, run),
    mayTap: can(actor, 'fill:tap', coach),
    maySeeLog: can(actor, 'log:see', coach),
  };
}
