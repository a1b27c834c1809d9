import { type Actor, can } from '~/access/can';
import type { CoachBasis } from '~/fill/fill-setup';
import { type FillSummary, summariseFill } from '~/fill/fill-summary';
import type { RoundState, RunState } from '~/fill/store';
import type { AfterwardsKey } from '~/fill/wire';
import { ColdReading } from '~/models/cold-reading.server';
import type { Round } from '~/models/round.server';
import { Run } from '~/models/run.server';
import { loadCoachBasis } from './coach-basis.server';
import { requireRound } from './round-access.server';
import { loadRunState } from './run-state.server';

/** Everything that the page of a round shows or hands to the phone's store. */
export interface RoundPage {
  round: RoundState;
  coach: CoachBasis;
  /** By their start. */
  fills: FillSummary[];
  /** The newest fill with its log: the next one starts from where it left the supply. */
  newestFill: RunState | null;
  /** This person may read tires, start fills and close the round. */
  mayRun: boolean;
}

/**
 * A round with its coach, readings and fills.
 * @throws Refusal `round-not-found` to those who may not see the coach
 */
export async function loadRound(actor: Actor, roundId: string): Promise<RoundPage> {
  const round = await requireRound(actor, 'coach:see', roundId);
  const [coach, state, runs] = await Promise.all([
    loadCoachBasis(round.coachId),
    roundState(round),
    Run.findAll({ where: { roundId }, order: [['startedAt', 'ASC']] }),
  ]);
  const fills = await Promise.all(runs.map((run) => loadRunState(actor, run)));
  return {
    round: state,
    coach,
    fills: fills.map(summariseFill),
    newestFill: fills.at(-1) ?? null,
    mayRun: can(actor, 'round:run', { id: round.coachId, roundOpen: round.closedAt === null }),
  };
}

async function roundState(round: Round): Promise<RoundState> {
  const { id, coachId, place, altitudeM, ambientC, timeZone, withHelper } = round;
  const readings = await ColdReading.findAll({
    where: { roundId: id },
    order: [
      ['readAt', 'ASC'],
      ['id', 'ASC'],
    ],
  });
  return {
    ...{ id, coachId, place, altitudeM, ambientC, timeZone, withHelper },
    startedAt: round.startedAt.toISOString(),
    cautionsAt: round.cautionsAt?.toISOString() ?? null,
    closedAt: round.closedAt?.toISOString() ?? null,
    afterwards: round.afterwards as AfterwardsKey[],
    readings: readings.map(({ id: readingId, tireId, pressureKpa, warm, readAt }) => ({
      id: readingId,
      tireId,
      kpa: pressureKpa,
      warm,
      readAt: readAt.toISOString(),
    })),
  };
}
