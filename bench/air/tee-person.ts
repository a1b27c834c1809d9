import type { LowerBy } from './coach';
import { psi } from './flow';
import { readTee, readTire, withinTolerance } from './gauges';
import { type FillOutcome, noCoverage, readOutcome } from './outcome';
import type { PersonTraits } from './person-traits';
import { around, between, chance, type Dice } from './random';
import { activeTire, STEP_S, stepWorld, type World } from './world';

/** What a person takes along from tire to tire. */
export interface PersonMemory {
  rateKpaPerS: number;
}

type Doing = 'watch' | 'on' | 'hold' | 'off' | 'gauge' | 'lower' | 'stop' | 'bleed';

interface Person {
  world: World;
  dice: Dice;
  traits: PersonTraits;
  memory: PersonMemory;
  by: LowerBy | null;
  doing: Doing;
  until: number;
  elapsed: number;
  believedKpa: number;
  heldFrom: number;
  heldFor: number;
  /** Pump-downs since air last went in: patience makes people settle for less headroom. */
  tries: number;
  /** The compressor was heard to load: no pedal again before this. */
  trustsUntil: number;
  headroomAtStart: number;
  lookedAt: number;
  tee: number;
  /** The gauge a few seconds ago, to see which way it moves. */
  before: { at: number; kpa: number };
  rising: boolean;
  fastIdleAt: number;
  putOn: number;
  bled: boolean;
  done: boolean;
}

/** Nobody stays at one tire longer than this, s. */
const LONGEST_S = 3600;
/** A glance at the gauge, and the time over which a movement is seen, s. */
const GLANCE_S = 0.5;
const MOVEMENT_S = 4;
/** After the compressor has loaded nobody pumps again sooner than this, s. */
const TRUSTS_LOADING_S = 20;
/** No hiss from a chuck: noticed about this soon, s. */
const NOTICES_SILENCE_S = 10;
/** The least gain that a person takes for one, kPa. */
const SEEN_GAIN_KPA = psi(0.3);
/** How fast people believe that a pin in the core bleeds, kPa/s. */
const BLEED_GUESS_KPA_PER_S = psi(0.25);

export function startMemory(traits: PersonTraits, dice: Dice): PersonMemory {
  return { rateKpaPerS: psi(around(dice, traits.guessPsiPerS, traits.guessSigma)) };
}

/** Fills the active tire as such a person would. The world moves on with it. */
export function fillByEye(
  world: World,
  traits: PersonTraits,
  memory: PersonMemory,
  dice: Dice,
): Pick<FillOutcome, 'seconds' | 'done' | 'putOn' | 'bled'> {
  const person = newPerson(world, traits, memory, dice);
  while (!person.done && person.elapsed < LONGEST_S) step(person);
  return { seconds: person.elapsed, done: person.done, putOn: person.putOn, bled: person.bled };
}

/** The same with everything that the table counts. */
export function outcomeByEye(
  world: World,
  tire: number,
  perfectSeconds: number,
  fill: () => ReturnType<typeof fillByEye>,
): FillOutcome {
  const end = fill();
  return {
    ...readOutcome(world, tire, perfectSeconds),
    ...end,
    proven: end.done,
    saidUnreachable: false,
    overLimit: false,
    taps: 0,
    supplyBand: noCoverage(),
    tireBand: noCoverage(),
    adviseMs: [],
  };
}

function newPerson(world: World, traits: PersonTraits, memory: PersonMemory, dice: Dice): Person {
  const { lowerBy } = world.coach;
  return {
    world,
    dice,
    traits,
    memory: traits.learns ? memory : startMemory(traits, dice),
    by: lowerBy[0] ?? null,
    doing: 'watch',
    until: 0,
    elapsed: 0,
    believedKpa: readTire(world, dice),
    heldFrom: 0,
    heldFor: 0,
    tries: 0,
    trustsUntil: 0,
    headroomAtStart: 0,
    lookedAt: 0,
    tee: readTee(world, dice),
    before: { at: 0, kpa: readTee(world, dice) },
    rising: false,
    fastIdleAt: between(dice, 3, 8),
    putOn: 0,
    bled: false,
    done: false,
  };
}

function step(person: Person): void {
  stepWorld(person.world);
  person.elapsed += STEP_S;
  look(person);
  keepFastIdle(person);
  ACTS[person.doing](person);
}

function look(person: Person): void {
  if (person.elapsed - person.lookedAt < GLANCE_S) return;
  person.lookedAt = person.elapsed;
  person.tee = readTee(person.world, person.dice);
  if (person.elapsed - person.before.at < MOVEMENT_S) return;
  const seen = Math.max(psi(0.7), 0.6 * person.world.coach.tee.stepKpa);
  person.rising = person.tee > person.before.kpa + seen;
  person.before = { at: person.elapsed, kpa: person.tee };
}

