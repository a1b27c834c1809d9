import { randomUUID } from 'node:crypto';
import type { Actor } from '~/access/can';
import { Rig } from '~/models/rig.server';
import { changeCoach } from './coach-transaction.server';

export interface NewRig {
  coachId: string;
  /** Names that the owner gives them, so that what is learned belongs to that hose and chuck. */
  hose: string;
  chuck: string;
  gauge: string;
  gaugePlace: 'at-chuck' | 'above-valve' | 'below-valve' | 'dash-only';
  hasValve: boolean;
  /** One graduation of the gauge, kPa. */
  stepKpa: number;
}

/**
 * Takes a rig into use. The one before is retired and kept, since fills were made with it.
 * The same rig again changes nothing.
 * @throws Refusal `not-allowed`, `coach-not-found`.
 */
export async function updateRig(actor: Actor, { coachId, ...rig }: NewRig): Promise<void> {
  await changeCoach(actor, 'records:edit', coachId, async (transaction) => {
    const inUse = await Rig.findOne({ where: { coachId, retiredAt: null }, transaction });
    if (inUse && isSameRig(inUse, rig)) return;
    await inUse?.update({ retiredAt: new Date() }, { transaction });
    await Rig.create({ id: randomUUID(), coachId, ...rig }, { transaction });
  });
}

function isSameRig(inUse: Rig, rig: Omit<NewRig, 'coachId'>): boolean {
  return (Object.keys(rig) as (keyof typeof rig)[]).every((key) => inUse[key] === rig[key]);
}
