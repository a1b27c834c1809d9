import { QueryTypes } from 'sequelize';
import { type Action, type Actor, can } from '~/access/can';
import { Coach } from '~/models/coach.server';
import { sequelize } from '~/models/database.server';
import { FittingTest } from '~/models/fitting-test.server';
import { Rig } from '~/models/rig.server';
import { notFound } from '~/services/refusal.server';
import { requireCoach } from './coach-access.server';

/** What of a round the coach's pages name it by. */
export interface RoundHead {
  id: string;
  place: string;
  startedAt: Date;
  timeZone: string;
  ambientC: number;
  altitudeM: number;
}

/** A coach as all of its pages know it. */
export type CoachHead = Awaited<ReturnType<typeof loadCoach>>;

/**
 * A coach's own fields, what this person may do to it, and what is still to do before its first
 * fill.
 * @throws Refusal `coach-not-found` to those who may not see it.
 */
export async function loadCoach(actor: Actor, coachId: string) {
  await requireCoach(actor, 'coach:see', coachId);
  const coach = await Coach.findOne({ where: { id: coachId, deletedAt: null } });
  if (!coach) throw notFound('coach');
  const { id, name, layout, toleranceKpa, lowerBy } = coach;
  // Whoever sees the coach sees it now: a helper only while a round is open.
  const may = (action: Action) => can(actor, action, { id, roundOpen: true });
  return {
    id,
    name,
    layout,
    toleranceKpa,
    lowerBy,
    mayEdit: may('records:edit'),
    mayRun: may('round:run'),
    mayRemove: may('people:edit'),
    maySeeLog: may('log:see'),
    rig: await loadRig(id),
    fitting: await loadFitting(id),
  };
}

/** The hose, chuck and gauge in use; null until they are described. */
async function loadRig(coachId: string) {
  const rig = await Rig.findOne({ where: { coachId, retiredAt: null } });
  if (!rig) return null;
  const { hose, chuck, gauge, gaugePlace, hasValve, stepKpa } = rig;
  return { hose, chuck, gauge, gaugePlace, hasValve, stepKpa };
}

/** What came of the last test of the fitting; null until there was one. */
export async function loadFitting(coachId: string) {
  const test = await FittingTest.findOne({
    where: { coachId },
    order: [['testedAt', 'DESC']],
  });
  return test && { outcome: test.outcome, testedAt: test.testedAt };
}

/** The round that is under way and the last one that was closed, where there are any. */
export async function loadRoundHeads(
  coachId: string,
): Promise<{ open: RoundHead | null; last: RoundHead | null }> {
  const rows = await sequelize.query<RoundHead & { closed: boolean }>(
    `SELECT DISTINCT ON (closed_at IS NULL) id, place, started_at AS "startedAt",
       time_zone AS "timeZone", ambient_c AS "ambientC", altitude_m AS "altitudeM",
       closed_at IS NOT NULL AS closed
     FROM rounds WHERE coach_id = :coachId
     ORDER BY closed_at IS NULL, started_at DESC`,
    { replacements: { coachId }, type: QueryTypes.SELECT },
  );
  const find = (closed: boolean) => rows.find((row) => row.closed === closed) ?? null;
  return { open: find(false), last: find(true) };
}