function keepFastIdle(person: Person): void {
  const { world, dice } = person;
  if (world.speed === 'fast-idle' || world.pedal) return;
  if (!Number.isFinite(person.fastIdleAt)) {
    person.fastIdleAt = person.elapsed + between(dice, 3, 25);
  }
  if (person.elapsed < person.fastIdleAt) return;
  world.speed = 'fast-idle';
  person.fastIdleAt = Number.POSITIVE_INFINITY;
}

function begin(person: Person, doing: Doing, seconds: number): void {
  person.doing = doing;
  person.until = person.elapsed + seconds;
}

const ACTS: Record<Doing, (person: Person) => void> = {
  watch,
  on: (person) => after(person, putOn),
  hold,
  off: (person) => after(person, takeOff),
  gauge: (person) => after(person, gauge),
  lower,
  stop: (person) => after(person, stopLowering),
  bleed: (person) => after(person, endBleed),
};

function after(person: Person, act: (person: Person) => void): void {
  if (person.elapsed >= person.until) act(person);
}

function watch(person: Person): void {
  const { traits, dice } = person;
  if (person.elapsed - person.before.at > MOVEMENT_S || person.elapsed < MOVEMENT_S) return;
  const over = person.tee - person.believedKpa;
  const wanted = psi((person.rising ? traits.risingPsi : traits.restingPsi) - person.tries);
  if (over >= wanted) begin(person, 'on', between(dice, 1.5, 3.5));
  else if (!person.rising && person.by && person.elapsed > person.trustsUntil)
    begin(person, 'lower', between(dice, 2, 5));
}

function putOn(person: Person): void {
  const { world, dice, traits, memory } = person;
  world.chuck = chance(dice, 0.03) ? 'blocked' : 'open';
  person.putOn += 1;
  person.tries = 0;
  person.heldFrom = person.elapsed;
  person.headroomAtStart = Math.max(psi(1), person.tee - person.believedKpa);
  const needs = activeTire(world).targetKpa - person.believedKpa;
  const rate = memory.rateKpaPerS * Math.sqrt(traits.learns ? scale(person) : 1);
  const seconds = (traits.boldness * needs) / rate;
  const longest = person.putOn > 1 ? traits.longestHoldS : traits.longestFirstS;
  begin(person, 'hold', Math.min(longest, Math.max(3, seconds)));
}

/** An expert knows that a small difference fills slowly: rates are kept for 12 psi of headroom. */
function scale(person: Person): number {
  return Math.min(2, person.headroomAtStart / psi(12));
}

function hold(person: Person): void {
  const { world, memory, traits, dice } = person;
  const held = person.elapsed - person.heldFrom;
  if (world.chuck === 'blocked' && chance(dice, STEP_S / NOTICES_SILENCE_S)) world.chuck = 'open';
  const now = Math.min(activeTire(world).targetKpa, person.believedKpa + held * memory.rateKpaPerS);
  const near = held > 3 && person.tee < now + psi(traits.nearPsi) && !person.rising;
  if (near || person.elapsed >= person.until) begin(person, 'off', between(dice, 0.8, 2));
}

function takeOff(person: Person): void {
  person.world.chuck = 'off';
  person.heldFor = person.elapsed - person.heldFrom;
  begin(person, 'gauge', between(person.dice, 9, 15));
}

function gauge(person: Person): void {
  const { world, dice, memory } = person;
  const reading = readTire(world, dice);
  if (person.heldFor > 0) learn(person, reading - person.believedKpa);
  person.heldFor = 0;
  person.believedKpa = reading;
  const { targetKpa } = activeTire(world);
  if (withinTolerance(reading, world)) {
    person.done = true;
  } else if (reading > targetKpa) {
    world.bleeding = true;
    person.bled = true;
    const seconds = (reading - targetKpa) / BLEED_GUESS_KPA_PER_S;
    begin(person, 'bleed', Math.max(1, seconds * around(dice, 1, 0.3)));
  } else {
    begin(person, 'watch', 0);
  }
  memory.rateKpaPerS = Math.max(psi(0.01), memory.rateKpaPerS);
}

function learn(person: Person, gainKpa: number): void {
  const { memory, traits } = person;
  if (gainKpa < SEEN_GAIN_KPA) return;
  const seen = gainKpa / person.heldFor / Math.sqrt(traits.learns ? scale(person) : 1);
  memory.rateKpaPerS = traits.learns ? 0.3 * memory.rateKpaPerS + 0.7 * seen : seen;
}

function lower(person: Person): void {
  const { world, dice, by } = person;
  if (person.elapsed < person.until) return;
  if (by === 'pedal') world.pedal = true;
  if (by === 'drain') world.drain = true;
  if (world.loaded) begin(person, 'stop', between(dice, 1, 3));
}

function stopLowering(person: Person): void {
  person.world.pedal = false;
  person.world.drain = false;
  person.tries += 1;
  person.trustsUntil = person.elapsed + TRUSTS_LOADING_S;
  begin(person, 'watch', 0);
}

function endBleed(person: Person): void {
  person.world.bleeding = false;
  begin(person, 'gauge', between(person.dice, 5, 8));
}
