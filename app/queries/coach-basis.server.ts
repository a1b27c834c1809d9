import { type AirProfile, ENGINE_VERSION } from '~/air';
import type { CoachBasis, RigInUse, Wheel } from '~/fill/fill-setup';
import { rigKeyOf } from '~/fill/rig-key';
import { axleOf, positionsOf } from '~/loads';
import { AirProfileRow } from '~/models/air-profile.server';
import { Coach } from '~/models/coach.server';
import { Rig } from '~/models/rig.server';
import { notFound } from '~/services/refusal.server';
import { loadAxleTargets } from './axle-targets.server';
import { loadFittedTires } from './fitted-tires.server';

/**
 * What rounds and fills of a coach are made from.
 * @param coachId one that the person may see
 * @throws Refusal `coach-not-found` when it has been removed
 */
export async function loadCoachBasis(coachId: string): Promise<CoachBasis> {
  const coach = await Coach.findOne({ where: { id: coachId, deletedAt: null } });
  if (!coach) throw notFound('coach');
  const { id, name, layout, toleranceKpa, lowerBy } = coach;
  const rig = await rigInUse(id);
  const [wheels, profile] = await Promise.all([wheelsOf(coach), profileOf(id, rig)]);
  return { id, name, layout, toleranceKpa, lowerBy, rig, wheels, profile };
}

async function rigInUse(coachId: string): Promise<RigInUse | null> {
  const rig = await Rig.findOne({ where: { coachId, retiredAt: null } });
  if (!rig) return null;
  const { hose, chuck, gauge, gaugePlace, hasValve, stepKpa } = rig;
  return { hose, chuck, gauge, gaugePlace, hasValve, stepKpa };
}

/** Front first; a position without a tire or a target is left out. */
async function wheelsOf({ id, layout }: Coach): Promise<Wheel[]> {
  const [tires, targets] = await Promise.all([loadFittedTires(id), loadAxleTargets(id)]);
  return positionsOf(layout).flatMap((position) => {
    const tire = tires.find((each) => each.position === position);
    const target = targets.find((each) => each.axle === axleOf(position));
    if (!tire || !target) return [];
    const { tireId, size, volumeL, sidewallLimitKpa, wheelLimitKpa } = tire;
    const limitKpa = Math.min(sidewallLimitKpa, wheelLimitKpa);
    return { tireId, position, size, targetKpa: target.targetKpa, limitKpa, volumeL };
  });
}

/** What another version of the engine learned may mean something else, so it is left. */
async function profileOf(coachId: string, rig: RigInUse | null): Promise<AirProfile | null> {
  const named = rig && { hose: rig.hose, chuck: rig.chuck, gaugeName: rig.gauge };
  const rigKey = rigKeyOf({
    rig: named ? { gauge: 'at-chuck', valve: false, ...named } : undefined,
  });
  const row = await AirProfileRow.findOne({
    where: { coachId, rigKey, engineVersion: ENGINE_VERSION },
    order: [['learnedAt', 'DESC']],
  });
  return row?.profile ?? null;
}
