import { createCoach, type NewAxle } from '~/commands/create-coach.server';
import { recordFittingTest } from '~/commands/record-fitting-test.server';
import { updateCoach } from '~/commands/update-coach.server';
import { updateRig } from '~/commands/update-rig.server';
import { axlesOf, estimateTireVolume } from '~/loads';
import { sequelize } from '~/models/database.server';
import { loadActor } from '~/queries/coach-access.server';
import { kpaPerPsi } from '~/units';
import { type DemoCoach, demoDays } from './demo-coaches';
import { targetOf } from './demo-story';

/** How far from its target a demo tire still counts as on it, psi. */
const tolerancePsi = 2;

/** Makes a demo coach by the commands that its owner would use; returns its id. */
export async function recordCoach(ownerId: string, coach: DemoCoach): Promise<string> {
  const kinds = axlesOf(coach.layout);
  const axles = Object.fromEntries(
    kinds.map((kind) => [kind, axleOf(coach, targetOf(coach, kind))]),
  );
  const { coachId } = await createCoach(await loadActor(ownerId), {
    name: coach.name,
    layout: coach.layout,
    toleranceKpa: tolerancePsi * kpaPerPsi,
    axles,
    unit: 'psi',
  });
  const actor = await loadActor(ownerId);
  await updateCoach(actor, { coachId, lowerBy: coach.lowerBy });
  await updateRig(actor, {
    coachId,
    ...coach.rig,
    gaugePlace: 'above-valve',
    hasValve: false,
    stepKpa: kpaPerPsi,
  });
  await recordFittingTest(actor, { coachId, outcome: coach.outcome });
  await backdate(coachId);
  return coachId;
}

function axleOf(coach: DemoCoach, targetKpa: number): NewAxle {
  const estimate = estimateTireVolume(coach.size);
  if (!estimate) throw new RangeError(`size: ${coach.size} cannot be read`);
  return {
    size: coach.size,
    sidewallLimitKpa: coach.sidewallPsi * kpaPerPsi,
    wheelLimitKpa: coach.wheelPsi * kpaPerPsi,
    targetKpa,
    volumeL: estimate.volumeL,
    volumeSource: 'estimated',
  };
}

/** The demo begins half a year ago, and so does everything that stands when it begins. */
async function backdate(coachId: string): Promise<void> {
  const dated = [
    ['coaches', 'created_at', 'id'],
    ['memberships', 'valid_from', 'coach_id'],
    ['tires', 'created_at', 'coach_id'],
    ['fittings', 'fitted_from', 'coach_id'],
    ['rigs', 'created_at', 'coach_id'],
    ['fitting_tests', 'tested_at', 'coach_id'],
  ] as const;
  for (const [table, column, key] of dated) {
    await sequelize.query(
      `UPDATE ${table} SET ${column} = now() - interval '${demoDays + 1} days' WHERE ${key} = :coachId`,
      { replacements: { coachId } },
    );
  }
  await sequelize.query(
    `UPDATE axle_targets SET set_at = now() - interval '${demoDays + 1} days'
     FROM axles WHERE axles.id = axle_id AND coach_id = :coachId`,
    { replacements: { coachId } },
  );
}
