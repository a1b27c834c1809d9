import type { Transaction } from 'sequelize';
import type { Actor } from '~/access/can';
import type { RoundBody } from '~/fill/wire';
import { Round } from '~/models/round.server';
import { changeCoach } from './coach-transaction.server';
import { refuseOtherBody } from './same-body.server';
import { possibleMoment } from './start-time.server';

/**
 * Starts a round under an id made on the phone. Sent again, it changes nothing.
 * @throws Refusal `coach-not-found`, `not-allowed`; `other-body` when the id stands for another
 * round; `impossible-time` when it began over 90 days ago or in the future
 */
export async function startRound(
  actor: Actor,
  roundId: string,
  body: RoundBody,
): Promise<{ roundId: string }> {
  return changeCoach(actor, 'round:run', body.coachId, async (transaction) => {
    if (await isStored(roundId, body, transaction)) return { roundId };
    const { v, startedAt, ...fields } = body;
    await Round.bulkCreate(
      [
        {
          id: roundId,
          ...fields,
          startedAt: possibleMoment('startedAt', startedAt),
          startedBy: actor.userId,
        },
      ],
      { transaction, ignoreDuplicates: true },
    );
    // Two copies at once under two coaches: the second finds the first one here.
    await isStored(roundId, body, transaction);
    return { roundId };
  });
}

async function isStored(
  roundId: string,
  { v, ...sent }: RoundBody,
  transaction: Transaction,
): Promise<boolean> {
  const stored = await Round.findByPk(roundId, { transaction });
  if (!stored) return false;
  const { coachId, startedAt, place, altitudeM, ambientC, timeZone, withHelper, deviceId } = stored;
  refuseOtherBody(
    'round',
    { coachId, startedAt, place, altitudeM, ambientC, timeZone, withHelper, deviceId },
    { ...sent, startedAt: new Date(sent.startedAt) },
  );
  return true;
}
