import type { AirProfile, Fill, FillSetup, SupplyState } from '../../app/air/contract';
import { newAllSeeing } from './all-seeing';
import { type Coach, drawCoach, drawDeficit, type WorldTire } from './coach';
import { runFill, type Watch } from './fill-run';
import { psi, toPsi } from './flow';
import { readGauge } from './gauges';
import type { Habits } from './habits';
import type { FillOutcome } from './outcome';
import { BETWEEN_TIRES_S, perfectFrom, walkOn } from './people-round';
import { handsAlone, LATE_HANDS } from './perfect';
import { between, chance, type Dice, diceFor } from './random';
import { activeTire, startWorld, type World } from './world';

export type CreateFill = (setup: FillSetup) => Fill;

/** Share of rounds in which somebody has set fast idle before the first tire. */
const FAST_AT_START = 0.85;
/** A gauge at a cold check repeats itself within about this, kPa. */
const CHECK_NOISE_KPA = psi(0.12);
const TIRES = 4;

export interface CrewPlan {
  habits: Habits;
  /** Rounds on the same coach, each with what the one before taught. */
  rounds: number;
  /** Absent: the all-seeing adviser. */
  createFill: CreateFill | null;
  watch?: (tire: number) => Watch | undefined;
}

/** A crew that follows an adviser round the coach, once or more often. */
export function roundsByCrew(id: number, plan: CrewPlan): FillOutcome[] {
  const outcomes: FillOutcome[] = [];
  let profile: AirProfile | undefined;
  for (let round = 0; round < plan.rounds; round++) {
    const walk = newWalk(id, round, profile);
    for (let index = 0; index < TIRES; index++) {
      outcomes.push(fillTire(walk, plan, index, round * TIRES + index));
    }
    profile = walk.profile;
  }
  return outcomes;
}

interface Walk {
  world: World;
  dice: Dice;
  seed: number;
  profile: AirProfile | undefined;
  /** The supply's state as the fill before left it, asked when the next one starts. */
  supplyAt: ((secondsLater: number) => SupplyState) | null;
}

function newWalk(id: number, round: number, profile: AirProfile | undefined): Walk {
  const world = startWorld(coachFor(id, round), round);
  const dice = diceFor(id, 4, round);
  world.speed = chance(dice, FAST_AT_START) ? 'fast-idle' : 'idle';
  return { world, dice, seed: id * 16 + round * 4 + 1, profile, supplyAt: null };
}

/** On another day the same coach has lost air again, each tire its own. */
function coachFor(id: number, round: number): Coach {
  const coach = drawCoach(id);
  if (round === 0) return coach;
  const dice = diceFor(id, 5, round);
  const tires = coach.tires.map((tire) => ({ ...tire, startKpa: leakedTo(dice, coach, tire) }));
  return { ...coach, tires };
}

function leakedTo(dice: Dice, coach: Coach, tire: WorldTire): number {
  const plan = { hard: coach.hard, targetPsi: toPsi(tire.targetKpa) };
  return psi(plan.targetPsi - drawDeficit(dice, coach, plan));
}

function fillTire(walk: Walk, plan: CrewPlan, index: number, tire: number): FillOutcome {
  const { world } = walk;
  world.active = index;
  const pause = between(walk.dice, ...BETWEEN_TIRES_S);
  walkOn(world, pause);
  // A stream for each fill, so that another answer in one does not shift the chances of the next.
  const dice = diceFor(world.coach.id, 6, tire);
  const best = perfectFrom(world);
  const shared = { tire, perfectSeconds: best.seconds, habits: plan.habits, dice };
  const watch = plan.watch?.(tire);
  if (!plan.createFill) {
    const hands = plan.habits.alone ? handsAlone(world.coach.walkS) : LATE_HANDS;
    return runFill(world, newAllSeeing(world, hands), { ...shared, watch });
  }
  const setup = setupFor(walk, plan.habits, dice, pause);
  watch?.began?.(setup);
  const fill = plan.createFill(setup);
  const outcome = runFill(world, fill, { ...shared, watch });
  const endedAt = outcome.seconds;
  walk.profile = asJson(fill.profile());
  walk.supplyAt = (later) => asJson(fill.supplyAt(endedAt + later));
  return outcome;
}

/** Profiles and states are kept as JSON, so here too. */
function asJson<T>(value: T): T {
  return JSON.parse(JSON.stringify(value)) as T;
}

function setupFor(walk: Walk, habits: Habits, dice: Dice, pauseS: number): FillSetup {
  const { coach } = walk.world;
  const tire = activeTire(walk.world);
  const gauge = { ...coach.tireGauge, noiseKpa: CHECK_NOISE_KPA };
  return {
    tire: {
      startKpa: readGauge(gauge, tire.startKpa, dice),
      targetKpa: tire.targetKpa,
      toleranceKpa: tire.toleranceKpa,
      volumeL: tire.saidVolumeL,
      limitKpa: tire.limitKpa,
    },
    rig: rigOf(coach, habits),
    lowerBy: coach.lowerBy,
    crew: habits.alone ? { helper: false, walkSeconds: Math.round(coach.walkS) } : { helper: true },
    atmosphereKpa: Math.round(coach.atmosphereKpa * 10) / 10,
    seed: walk.seed + walk.world.active,
    ...(walk.profile ? { profile: walk.profile } : {}),
    ...(walk.supplyAt ? { supply: walk.supplyAt(pauseS) } : {}),
  };
}

function rigOf(coach: Coach, habits: Habits): NonNullable<FillSetup['rig']> {
  if (habits.dashOnly) {
    return { gauge: 'dash-only', valve: coach.valve, stepKpa: coach.dash.stepKpa };
  }
  const gauge = coach.valve ? ('above-valve' as const) : ('at-chuck' as const);
  return { gauge, valve: coach.valve, stepKpa: coach.tee.stepKpa };
}
