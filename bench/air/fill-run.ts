import type { Advice, Adviser, FillSetup } from './adviser';
import { type Alone, newAlone, stepAlone } from './alone';
import { type Driver, newDriver, stepDriver } from './driver';
import { withinTolerance } from './gauges';
import type { Habits } from './habits';
import { type Helper, listen, newHelper, stepHelper, stopLowering } from './helper';
import { type FillOutcome, noCoverage, readOutcome } from './outcome';
import { deliverDue, newPhone, type Phone, recordCall, tapDone, tapNow } from './phone';
import { between, chance, type Dice } from './random';
import { readClock, startClock } from './stopwatch';
import {
  activeTire,
  fittingKpa,
  STEP_S,
  settledKpa,
  stepWorld,
  tireKpa,
  type World,
} from './world';

/** Advice is asked twice a second while something is about to change, else once. */
const ASK_S = { near: 0.5, far: 1 };
const NEAR_S = 6;
/** The band is compared with the truth this often, s. */
const COMPARE_S = 5;
/** A crew believes `cannot-reach` when it has stood this long, s. */
const BELIEVES_AFTER_S = 5;
/** A crew gives up at this many times the perfect player's time, and not before, s. */
const PATIENCE = { times: 8, leastS: 900, hopelessS: 1500 };

/** One fill under way: the crew, its phone and what is counted. */
export interface Run {
  world: World;
  adviser: Adviser;
  habits: Habits;
  dice: Dice;
  phone: Phone;
  driver: Driver;
  helper: Helper;
  alone: Alone;
  helperHere: boolean;
  /** When the helper next comes or goes. */
  crewChangesAt: number;
  now: number;
  advice: Advice | null;
  askAt: number;
  compareAt: number;
  hopelessSince: number;
  offAt: number;
  provenAt: number;
  overLimit: boolean;
  outcome: Pick<FillOutcome, 'supplyBand' | 'tireBand' | 'adviseMs'>;
  watch: Watch;
}

/** What a tracer is told. */
export interface Watch {
  began?: (setup: FillSetup) => void;
  asked?: (run: Run, advice: Advice) => void;
  stepped?: (run: Run) => void;
}

/** Runs one fill to its end with a crew that follows the adviser. The world moves on with it. */
export function runFill(
  world: World,
  adviser: Adviser,
  plan: { tire: number; perfectSeconds: number; habits: Habits; dice: Dice; watch?: Watch },
): FillOutcome {
  const run = newRun(world, adviser, plan.habits, plan.dice, plan.watch ?? {});
  const longest = activeTire(world).reachable
    ? Math.max(PATIENCE.leastS, PATIENCE.times * plan.perfectSeconds)
    : PATIENCE.hopelessS;
  begin(run);
  let end: 'done' | 'hopeless' | null = null;
  while (!end && run.now < longest) end = step(run);
  tidy(run);
  return {
    ...readOutcome(world, plan.tire, plan.perfectSeconds),
    ...run.outcome,
    done: end === 'done',
    proven: run.provenAt >= run.offAt && run.provenAt > 0,
    saidUnreachable: end === 'hopeless',
    seconds: run.now,
    putOn: run.driver.putOn,
    bled: run.driver.bled,
    overLimit: run.overLimit,
    taps: run.phone.taps,
  };
}

function newRun(world: World, adviser: Adviser, habits: Habits, dice: Dice, watch: Watch): Run {
  const phone = newPhone(adviser, dice);
  const driver = newDriver(world, phone, dice, habits);
  const helper = newHelper(world, phone, dice, habits);
  return {
    world,
    adviser,
    habits,
    dice,
    phone,
    driver,
    helper,
    alone: newAlone(driver, helper),
    helperHere: !habits.alone,
    crewChangesAt: habits.comeAndGo ? between(dice, 15, 60) : Number.POSITIVE_INFINITY,
    now: 0,
    advice: null,
    askAt: 0,
    compareAt: COMPARE_S,
    hopelessSince: Number.POSITIVE_INFINITY,
    offAt: 0,
    provenAt: 0,
    overLimit: false,
    outcome: { supplyBand: noCoverage(), tireBand: noCoverage(), adviseMs: [] },
    watch,
  };
}

