import { randomUUID } from 'node:crypto';
import type { Actor } from '~/access/can';
import { FittingTest } from '~/models/fitting-test.server';
import { changeCoach } from './coach-transaction.server';

export interface NewFittingTest {
  coachId: string;
  outcome: 'follows-supply' | 'accessory-tank' | 'no-air';
}

/**
 * Keeps what came of testing the fitting. Earlier tests stay; the newest counts.
 * @throws Refusal `not-allowed`, `coach-not-found`.
 */
export async function recordFittingTest(
  actor: Actor,
  { coachId, outcome }: NewFittingTest,
): Promise<void> {
  await changeCoach(actor, 'records:edit', coachId, async (transaction) => {
    await FittingTest.create(
      { id: randomUUID(), coachId, outcome, testedBy: actor.userId },
      { transaction },
    );
  });
}
