import type { Transaction } from 'sequelize';
import type { Actor } from '~/access/can';
import type { ClosingBody } from '~/fill/wire';
import { sequelize } from '~/models/database.server';
import { Run } from '~/models/run.server';
import { requireRound } from '~/queries/round-access.server';
import { Refusal } from '~/services/refusal.server';
import { possibleMoment } from './start-time.server';

/**
 * Closes a round with its list of afterwards. The first closing stands: sent again, or from another
 * phone, it changes nothing and answers the time that is kept.
 * @throws Refusal `round-not-found`, `not-allowed`, `impossible-time`; `fill-open`, naming the
 * fill, while a fill of the round has not ended
 */
export async function closeRound(
  actor: Actor,
  roundId: string,
  body: ClosingBody,
): Promise<{ roundId: string; closedAt: string }> {
  return sequelize.transaction(async (transaction) => {
    const reach = { transaction, lock: true };
    const round = await requireRound(actor, 'round:run', roundId, reach);
    if (round.closedAt) return { roundId, closedAt: round.closedAt.toISOString() };
    await refuseOpenFill(roundId, transaction);
    const closedAt = possibleMoment('closedAt', body.closedAt);
    await round.update({ closedAt, afterwards: [...new Set(body.afterwards)] }, { transaction });
    return { roundId, closedAt: closedAt.toISOString() };
  });
}

async function refuseOpenFill(roundId: string, transaction: Transaction): Promise<void> {
  const open = await Run.findOne({ where: { roundId, endedSeq: null }, transaction });
  if (!open) return;
  throw new Refusal('conflict', 'fill-open', 'A fill of this round is still open. End it first.', [
    { field: 'runId', value: open.id, expected: 'a fill that has ended' },
  ]);
}
