import { randomUUID } from 'node:crypto';
import type { Actor } from '~/access/can';
import { type Axle as AxleKind, axleOf } from '~/loads';
import { AxleTarget } from '~/models/axle-target.server';
import { loadAxleTargets } from '~/queries/axle-targets.server';
import { loadFittedTires } from '~/queries/fitted-tires.server';
import type { PressureUnit } from '~/units';
import { changeCoach } from './coach-transaction.server';
import { refuseProblems, targetProblem, withinLimit } from './target-limit.server';

export interface NewTargets {
  coachId: string;
  /** Cold pressure by axle, gauge kPa. An axle that isn't named keeps its target. */
  targets: Partial<Record<AxleKind, number>>;
  /** The unit in which a refusal speaks. */
  unit: PressureUnit;
}

/**
 * Sets the target of axles. Earlier targets stay: a reading keeps that of its day. A target that
 * hasn't changed adds nothing.
 * @throws Refusal `target-above-limit`, naming the axle, when it is above what the lowest of the
 * axle's tires and wheels allows; `not-allowed`; `coach-not-found`.
 */
export async function setTargets(actor: Actor, input: NewTargets): Promise<void> {
  await changeCoach(actor, 'records:edit', input.coachId, async (transaction) => {
    const now = await loadAxleTargets(input.coachId, transaction);
    const changed = now.flatMap(({ axle, axleId, targetKpa }) => {
      const wanted = input.targets[axle];
      return wanted === undefined || wanted === targetKpa ? [] : [{ axle, axleId, wanted }];
    });
    const tires = await loadFittedTires(input.coachId, transaction);
    const limitsOf = (axle: AxleKind) => tires.filter((tire) => axleOf(tire.position) === axle);
    refuseProblems(
      changed.map(({ axle, wanted }) => targetProblem(axle, wanted, limitsOf(axle), input.unit)),
      'target-above-limit',
    );
    await AxleTarget.bulkCreate(
      changed.map(({ axle, axleId, wanted }) => ({
        id: randomUUID(),
        axleId,
        targetKpa: withinLimit(wanted, limitsOf(axle)),
        source: 'typed',
        setBy: actor.userId,
      })),
      { transaction },
    );
  });
}
