import type { Transaction } from 'sequelize';
import type { Action, Actor } from '~/access/can';
import { idField } from '~/fill/wire-fields';
import { Round } from '~/models/round.server';
import { Run } from '~/models/run.server';
import { notFound, Refusal } from '~/services/refusal.server';
import { requireCoach } from './coach-access.server';

interface Reach {
  transaction: Transaction;
  /** Holds the row until the transaction ends: one writer at a time. */
  lock?: boolean;
}

/**
 * The round, when `actor` may do `action` to its coach.
 * @throws Refusal `round-not-found`, the same for one that is not there; `not-allowed`
 */
export async function requireRound(
  actor: Actor,
  action: Action,
  roundId: string,
  reach?: Reach,
): Promise<Round> {
  const round = isId(roundId) ? await Round.findByPk(roundId, reading(reach)) : null;
  if (!round) throw notFound('round');
  await requireCoachOf('round', actor, action, round.coachId, reach);
  return round;
}

/**
 * The fill, when `actor` may do `action` to its coach.
 * @throws Refusal `fill-not-found`, the same for one that is not there; `not-allowed`
 */
export async function requireRun(
  actor: Actor,
  action: Action,
  runId: string,
  reach?: Reach,
): Promise<Run> {
  const run = isId(runId) ? await Run.findByPk(runId, reading(reach)) : null;
  if (!run) throw notFound('fill');
  await requireCoachOf('fill', actor, action, run.coachId, reach);
  return run;
}

/** Anything can stand in the address of a page; PostgreSQL takes only a UUID for an id. */
const isId = (text: string) => idField.safeParse(text).success;

const reading = (reach: Reach | undefined) =>
  reach
    ? {
        transaction: reach.transaction,
        ...(reach.lock ? { lock: reach.transaction.LOCK.UPDATE } : {}),
      }
    : {};

/** Whoever may not know of the coach learns nothing about the round either. */
async function requireCoachOf(
  what: 'round' | 'fill',
  actor: Actor,
  action: Action,
  coachId: string,
  reach: Reach | undefined,
): Promise<void> {
  try {
    await requireCoach(actor, action, coachId, reach?.transaction);
  } catch (thrown) {
    throw thrown instanceof Refusal && thrown.kind === 'not-found' ? notFound(what) : thrown;
  }
}
