import { QueryTypes, type Transaction } from 'sequelize';
import type { WheelPosition } from '~/loads';
import { sequelize } from '~/models/database.server';

/** A tire where it is fitted now. Pressures are gauge kPa, the volume litres. */
export interface FittedTire {
  tireId: string;
  position: WheelPosition;
  size: string;
  sidewallLimitKpa: number;
  wheelLimitKpa: number;
  volumeL: number;
  volumeSource: 'estimated' | 'typed';
  fittedFrom: Date;
}

/** The tires that a coach runs on now, in no order. */
export async function loadFittedTires(
  coachId: string,
  transaction?: Transaction,
): Promise<FittedTire[]> {
  return sequelize.query<FittedTire>(
    `SELECT tires.id AS "tireId", position, size, sidewall_limit_kpa AS "sidewallLimitKpa",
       wheel_limit_kpa AS "wheelLimitKpa", volume_l AS "volumeL",
       volume_source AS "volumeSource", fitted_from AS "fittedFrom"
     FROM fittings JOIN tires ON tires.id = tire_id
     WHERE fittings.coach_id = :coachId AND fitted_until IS NULL`,
    { replacements: { coachId }, type: QueryTypes.SELECT, ...(transaction ? { transaction } : {}) },
  );
}
