import type { Actor } from '~/access/can';
import { Membership } from '~/models/membership.server';
import { changeCoach } from './coach-transaction.server';

/**
 * Takes a coach away from everybody who may see it. Its rows stay, marked as removed, so that
 * somebody who runs the server can bring it back.
 * @throws Refusal `not-allowed` unless the actor owns it; `coach-not-found`.
 */
export async function removeCoach(actor: Actor, { coachId }: { coachId: string }): Promise<void> {
  await changeCoach(actor, 'people:edit', coachId, async (transaction, coach) => {
    const now = new Date();
    await coach.update({ deletedAt: now }, { transaction });
    await Membership.update(
      { validUntil: now },
      { where: { coachId, validUntil: null }, transaction },
    );
  });
}
