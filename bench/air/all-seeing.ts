import type { Advice, Adviser, FillEvent } from './adviser';
import { psi } from './flow';
import { withinTolerance } from './gauges';
import { type Hands, type PerfectResult, playPerfect } from './perfect';
import { activeTire, fittingKpa, headroomKpa, settledKpa, tireKpa, type World } from './world';

/** Mean seconds from a call to chuck off, which the adviser knows (design/engine.md). */
const OFF_LAG_S = 1.9;
/** Headroom from which putting on is worth the hands, kPa. */
const WORTH_KPA = psi(0.5);
/** Share of the tolerance within which a true pressure is as good as gauged. */
const GOOD_SHARE = 0.7;
/** Between two gaugings of a warm tire, s. */
const SETTLE_S = 15;

/**
 * Knows the true pressures, and the plan of the perfect player; acts through the same late hands
 * and asks for the same proof: the floor for any adviser.
 */
export function newAllSeeing(world: World, hands: Hands): Adviser {
  const mind: Mind = {
    world,
    hands,
    best: plan(world, hands),
    readingAt: -1,
    readingKpa: 0,
    offAt: -1,
    wasOn: false,
  };
  return {
    apply: (event) => hear(mind, event),
    advise: (at) => {
      const on = world.chuck !== 'off';
      if (mind.wasOn && !on) {
        mind.offAt = at;
        mind.best = plan(world, hands);
      }
      mind.wasOn = on;
      return { ...decide(mind, at), ...truth(world) };
    },
  };
}

interface Mind {
  world: World;
  hands: Hands;
  best: PerfectResult;
  readingAt: number;
  readingKpa: number;
  offAt: number;
  wasOn: boolean;
}

/** Made anew whenever the chuck comes off: late hands may have missed what the last one counted on. */
function plan(world: World, hands: Hands): PerfectResult {
  return playPerfect(world, activeTire(world).reachable ? undefined : 0, hands);
}

type Said = Pick<Advice, 'call' | 'reason' | 'cab' | 'by' | 'readIn'>;

function hear(mind: Mind, event: FillEvent): void {
  if (event.type !== 'tire-reading') return;
  mind.readingAt = event.at;
  mind.readingKpa = event.kpa;
}

function truth(world: World) {
  const exactly = (kpa: number) => ({ p10: kpa, p50: kpa, p90: kpa });
  return {
    supplyKpa: exactly(fittingKpa(world)),
    tireKpa: exactly(settledKpa(world)),
    loaded: world.loaded ? 1 : 0,
    flowsIn: headroomKpa(world) > 0 ? 1 : 0,
  };
}

function decide(mind: Mind, at: number): Said {
  const { world } = mind;
  if (!activeTire(world).reachable) {
    return { call: 'cannot-reach', reason: 'governor-too-low' };
  }
  const cab = world.speed === 'idle' && !world.pedal ? 'set-fast-idle' : 'nothing';
  if (world.chuck !== 'off') return { ...whileOn(mind), cab };
  const { targetKpa, toleranceKpa } = activeTire(world);
  const short = settledKpa(world) < targetKpa - GOOD_SHARE * toleranceKpa;
  return short ? whileShort(mind, cab) : prove(mind, at);
}

function whileOn({ world, best }: Mind): Said {
  if (world.chuck !== 'open') return { call: 'check', reason: 'tire-not-rising' };
  const coming = (world.tireFlow / world.tires[world.active]!.volumeL) * OFF_LAG_S;
  if (settledKpa(world) + coming >= activeTire(world).targetKpa) {
    return { call: 'chuck-off', reason: 'target-reached' };
  }
  const turning = headroomKpa(world) < WORTH_KPA / 2 && !world.loaded;
  if (turning || wantsLower(world, best)) return { call: 'chuck-off', reason: 'supply-at-tire' };
  return { call: 'keep-on', reason: 'air-goes-in' };
}

function whileShort({ world, best }: Mind, cab: Advice['cab']): Said {
  const by = best.policy.by;
  if (world.pedal || world.drain) {
    if (world.loaded)
      return { call: 'stop-lowering', reason: 'cut-in-likely', cab: 'stop-lowering' };
    return { call: 'lower-supply', reason: 'lower-to-cut-in', cab: 'lower-supply', ...named(by) };
  }
  if (wantsLower(world, best)) {
    return { call: 'lower-supply', reason: 'lower-to-cut-in', cab: 'lower-supply', ...named(by) };
  }
  const worth = headroomKpa(world) > (world.loaded ? 0 : WORTH_KPA);
  if (worth) return { call: 'chuck-on', reason: 'supply-above-tire', cab };
  return { call: 'wait', reason: 'supply-below-tire', cab };
}

function named(by: 'pedal' | 'drain' | null) {
  return by ? { by } : {};
}

function wantsLower(world: World, { policy }: PerfectResult): boolean {
  return policy.by !== null && !world.loaded && headroomKpa(world) < policy.lowerBelowKpa;
}

function prove(mind: Mind, at: number): Said {
  const { world } = mind;
  const { targetKpa, toleranceKpa } = activeTire(world);
  if (settledKpa(world) > targetKpa + toleranceKpa || world.bleeding) {
    const over = tireKpa(world) > targetKpa + 0.5 * toleranceKpa;
    if (over) return { call: 'bleed', reason: 'over-target' };
  }
  const gauged = mind.readingAt >= mind.offAt && mind.readingAt >= 0;
  if (!gauged) return { call: 'gauge-tire', reason: 'prove-it' };
  if (withinTolerance(mind.readingKpa, world)) {
    return { call: 'done', reason: 'in-tolerance' };
  }
  if (at - mind.readingAt < SETTLE_S) return { call: 'wait', reason: 'let-it-settle' };
  return { call: 'gauge-tire', reason: 'prove-it' };
}
