import { QueryTypes, type Transaction } from 'sequelize';
import { axleOf, type WheelPosition } from '~/loads';
import { sequelize } from '~/models/database.server';

/** Where a tire sat at a time, and what its axle's target was then. Gauge kPa, cold. */
export interface TirePlace {
  position: WheelPosition;
  targetKpa: number;
}

// A phone without signal may speak of a tire that has been taken off since, so the fitting of that
// time counts; before the first record of a fitting or target, the first one does.
const places = `
  SELECT position FROM fittings
  WHERE coach_id = :coachId AND tire_id = :tireId
  ORDER BY fitted_from <= :at DESC,
    CASE WHEN fitted_from <= :at THEN fitted_from END DESC, fitted_from
  LIMIT 1`;

const targets = `
  SELECT target_kpa AS "targetKpa" FROM axle_targets JOIN axles ON axles.id = axle_id
  WHERE coach_id = :coachId AND kind = :axle
  ORDER BY set_at <= :at DESC, CASE WHEN set_at <= :at THEN set_at END DESC, set_at
  LIMIT 1`;

/** Null when the coach has never had this tire, or its axle has no target. */
export async function loadTirePlace(
  coachId: string,
  tireId: string,
  at: Date,
  transaction: Transaction,
): Promise<TirePlace | null> {
  const [place] = await sequelize.query<{ position: WheelPosition }>(places, {
    replacements: { coachId, tireId, at },
    type: QueryTypes.SELECT,
    transaction,
  });
  if (!place) return null;
  const [target] = await sequelize.query<{ targetKpa: number }>(targets, {
    replacements: { coachId, axle: axleOf(place.position), at },
    type: QueryTypes.SELECT,
    transaction,
  });
  return target ? { ...place, ...target } : null;
}
