import type { Advice } from './adviser';
import type { LowerBy } from './coach';
import { psi } from './flow';
import { readDash } from './gauges';
import {
  FALSE_HISS_PER_S,
  type Habits,
  HEARS_PURGE,
  NOTICES_IDLE,
  NOTICES_LOADING,
  TAKES,
  UNASKED_EVERY_S,
} from './habits';
import { type Phone, tapDone, tapNow } from './phone';
import { between, chance, type Dice } from './random';
import { pressureAbs } from './vessel';
import { STEP_S, type World } from './world';

type CabTask = 'nothing' | 'speed' | 'lower' | 'stop' | 'dash';

/** The person in the seat: pedal or drain, fast idle, dash gauge, and a pair of ears. */
export interface Helper {
  world: World;
  phone: Phone;
  dice: Dice;
  habits: Habits;
  seen: CabTask;
  actsAt: number;
  job: { endsAt: number; finish: () => void } | null;
  lowering: LowerBy | null;
  lowAir: boolean;
  idleSeenAt: number;
  lastDashAt: number;
  lastSpeedAt: number;
  nextUnaskedAt: number;
  heard: { cutOuts: number; cutIns: number };
}

/** The low-air warning, gauge kPa (49 CFR 571.121 S5.1.5: below 60 psi). */
const LOW_AIR_KPA = psi(60);
/** Two looks at the dash are this far apart, s. */
const DASH_GAP_S = 5;
/** Nobody sets the engine's speed again sooner than this, s. */
const SPEED_GAP_S = 10;

export function newHelper(world: World, phone: Phone, dice: Dice, habits: Habits): Helper {
  return {
    world,
    phone,
    dice,
    habits,
    seen: 'nothing',
    actsAt: 0,
    job: null,
    lowering: null,
    lowAir: false,
    idleSeenAt: Number.POSITIVE_INFINITY,
    lastDashAt: -DASH_GAP_S,
    lastSpeedAt: -SPEED_GAP_S,
    nextUnaskedAt: habits.every ?? between(dice, 20, UNASKED_EVERY_S),
    heard: { cutOuts: world.cutOuts, cutIns: world.cutIns },
  };
}

/** Reasons of `check` that send somebody to look at the engine's speed. */
const ENGINE_REASONS = new Set<string>(['not-building', 'compressor-not-loading', 'engine-off']);

/** What the seat is asked to do; the wheel's own call counts where no word for the cab is given. */
export function cabTask(advice: Advice, lowering: LowerBy | null): CabTask {
  const { cab, call } = advice;
  const lower = cab === 'lower-supply' || (cab === undefined && call === 'lower-supply');
  if (lower) return 'lower';
  if (lowering) return 'stop';
  if (cab === 'start-engine' || cab === 'set-fast-idle' || ENGINE_REASONS.has(advice.reason)) {
    return 'speed';
  }
  return cab === 'read-dash' ? 'dash' : 'nothing';
}

/** One step of the helper in the seat. */
export function stepHelper(helper: Helper, advice: Advice, now: number): void {
  warnLowAir(helper);
  noticeIdle(helper, now);
  if (helper.job && now >= helper.job.endsAt) {
    const { finish } = helper.job;
    helper.job = null;
    finish();
  }
  const task = cabTask(advice, helper.lowering);
  if (task !== helper.seen) {
    helper.seen = task;
    helper.actsAt = now + TAKES.notice(helper.dice);
  }
  if (now >= helper.actsAt && !helper.job) act(helper, task, advice, now);
}

function begin(helper: Helper, seconds: number, finish: () => void): void {
  helper.job = { endsAt: helper.phone.now + seconds, finish };
}

