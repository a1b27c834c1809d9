import type { Advice, Call } from './adviser';
import { type Driver, stepDriver } from './driver';
import { TAKES } from './habits';
import { cabTask, type Helper, stepHelper } from './helper';
import { tapDone } from './phone';

type Where = 'wheel' | 'seat';

/** One person who is driver and helper in turn, and walks between wheel and seat. */
export interface Alone {
  driver: Driver;
  helper: Helper;
  where: Where;
  walkingTo: Where | null;
  arrivesAt: number;
  /** Since when the other place is wanted. */
  wantedSince: number;
}

/** Calls at which nobody leaves the wheel: the chuck may be on, or hands are needed there. */
const KEEPS_AT_WHEEL = new Set<Call>(['chuck-on', 'keep-on', 'chuck-off', 'gauge-tire', 'bleed']);

export function newAlone(driver: Driver, helper: Helper): Alone {
  return {
    driver,
    helper,
    where: 'wheel',
    walkingTo: null,
    arrivesAt: 0,
    wantedSince: Number.POSITIVE_INFINITY,
  };
}

/** One step of a person alone. */
export function stepAlone(alone: Alone, advice: Advice, now: number): void {
  if (alone.walkingTo) {
    if (now >= alone.arrivesAt) arrive(alone, alone.walkingTo);
    return;
  }
  const there = otherPlace(alone, advice);
  if (there === alone.where) alone.wantedSince = Number.POSITIVE_INFINITY;
  else alone.wantedSince = Math.min(alone.wantedSince, now);
  if (mayLeave(alone) && now - alone.wantedSince > TAKES.notice(alone.driver.dice)) {
    setOff(alone, there, now);
    return;
  }
  if (alone.where === 'seat') stepHelper(alone.helper, advice, now);
  else stepAtWheel(alone, advice, now);
}

/** The drain is pulled from the wheel's side; all else in the cab means a walk. */
function stepAtWheel(alone: Alone, advice: Advice, now: number): void {
  const { driver, helper } = alone;
  stepDriver(driver, advice, now);
  const off = driver.world.chuck === 'off' && !driver.job;
  if (off || helper.lowering) stepHelper(helper, onlyDrain(advice), now);
}

function onlyDrain(advice: Advice): Advice {
  const drains = advice.by === 'drain' && advice.call === 'lower-supply';
  return drains ? advice : { ...advice, call: 'wait', cab: 'nothing', readIn: 1 };
}

function otherPlace(alone: Alone, advice: Advice): Where {
  if (KEEPS_AT_WHEEL.has(advice.call)) return 'wheel';
  const { helper } = alone;
  const task = cabTask(advice, helper.lowering);
  const by = helper.lowering ?? advice.by ?? helper.world.coach.lowerBy[0];
  if (task === 'lower' || task === 'stop') return by === 'pedal' ? 'seat' : alone.where;
  const dash = helper.habits.dashOnly && advice.call === 'read-supply';
  return task === 'nothing' && !dash ? 'wheel' : 'seat';
}

/** Never away from a tire with the chuck on, nor from the seat with a foot on the pedal. */
function mayLeave({ driver, helper }: Alone): boolean {
  const free = driver.world.chuck === 'off' && !driver.world.bleeding && !driver.job;
  return free && !helper.lowering && !helper.job;
}

function setOff(alone: Alone, to: Where, now: number): void {
  alone.walkingTo = to;
  alone.arrivesAt = now + alone.driver.world.coach.walkS;
}

function arrive(alone: Alone, at: Where): void {
  alone.where = at;
  alone.walkingTo = null;
  alone.wantedSince = Number.POSITIVE_INFINITY;
  tapDone(alone.driver.phone, { type: 'place', where: at });
}
