import type { Actor } from '~/access/can';
import type { CautionsBody } from '~/fill/wire';
import { sequelize } from '~/models/database.server';
import { requireRound } from '~/queries/round-access.server';
import { possibleMoment } from './start-time.server';

/**
 * Keeps when the cautions of a round were read. The first time stands: sent again, or from another
 * phone, it changes nothing and answers the time that is kept.
 * @throws Refusal `round-not-found`, `not-allowed`, `impossible-time`
 */
export async function acknowledgeCautions(
  actor: Actor,
  roundId: string,
  body: CautionsBody,
): Promise<{ roundId: string; acknowledgedAt: string }> {
  return sequelize.transaction(async (transaction) => {
    const reach = { transaction, lock: true };
    const round = await requireRound(actor, 'round:run', roundId, reach);
    const cautionsAt = round.cautionsAt ?? possibleMoment('acknowledgedAt', body.acknowledgedAt);
    if (!round.cautionsAt) await round.update({ cautionsAt }, { transaction });
    return { roundId, acknowledgedAt: cautionsAt.toISOString() };
  });
}
