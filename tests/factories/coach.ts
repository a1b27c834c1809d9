import { randomUUID } from 'node:crypto';
import type { Actor, Role } from '~/access/can';
import { createCoach as createCoachCommand, type NewAxle } from '~/commands/create-coach.server';
import { recordFittingTest } from '~/commands/record-fitting-test.server';
import { updateCoach } from '~/commands/update-coach.server';
import { updateRig } from '~/commands/update-rig.server';
import { type Axle, type AxleLayout, axlesOf, type WheelPosition } from '~/loads';
import { AxleTarget } from '~/models/axle-target.server';
import { Coach } from '~/models/coach.server';
import { Fitting } from '~/models/fitting.server';
import { Membership } from '~/models/membership.server';
import { loadAxleTargets } from '~/queries/axle-targets.server';
import { loadActor } from '~/queries/coach-access.server';
import { loadFittedTires } from '~/queries/fitted-tires.server';
import { kpaPerPsi } from '~/units';

export interface NewCoachFacts {
  name?: string;
  layout?: AxleLayout;
  size?: string;
  volumeL?: number;
  sidewallPsi?: number;
  wheelPsi?: number;
  targetPsi?: Partial<Record<Axle, number>>;
  tolerancePsi?: number;
  lowerBy?: ('pedal' | 'drain')[];
  rig?: { hose: string; chuck: string; gauge: string } | null;
  outcome?: 'follows-supply' | 'accessory-tank' | 'no-air' | null;
  /** Since when its tires are fitted and its targets set; now unless given. */
  since?: Date;
}

const usualTargetPsi: Record<Axle, number> = { steer: 110, drive: 92, tag: 88 };
const usualRig = { hose: 'Grey hose, 15 m', chuck: 'Closed clip-on', gauge: 'Tee gauge' };

/** A coach that is ready for its first fill, owned by `ownerId`, made by the product's commands. */
export async function createCoach(ownerId: string, facts: NewCoachFacts = {}) {
  const {
    name = 'The Test Bench',
    layout = 'two-axles',
    rig = usualRig,
    lowerBy = ['drain'],
  } = facts;
  const { outcome = 'follows-supply' } = facts;
  const { coachId } = await createCoachCommand(await loadActor(ownerId), {
    name,
    layout,
    toleranceKpa: (facts.tolerancePsi ?? 2) * kpaPerPsi,
    axles: Object.fromEntries(axlesOf(layout).map((axle) => [axle, axleFacts(facts, axle)])),
    unit: 'psi',
  });
  const actor = await loadActor(ownerId);
  await updateCoach(actor, { coachId, lowerBy });
  if (rig) {
    const gauge = { gaugePlace: 'above-valve', hasValve: true, stepKpa: kpaPerPsi } as const;
    await updateRig(actor, { coachId, ...rig, ...gauge });
  }
  if (outcome) await recordFittingTest(actor, { coachId, outcome });
  if (facts.since) await dateBack(coachId, facts.since);
  return { coachId, actor, tires: await tiresOf(coachId) };
}

function axleFacts(facts: NewCoachFacts, axle: Axle): NewAxle {
  return {
    size: facts.size ?? '295/75R22.5',
    volumeL: facts.volumeL ?? 140,
    volumeSource: 'estimated',
    sidewallLimitKpa: (facts.sidewallPsi ?? 120) * kpaPerPsi,
    wheelLimitKpa: (facts.wheelPsi ?? 125) * kpaPerPsi,
    targetKpa: (facts.targetPsi?.[axle] ?? usualTargetPsi[axle]) * kpaPerPsi,
  };
}

/** Makes the coach as old as its story: readings before it was made would belong to no tire. */
async function dateBack(coachId: string, since: Date): Promise<void> {
  await Coach.update({ createdAt: since }, { where: { id: coachId } });
  await Fitting.update({ fittedFrom: since }, { where: { coachId } });
  const axleId = (await loadAxleTargets(coachId)).map((target) => target.axleId);
  await AxleTarget.update({ setAt: since }, { where: { axleId } });
}

/** The id of the tire at each position. */
export async function tiresOf(coachId: string): Promise<Record<WheelPosition, string>> {
  const tires = await loadFittedTires(coachId);
  return Object.fromEntries(tires.map(({ position, tireId }) => [position, tireId])) as Record<
    WheelPosition,
    string
  >;
}

/** Lets somebody in; answers the person with the role. */
export async function addMember(coachId: string, userId: string, role: Role): Promise<Actor> {
  await Membership.create({ id: randomUUID(), coachId, userId, role });
  return loadActor(userId);
}