/** Whoever sets the engine's speed mostly says so. */
function begin(run: Run): void {
  if (chance(run.dice, 0.9)) tapDone(run.phone, { type: 'engine', speed: run.world.speed }, true);
}

function step(run: Run): 'done' | 'hopeless' | null {
  stepWorld(run.world);
  run.now = Math.round((run.now + STEP_S) * 10) / 10;
  if (deliverDue(run.phone, run.now)) run.askAt = Math.min(run.askAt, run.now + STEP_S);
  notePhysics(run);
  if (run.now >= run.askAt) ask(run);
  if (!run.advice) return null;
  changeCrew(run);
  if (run.helperHere) {
    stepDriver(run.driver, run.advice, run.now);
    stepHelper(run.helper, run.advice, run.now);
  } else {
    stepAlone(run.alone, run.advice, run.now);
  }
  listen(run.helper, run.helperHere);
  run.watch.stepped?.(run);
  return ended(run, run.advice);
}

function notePhysics(run: Run): void {
  const { world } = run;
  if (world.chuck !== 'off') run.offAt = run.now;
  const { targetKpa, toleranceKpa, limitKpa } = activeTire(world);
  if (settledKpa(world) > limitKpa && tireKpa(world) > targetKpa + toleranceKpa)
    run.overLimit = true;
  const last = run.phone.log[run.phone.log.length - 1];
  if (last?.type === 'tire-reading' && withinTolerance(last.kpa, world)) {
    run.provenAt = last.at;
  }
}

function ask(run: Run): void {
  const { now } = run;
  const clock = startClock();
  const advice = run.adviser.advise(now);
  run.outcome.adviseMs.push(readClock(clock));
  run.watch.asked?.(run, advice);
  const changed = advice.call !== run.advice?.call;
  run.advice = advice;
  if (changed) recordCall(run.phone, { type: 'call-shown', at: now, call: advice.call });
  const near = (advice.changeIn?.p10 ?? 0) < NEAR_S;
  run.askAt = now + (near ? ASK_S.near : ASK_S.far);
  if (advice.call !== 'cannot-reach') run.hopelessSince = Number.POSITIVE_INFINITY;
  else if (run.hopelessSince === Number.POSITIVE_INFINITY) run.hopelessSince = now;
  if (now >= run.compareAt) compare(run, advice);
}

function compare(run: Run, advice: Advice): void {
  run.compareAt = run.now + COMPARE_S;
  const { supplyBand, tireBand } = run.outcome;
  const within = (kpa: number, { p10, p90 }: Advice['supplyKpa']) => kpa >= p10 && kpa <= p90;
  supplyBand.asked += 1;
  tireBand.asked += 1;
  if (within(fittingKpa(run.world), advice.supplyKpa)) supplyBand.inside += 1;
  if (within(settledKpa(run.world), advice.tireKpa)) tireBand.inside += 1;
}

/** The helper goes and comes back; a foot on the pedal comes off first. */
function changeCrew(run: Run): void {
  if (run.now < run.crewChangesAt || run.helper.job || run.alone.walkingTo) return;
  if (run.helperHere) stopLowering(run.helper);
  else if (run.alone.where === 'seat') return;
  run.helperHere = !run.helperHere;
  run.crewChangesAt = run.now + between(run.dice, 60, 180);
  tapNow(run.phone, { type: 'crew', helper: run.helperHere });
}

function ended(run: Run, advice: Advice): 'done' | 'hopeless' | null {
  const free = run.world.chuck === 'off' && !run.world.bleeding && !run.helper.lowering;
  if (advice.call === 'done' && free) return 'done';
  return run.now - run.hopelessSince > BELIEVES_AFTER_S && free ? 'hopeless' : null;
}

/** Whatever happened, nobody leaves with the chuck on or a foot on the pedal. */
function tidy({ world }: Run): void {
  world.chuck = 'off';
  world.bleeding = false;
  world.pedal = false;
  world.drain = false;
}
