import type { Actor } from '~/access/can';
import { changeCoach } from './coach-transaction.server';

export interface CoachChange {
  coachId: string;
  name?: string;
  /** How far from the target still counts as on it, kPa. */
  toleranceKpa?: number;
  /** How the supply may be brought down on this coach. None: the calls never ask for it. */
  lowerBy?: ('pedal' | 'drain')[];
}

/**
 * Changes what is given of a coach's own fields.
 * @throws Refusal `not-allowed`, `coach-not-found`.
 */
export async function updateCoach(
  actor: Actor,
  { coachId, ...change }: CoachChange,
): Promise<void> {
  await changeCoach(actor, 'records:edit', coachId, async (transaction, coach) => {
    await coach.update(change, { transaction });
  });
}
