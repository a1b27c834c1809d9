import type { LowerBy } from './coach';
import { psi } from './flow';
import {
  activeTire,
  copyWorld,
  headroomKpa,
  STEP_S,
  settledKpa,
  stepWorld,
  type World,
} from './world';

/** Hands of the perfect player, in seconds. Eyes and mind take none. */
const HANDS = { on: 2, off: 1, pedal: 1.5, drain: 4, stop: 0.7, fastIdle: 3 };
/** Headroom from which putting on is worth the hand, kPa. */
const WORTH_KPA = psi(0.4);
/** Close enough to the target to stop, kPa. */
const CLOSE_KPA = psi(0.1);
/** Nobody stands longer than this at one tire, s. */
const LONGEST_S = 3600;

/** When to bring the supply down: unloaded and headroom below this. */
export interface Policy {
  lowerBelowKpa: number;
  by: LowerBy | null;
}

export interface PerfectResult {
  seconds: number;
  policy: Policy;
}

const LOWER_BELOW_PSI = [0.3, 1, 2, 3.5, 5, 8, 12, 99];

/**
 * The quickest of a family of players who see every true pressure, started from a copy of this
 * world. Infinity where none gets there.
 */
export function playPerfect(world: World, longestS = LONGEST_S): PerfectResult {
  const never: Policy = { lowerBelowKpa: 0, by: null };
  let best: PerfectResult = { seconds: Number.POSITIVE_INFINITY, policy: never };
  for (const policy of [never, ...lowering(world)]) {
    const seconds = playPolicy(copyWorld(world), policy, Math.min(best.seconds, longestS));
    if (seconds < best.seconds) best = { seconds, policy };
  }
  return best;
}

function lowering(world: World): Policy[] {
  return world.coach.lowerBy.flatMap((by) =>
    LOWER_BELOW_PSI.map((below) => ({ lowerBelowKpa: psi(below), by })),
  );
}

export interface Player {
  world: World;
  policy: Policy;
  elapsed: number;
  /** What the hands are doing, and until when. */
  doing: 'on' | 'off' | 'lower' | 'stop' | null;
  readyAt: number;
  fastIdleAt: number;
}

/** Seconds until the chuck is off a tire at its target, or Infinity at the limit. */
export function playPolicy(world: World, policy: Policy, limitS: number): number {
  const player = newPlayer(world, policy);
  while (player.elapsed < limitS) {
    if (stepPlayer(player)) return player.elapsed;
  }
  return Number.POSITIVE_INFINITY;
}

export function newPlayer(world: World, policy: Policy): Player {
  const fastIdleAt = world.speed === 'fast-idle' ? Number.POSITIVE_INFINITY : HANDS.fastIdle;
  return { world, policy, elapsed: 0, doing: null, readyAt: 0, fastIdleAt };
}

/** One step; true when done. */
export function stepPlayer(player: Player): boolean {
  stepWorld(player.world);
  player.elapsed += STEP_S;
  keepFastIdle(player);
  if (player.doing !== null) {
    if (player.elapsed < player.readyAt) return false;
    finish(player);
  }
  return decide(player);
}

function keepFastIdle(player: Player): void {
  const { world } = player;
  if (world.speed === 'fast-idle' || world.pedal) return;
  if (player.fastIdleAt === Number.POSITIVE_INFINITY) {
    player.fastIdleAt = player.elapsed + HANDS.fastIdle;
  }
  if (player.elapsed < player.fastIdleAt) return;
  world.speed = 'fast-idle';
  player.fastIdleAt = Number.POSITIVE_INFINITY;
}

function finish(player: Player): void {
  const { world, policy } = player;
  if (player.doing === 'on') world.chuck = 'open';
  if (player.doing === 'off') world.chuck = 'off';
  if (player.doing === 'lower') setLowering(world, policy, true);
  if (player.doing === 'stop') setLowering(world, policy, false);
  player.doing = null;
}

function setLowering(world: World, policy: Policy, on: boolean): void {
  if (policy.by === 'pedal') world.pedal = on;
  if (policy.by === 'drain') world.drain = on;
}

function begin(player: Player, doing: NonNullable<Player['doing']>, seconds: number): false {
  player.doing = doing;
  player.readyAt = player.elapsed + seconds;
  return false;
}

function decide(player: Player): boolean {
  const { world } = player;
  if (world.chuck !== 'off') return decideOn(player);
  if (settledKpa(world) >= activeTire(world).targetKpa - CLOSE_KPA) return true;
  if (world.pedal || world.drain) {
    return world.loaded ? begin(player, 'stop', HANDS.stop) : false;
  }
  const { by } = player.policy;
  if (by && wantsLower(player)) return begin(player, 'lower', HANDS[by]);
  if (headroomKpa(world) > (world.loaded ? 0 : WORTH_KPA)) return begin(player, 'on', HANDS.on);
  return false;
}

function decideOn(player: Player): false {
  const { world } = player;
  const tire = world.tires[world.active]!;
  const coming = (world.tireFlow / tire.volumeL) * HANDS.off;
  const full = settledKpa(world) + coming >= activeTire(world).targetKpa;
  const turning = headroomKpa(world) < WORTH_KPA / 4;
  if (full || turning || wantsLower(player)) return begin(player, 'off', HANDS.off);
  return false;
}

function wantsLower({ world, policy }: Player): boolean {
  return policy.by !== null && !world.loaded && headroomKpa(world) < policy.lowerBelowKpa;
}
