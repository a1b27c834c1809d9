import type { Transaction } from 'sequelize';
import type { Action, Actor } from '~/access/can';
import { Coach } from '~/models/coach.server';
import { sequelize } from '~/models/database.server';
import { requireCoach } from '~/queries/coach-access.server';
import { notFound } from '~/services/refusal.server';

/**
 * Runs one write to a coach in a transaction of its own, after checking that `actor` may do
 * `action`. The coach's row is locked first: a target and the limit it must stay under are
 * changed one after the other and never past each other.
 * @throws Refusal `coach-not-found` or `not-allowed`; whatever `work` throws undoes it all.
 */
export async function changeCoach<Result>(
  actor: Actor | null,
  action: Action,
  coachId: string,
  work: (transaction: Transaction, coach: Coach) => Promise<Result>,
): Promise<Result> {
  return sequelize.transaction(async (transaction) => {
    await requireCoach(actor, action, coachId, transaction);
    const coach = await Coach.findOne({
      where: { id: coachId, deletedAt: null },
      lock: transaction.LOCK.UPDATE,
      transaction,
    });
    if (!coach) throw notFound('coach');
    return work(transaction, coach);
  });
}
