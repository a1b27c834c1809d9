import type { Advice, Call } from './adviser';
import { psi } from './flow';
import { readTee, readTire } from './gauges';
import {
  BAD_SEAT,
  BLOCKED_SHARE,
  type Habits,
  LOOKS_AWAY_EVERY_S,
  MISTYPED,
  NOTICES_BAD_SEAT_S,
  TAKES,
  UNASKED_EVERY_S,
} from './habits';
import { type Phone, tapDone, tapNow } from './phone';
import { between, chance, type Dice } from './random';
import { STEP_S, type World } from './world';

interface Job {
  what: 'hands' | 'reading' | 'gauging';
  endsAt: number;
  finish: () => void;
}

/** The person at the wheel, who does what the screen says, a little late. */
export interface Driver {
  world: World;
  phone: Phone;
  dice: Dice;
  habits: Habits;
  job: Job | null;
  seen: Call | null;
  actsAt: number;
  awayUntil: number;
  lastReadingAt: number;
  nextUnaskedAt: number;
  lastChuckAt: number;
  lastCheckAt: number;
  putOn: number;
  bled: boolean;
}

/** Hands rest this long between two readings, and before a tap is made again, s. */
const READING_GAP_S = 4;
const TAP_AGAIN_S = 6;
const CHECK_AGAIN_S = 12;

export function newDriver(world: World, phone: Phone, dice: Dice, habits: Habits): Driver {
  return {
    world,
    phone,
    dice,
    habits,
    job: null,
    seen: null,
    actsAt: 0,
    awayUntil: 0,
    lastReadingAt: -UNASKED_EVERY_S,
    nextUnaskedAt: habits.every ?? between(dice, 40, UNASKED_EVERY_S),
    lastChuckAt: -TAP_AGAIN_S,
    lastCheckAt: -CHECK_AGAIN_S,
    putOn: 0,
    bled: false,
  };
}

/** One step of the driver. */
export function stepDriver(driver: Driver, advice: Advice, now: number): void {
  lookAway(driver, now);
  notice(driver, advice.call, now);
  noticeBadSeat(driver);
  if (driver.job && now >= driver.job.endsAt) {
    const { finish } = driver.job;
    driver.job = null;
    finish();
  }
  if (now < driver.actsAt || now < driver.awayUntil) return;
  if (driver.job?.what === 'reading' && advice.call === 'chuck-off') driver.job = null;
  if (!driver.job) act(driver, advice, now);
}

function lookAway(driver: Driver, now: number): void {
  if (now < driver.awayUntil || !chance(driver.dice, STEP_S / LOOKS_AWAY_EVERY_S)) return;
  driver.awayUntil = now + TAKES.lookAway(driver.dice);
}

function notice(driver: Driver, call: Call, now: number): void {
  if (call === driver.seen) return;
  driver.seen = call;
  driver.actsAt = Math.max(now, driver.awayUntil) + TAKES.notice(driver.dice);
}

/** No hiss, or too much of it: people find out by themselves in time. */
function noticeBadSeat(driver: Driver): void {
  const { world, dice } = driver;
  if (world.chuck !== 'blocked' && world.chuck !== 'leaking') return;
  if (chance(dice, STEP_S / NOTICES_BAD_SEAT_S)) world.chuck = 'open';
}

function begin(driver: Driver, what: Job['what'], seconds: number, finish: () => void): void {
  driver.job = { what, endsAt: driver.phone.now + seconds, finish };
}

function act(driver: Driver, advice: Advice, now: number): void {
  if (driver.world.bleeding && advice.call !== 'bleed') stopBleeding(driver);
  else ACTS[advice.call](driver, advice, now);
  if (!driver.job) readUnasked(driver, advice, now);
}

const ACTS: Record<Call, (driver: Driver, advice: Advice, now: number) => void> = {
  'read-supply': (driver, _advice, now) => readSupply(driver, now),
  wait: (driver) => keepOff(driver),
  'lower-supply': (driver) => keepOff(driver),
  'stop-lowering': (driver) => keepOff(driver),
  'chuck-on': (driver, _advice, now) => putOn(driver, now),
  'keep-on': (driver, _advice, now) => confirm(driver, now),
  'chuck-off': (driver, _advice, now) => takeOff(driver, now),
  'gauge-tire': (driver) => gaugeTire(driver),
  bleed: (driver) => startBleeding(driver),
  check: (driver, advice, now) => check(driver, advice, now),
  done: (driver) => keepOff(driver),
  'cannot-reach': (driver) => keepOff(driver),
};

function isOn(driver: Driver): boolean {
  return driver.world.chuck !== 'off';
}

