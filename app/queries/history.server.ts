import { QueryTypes } from 'sequelize';
import type { Actor } from '~/access/can';
import type { Ending } from '~/fill/wire-events';
import { type WheelPosition, wheelPositions } from '~/loads';
import { sequelize } from '~/models/database.server';
import { requireCoach } from './coach-access.server';

/** What a gauge showed in a cold check, with the target of that day. Gauge kPa. */
export interface PastReading {
  position: WheelPosition;
  kpa: number;
  targetKpa: number;
  warm: boolean;
}

export interface PastFill {
  id: string;
  position: WheelPosition;
  startedAt: Date;
  /** How it ended; null while it is open. */
  how: Ending | null;
  /** What the tire was last gauged at, kPa. */
  endKpa: number | null;
}

export interface PastRound {
  id: string;
  place: string;
  startedAt: Date;
  timeZone: string;
  ambientC: number;
  closed: boolean;
  /** Front first. */
  readings: PastReading[];
  fills: PastFill[];
}

export interface History {
  rounds: PastRound[];
  /** Counted from 1. */
  page: number;
  pages: number;
}

/** Rounds on one page: half a year of a careful owner. */
export const roundsOnPage = 8;

/**
 * A coach's rounds, newest first, with what was read and filled.
 * @param page counted from 1; beyond the last one is the last one
 * @throws Refusal `coach-not-found`; `not-allowed` to those who may not see the log
 */
export async function loadHistory(actor: Actor, coachId: string, page: number): Promise<History> {
  await requireCoach(actor, 'log:see', coachId);
  const [counted] = await select<{ count: number }>(
    'SELECT count(*)::integer AS count FROM rounds WHERE coach_id = :coachId',
    { coachId },
  );
  const pages = Math.max(1, Math.ceil((counted?.count ?? 0) / roundsOnPage));
  const shown = Math.min(Math.max(1, page), pages);
  const rounds = await select<Omit<PastRound, 'readings' | 'fills'>>(
    `SELECT id, place, started_at AS "startedAt", time_zone AS "timeZone",
       ambient_c AS "ambientC", closed_at IS NOT NULL AS closed
     FROM rounds WHERE coach_id = :coachId
     ORDER BY started_at DESC, id LIMIT :limit OFFSET :offset`,
    { coachId, limit: roundsOnPage, offset: (shown - 1) * roundsOnPage },
  );
  return { rounds: await withContents(rounds), page: shown, pages };
}

async function withContents(rounds: Omit<PastRound, 'readings' | 'fills'>[]): Promise<PastRound[]> {
  if (rounds.length === 0) return [];
  const roundIds = rounds.map(({ id }) => id);
  const [readings, fills] = await Promise.all([readingsOf(roundIds), fillsOf(roundIds)]);
  return rounds.map((round) => ({
    ...round,
    readings: readings.filter(({ roundId }) => roundId === round.id).sort(frontFirst),
    fills: fills.filter(({ roundId }) => roundId === round.id),
  }));
}

const frontFirst = (left: PastReading, right: PastReading) =>
  wheelPositions.indexOf(left.position) - wheelPositions.indexOf(right.position);

/** The newest reading of each tire in each round. */
const readingsOf = (roundIds: string[]) =>
  select<PastReading & { roundId: string }>(
    `SELECT DISTINCT ON (round_id, tire_id) round_id AS "roundId", position,
       pressure_kpa AS kpa, target_kpa AS "targetKpa", warm
     FROM cold_readings WHERE round_id IN (:roundIds)
     ORDER BY round_id, tire_id, read_at DESC, id`,
    { roundIds },
  );

/** Each fill with its end, and the last reading of its tire that was not taken back. */
const fillsOf = (roundIds: string[]) =>
  select<PastFill & { roundId: string }>(
    `SELECT runs.id, round_id AS "roundId", position, started_at AS "startedAt",
       ended.body ->> 'how' AS how, gauged.kpa AS "endKpa"
     FROM runs
     LEFT JOIN run_events AS ended ON ended.run_id = runs.id AND ended.seq = ended_seq
     LEFT JOIN LATERAL (
       SELECT (body ->> 'kpa')::double precision AS kpa FROM run_events AS reading
       WHERE reading.run_id = runs.id AND type = 'tire-reading'
         AND at_ms <= coalesce(ended.at_ms, at_ms)
         AND NOT EXISTS (
           SELECT 1 FROM run_events AS undo
           WHERE undo.run_id = runs.id AND undo.type = 'taken-back'
             AND undo.body ->> 'of' = reading.id::text)
       ORDER BY at_ms DESC, seq DESC LIMIT 1
     ) AS gauged ON true
     WHERE round_id IN (:roundIds) ORDER BY started_at`,
    { roundIds },
  );

const select = <Row extends object>(sql: string, replacements: Record<string, unknown>) =>
  sequelize.query<Row>(sql, { replacements, type: QueryTypes.SELECT });