function act(helper: Helper, task: CabTask, advice: Advice, now: number): void {
  const { dice, world } = helper;
  const by = advice.by ?? world.coach.lowerBy[0];
  if (task === 'speed') {
    if (now - helper.lastSpeedAt < SPEED_GAP_S) return;
    begin(helper, TAKES.setSpeed(dice), () => setFastIdle(helper));
  } else if (task === 'stop') begin(helper, TAKES.stopLowering(dice), () => stopLowering(helper));
  else if (task === 'lower' && by && !helper.lowering && !helper.lowAir) {
    begin(helper, TAKES.startLowering(dice, by), () => startLowering(helper, by));
  } else if (wantsDash(helper, task, advice, now)) {
    begin(helper, TAKES.readDash(dice), () => tapDash(helper));
  }
}

function wantsDash(helper: Helper, task: CabTask, advice: Advice, now: number): boolean {
  const { habits } = helper;
  if (now - helper.lastDashAt < DASH_GAP_S) return false;
  if (habits.dashOnly && now >= helper.nextUnaskedAt) return true;
  if (habits.every !== null) return false;
  if (task === 'dash') return true;
  return habits.dashOnly && (advice.call === 'read-supply' || (advice.readIn ?? 1) <= 0);
}

function tapDash(helper: Helper): void {
  const { world, dice, phone, habits } = helper;
  helper.lastDashAt = phone.now;
  helper.nextUnaskedAt = phone.now + (habits.every ?? between(dice, 0.8, 1.2) * UNASKED_EVERY_S);
  const reading = {
    source: 'dash-gauge' as const,
    kpa: readDash(world, dice),
    how: 'typed' as const,
  };
  tapNow(phone, { type: 'supply-reading', ...reading, stepKpa: world.coach.dash.stepKpa }, true);
}

function setFastIdle(helper: Helper): void {
  helper.world.speed = 'fast-idle';
  helper.lastSpeedAt = helper.phone.now;
  helper.idleSeenAt = Number.POSITIVE_INFINITY;
  tapDone(helper.phone, { type: 'engine', speed: 'fast-idle' }, true);
}

function startLowering(helper: Helper, by: LowerBy): void {
  helper.lowering = by;
  if (by === 'pedal') helper.world.pedal = true;
  else helper.world.drain = true;
  tapDone(helper.phone, { type: 'lowering', by, on: true }, true);
}

export function stopLowering(helper: Helper): void {
  const by = helper.lowering;
  if (!by) return;
  helper.lowering = null;
  helper.world.pedal = false;
  helper.world.drain = false;
  tapDone(helper.phone, { type: 'lowering', by, on: false }, true);
}

function warnLowAir(helper: Helper): void {
  const { world, phone } = helper;
  const low = pressureAbs(world.service) - world.coach.atmosphereKpa < LOW_AIR_KPA;
  if (low === helper.lowAir) return;
  helper.lowAir = low;
  if (low) stopLowering(helper);
  tapDone(phone, { type: 'low-air', on: low }, true);
}

function noticeIdle(helper: Helper, now: number): void {
  const { world, dice } = helper;
  if (world.speed === 'fast-idle' || helper.lowering) return;
  if (helper.idleSeenAt === Number.POSITIVE_INFINITY) {
    helper.idleSeenAt = chance(dice, NOTICES_IDLE) ? now + between(dice, 8, 40) : 1e9;
  }
  if (now >= helper.idleSeenAt) setFastIdle(helper);
}

/** Ears: the purge, other hisses, and now and then the compressor that loads. */
export function listen(helper: Helper, earsInCab: boolean): void {
  const { world, dice, phone, habits, heard } = helper;
  const purged = world.cutOuts > heard.cutOuts;
  const loads = world.cutIns > heard.cutIns;
  heard.cutOuts = world.cutOuts;
  heard.cutIns = world.cutIns;
  if (habits.noPurge) return;
  const hissRate = helper.lowering ? FALSE_HISS_PER_S.pedal : FALSE_HISS_PER_S.rest;
  if ((purged && chance(dice, HEARS_PURGE)) || chance(dice, hissRate * STEP_S)) {
    tapDone(phone, { type: 'cut-out' }, earsInCab);
  }
  if (loads && chance(dice, NOTICES_LOADING)) tapDone(phone, { type: 'cut-in' }, earsInCab);
}
