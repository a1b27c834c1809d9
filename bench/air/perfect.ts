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
const HANDS = { on: 2, off: 1, pedal: 1.5, drain: 4, stop: 0.7, fastIdle: 3, walk: 0 };
export type Hands = typeof HANDS;
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
export function playPerfect(
  world: World,
  longestS = LONGEST_S,
  hands: Hands = HANDS,
): PerfectResult {
  const never: Policy = { lowerBelowKpa: 0, by: null };
  let best: PerfectResult = { seconds: Number.POSITIVE_INFINITY, policy: never };
  for (const policy of [...lowering(world), never]) {
    const seconds = playPolicy(copyWorld(world), policy, Math.min(best.seconds, longestS), hands);
    if (seconds < best.seconds) best = { seconds, policy };
  }
  return best;
}

/** Hands that wait for a call first: what an adviser must plan with, in seconds. */
export const LATE_HANDS: Hands = {
  on: 3,
  off: 2,
  pedal: 2.5,
  drain: 5,
  stop: 1.7,
  fastIdle: 4,
  walk: 0,
};

/** Alone, the pedal costs a walk to the seat and one back. */
export function handsAlone(walkS: number): Hands {
  return { ...LATE_HANDS, pedal: LATE_HANDS.pedal + walkS, walk: walkS };
}

function lowering(world: World): Policy[] {
  return world.coach.lowerBy.flatMap((by) =>
    LOWER_BELOW_PSI.map((below) => ({ lowerBelowKpa: psi(below), by })),
  );
}

interface Player {
  world: World;
  hands: Hands;
  policy: Policy;
  elapsed: number;
  /** What the hands are doing, and until when. */
  doing: 'on' | 'off' | 'lower' | 'stop' | 'walk' | null;
  readyAt: number;
  fastIdleAt: number;
}

/** Seconds until the chuck is off a tire at its target, or Infinity at the limit. */
export function playPolicy(
  world: World,
  policy: Policy,
  limitS: number,
  hands: Hands = HANDS,
): number {
  const player = newPlayer(world, policy, hands);
  while (player.elapsed < limitS) {
    if (stepPlayer(player)) return player.elapsed;
  }
  return Number.POSITIVE_INFINITY;
}

function newPlayer(world: World, policy: Policy, hands: Hands): Player {
  const fastIdleAt = world.speed === 'fast-idle' ? Number.POSITIVE_INFINITY : hands.fastIdle;
  return { world, hands, policy, elapsed: 0, doing: null, readyAt: 0, fastIdleAt };
}

/** One step; true when done. */
function stepPlayer(player: Player): boolean {
  stepWorld(player.world);
  player.elapsed += STEP_S;
  keepFastIdle(player);
  if (player.doing !== null) {
    if (player.elapsed < player.readyAt) return false;
    finish(player);
    if (player.doing !== null) return false;
  }
  return decide(player);
}

function keepFastIdle(player: Player): void {
  const { world } = player;
  if (world.speed === 'fast-idle' || world.pedal) return;
  if (player.fastIdleAt === Number.POSITIVE_INFINITY) {
    player.fastIdleAt = player.elapsed + player.hands.fastIdle;
  }
  if (player.elapsed < player.fastIdleAt) return;
  world.speed = 'fast-idle';
  player.fastIdleAt = Number.POSITIVE_INFINITY;
}

function finish(player: Player): void {
  const { world, policy, doing } = player;
  player.doing = null;
  if (doing === 'on') world.chuck = 'open';
  if (doing === 'off') world.chuck = 'off';
  if (doing === 'lower') setLowering(world, policy, true);
  if (doing !== 'stop') return;
  setLowering(world, policy, false);
  if (policy.by === 'pedal') begin(player, 'walk', player.hands.walk);
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
  const { world, hands } = player;
  if (world.chuck !== 'off') return decideOn(player);
  if (settledKpa(world) >= activeTire(world).targetKpa - CLOSE_KPA) return true;
  if (world.pedal || world.drain) {
    return world.loaded ? begin(player, 'stop', hands.stop) : false;
  }
  const { by } = player.policy;
  if (by && wantsLower(player)) return begin(player, 'lower', hands[by]);
  if (headroomKpa(world) > (world.loaded ? 0 : WORTH_KPA)) return begin(player, 'on', hands.on);
  return false;
}

function decideOn(player: Player): false {
  const { world, hands } = player;
  const tire = world.tires[world.active]!;
  const coming = (world.tireFlow / tire.volumeL) * hands.off;
  const full = settledKpa(world) + coming >= activeTire(world).targetKpa;
  const turning = headroomKpa(world) < WORTH_KPA / 4;
  if (full || turning || wantsLower(player)) return begin(player, 'off', hands.off);
  return false;
}

function wantsLower({ world, policy }: Player): boolean {
  return policy.by !== null && !world.loaded && headroomKpa(world) < policy.lowerBelowKpa;
}
