import { QueryTypes, type Transaction } from 'sequelize';
import type { Axle as AxleKind } from '~/loads';
import { sequelize } from '~/models/database.server';

/** The target that counts for an axle now, gauge kPa cold. */
export interface AxleTargetNow {
  axleId: string;
  axle: AxleKind;
  targetKpa: number;
  setAt: Date;
}

/** The newest target of each axle of a coach. */
export async function loadAxleTargets(
  coachId: string,
  transaction?: Transaction,
): Promise<AxleTargetNow[]> {
  return sequelize.query<AxleTargetNow>(
    `SELECT DISTINCT ON (axles.id) axles.id AS "axleId", kind AS axle,
       target_kpa AS "targetKpa", set_at AS "setAt"
     FROM axles JOIN axle_targets ON axle_id = axles.id
     WHERE coach_id = :coachId
     ORDER BY axles.id, set_at DESC, axle_targets.id`,
    { replacements: { coachId }, type: QueryTypes.SELECT, ...(transaction ? { transaction } : {}) },
  );
}