function putOn(driver: Driver, now: number): void {
  if (isOn(driver)) confirm(driver, now);
  else seat(driver);
}

function seat(driver: Driver): void {
  const { world, dice, phone } = driver;
  begin(driver, 'hands', TAKES.chuckOn(dice, world.coach.valve), () => {
    const bad = chance(dice, BAD_SEAT);
    world.chuck = bad ? (chance(dice, BLOCKED_SHARE) ? 'blocked' : 'leaking') : 'open';
    driver.putOn += 1;
    driver.lastChuckAt = phone.now;
    tapDone(phone, { type: 'chuck', on: true });
  });
}

function takeOff(driver: Driver, now: number): void {
  if (isOn(driver)) unseat(driver);
  else confirm(driver, now);
}

function unseat(driver: Driver, then: () => void = () => {}): void {
  const { world, dice, phone } = driver;
  begin(driver, 'hands', TAKES.chuckOff(dice, world.coach.valve), () => {
    world.chuck = 'off';
    driver.lastChuckAt = phone.now;
    tapDone(phone, { type: 'chuck', on: false });
    then();
  });
}

/** The screen has it the other way round: a tap was forgotten, so it is made again. */
function confirm(driver: Driver, now: number): void {
  const saysOn = driver.seen === 'keep-on' || driver.seen === 'chuck-off';
  if (saysOn === isOn(driver) || now - driver.lastChuckAt < TAP_AGAIN_S) return;
  driver.lastChuckAt = now;
  tapNow(driver.phone, { type: 'chuck', on: isOn(driver) });
}

function keepOff(driver: Driver): void {
  if (isOn(driver)) unseat(driver);
}

function gaugeTire(driver: Driver): void {
  if (isOn(driver)) {
    unseat(driver);
    return;
  }
  const { world, dice, phone } = driver;
  begin(driver, 'gauging', TAKES.gaugeTire(dice, world.coach.valve), () => {
    const kpa = mistype(readTire(world, dice), dice);
    tapNow(phone, { type: 'tire-reading', kpa, stepKpa: world.coach.tireGauge.stepKpa });
    driver.actsAt = phone.now + 1;
  });
}

function mistype(kpa: number, dice: Dice): number {
  if (!chance(dice, MISTYPED)) return kpa;
  return Math.max(0, kpa + psi(chance(dice, 0.5) ? 10 : -10));
}

function startBleeding(driver: Driver): void {
  if (isOn(driver)) {
    unseat(driver);
    return;
  }
  if (driver.world.bleeding) return;
  begin(driver, 'hands', between(driver.dice, 1, 2), () => {
    driver.world.bleeding = true;
    driver.bled = true;
    tapDone(driver.phone, { type: 'bleeding', on: true });
  });
}

function stopBleeding(driver: Driver): void {
  driver.world.bleeding = false;
  tapDone(driver.phone, { type: 'bleeding', on: false });
}

function readSupply(driver: Driver, now: number): void {
  const { world, dice, phone, habits } = driver;
  if (habits.dashOnly || now - driver.lastReadingAt < READING_GAP_S) return;
  begin(driver, 'reading', TAKES.readGauge(dice), () => {
    const offered = chance(dice, 0.6);
    const shown = readTee(world, dice);
    driver.lastReadingAt = phone.now;
    driver.nextUnaskedAt = phone.now + (habits.every ?? between(dice, 0.8, 1.2) * UNASKED_EVERY_S);
    tapNow(phone, {
      type: 'supply-reading',
      source: 'wheel-gauge',
      kpa: offered ? shown : mistype(shown, dice),
      stepKpa: world.coach.tee.stepKpa,
      how: offered ? 'offered' : 'typed',
    });
  });
}

function readUnasked(driver: Driver, advice: Advice, now: number): void {
  const asked = driver.habits.every === null && (advice.readIn ?? 1) <= 0;
  if (asked || now >= driver.nextUnaskedAt) readSupply(driver, now);
}

/** Each reason has one thing to look at; then a look at the gauge (reasons: app/air). */
function check(driver: Driver, advice: Advice, now: number): void {
  if (now - driver.lastCheckAt < CHECK_AGAIN_S) return;
  driver.lastCheckAt = now;
  if (advice.reason === 'tire-not-rising' && isOn(driver)) {
    unseat(driver, () => seat(driver));
  } else if (advice.reason === 'chuck-still-on') {
    if (isOn(driver)) unseat(driver);
    else tapNow(driver.phone, { type: 'chuck', on: false });
  } else {
    readSupply(driver, now);
  }
}
