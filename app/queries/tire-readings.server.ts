import { QueryTypes } from 'sequelize';
import { sequelize } from '~/models/database.server';

/** What a gauge showed on a tire: in a cold check, or last in a fill. Gauge kPa. */
export interface TireReading {
  tireId: string;
  roundId: string;
  at: Date;
  kpa: number;
  warm: boolean;
  /** Read after air was added or let out. */
  afterFill: boolean;
  /** Of the round: the air's temperature and the place's height. */
  ambientC: number;
  altitudeM: number;
}

// The newest reading of a tire in a round counts; in a fill the last that was not taken back.
const readings = `
  SELECT * FROM (
    SELECT DISTINCT ON (round_id, tire_id) tire_id, round_id, read_at AS at,
      pressure_kpa AS kpa, warm, false AS after_fill
    FROM cold_readings JOIN rounds ON rounds.id = round_id
    WHERE coach_id = :coachId AND read_at >= :since
    ORDER BY round_id, tire_id, read_at DESC, cold_readings.id
  ) AS cold
  UNION ALL
  SELECT * FROM (
    SELECT DISTINCT ON (run_id) tire_id, round_id,
      started_at + at_ms * interval '1 millisecond' AS at,
      (body ->> 'kpa')::double precision AS kpa,
      coalesce((setup #>> '{tire,warm}')::boolean, false) AS warm, true AS after_fill
    FROM runs JOIN run_events ON run_id = runs.id
    WHERE coach_id = :coachId AND started_at >= :since AND type = 'tire-reading'
      AND NOT EXISTS (
        SELECT 1 FROM run_events AS undo
        WHERE undo.run_id = runs.id AND undo.type = 'taken-back'
          AND undo.body ->> 'of' = run_events.id::text)
    ORDER BY run_id, at_ms DESC, seq DESC
  ) AS filled`;

/** Every reading of a coach's tires since a day, oldest first; tires that are gone included. */
export async function loadTireReadings(coachId: string, since: Date): Promise<TireReading[]> {
  return sequelize.query<TireReading>(
    `SELECT tire_id AS "tireId", round_id AS "roundId", at, kpa, warm,
       after_fill AS "afterFill", ambient_c AS "ambientC", altitude_m AS "altitudeM"
     FROM (${readings}) AS readings JOIN rounds ON rounds.id = round_id
     ORDER BY at`,
    { replacements: { coachId, since }, type: QueryTypes.SELECT },
  );
}
