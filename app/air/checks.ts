/**
 * Something is not as it should be. Each check rests on what was tapped, stands for a while after
 * its evidence and then gives way, so that a person who has looked is not held up.
 */

import { chance, isLowering } from './belief';
import { PATH } from './coach';
import type { SeenReading } from './facts';
import { KPA_PER_PSI } from './priors';
import type { Reason } from './reasons';
import type { Decision, Situation } from './situation';

/** How long a check stands after its evidence, s. */
const STANDS_S = 15;
/** A chuck that was called off and is not tapped off, s. */
const OFF_OVERDUE_S = 20;
/** Readings are compared over at least this, s. */
const LEAST_SPAN_S = 20;
const LONG_SPAN_S = 40;
/** Two gauges read within this of each other are read together, s. */
const TOGETHER_S = 20;
/** Dash within 7 % of cut-out (49 CFR 571.121 S5.1.4, from memory) and a hose gauge's own error. */
const DISAGREE_KPA = 14 * KPA_PER_PSI;
/** A supply that rises less than this at a running engine does not build, kPa/s. */
const LEAST_BUILD = 0.25;
/** Lowering by pedal or drain shows on the gauge within this, s, unless the supply is elsewhere. */
const LOWERING_SHOWS_S = 12;

/** By then hands have long stopped, tapped or not, s. */
const LOWERING_LONGEST_S = 45;

export function checkNow(s: Situation): Decision | undefined {
  const reason = s.facts.chuckOn ? checkWhileOn(s) : checkWhileOff(s);
  return reason && { call: 'check', reason };
}

function checkWhileOn(s: Situation): Reason | undefined {
  const { facts, belief, setup, e, at } = s;
  const overdue = facts.offShownAt !== undefined && at - facts.offShownAt > OFF_OVERDUE_S;
  const { targetKpa, toleranceKpa } = setup.tire;
  if (overdue || belief.tire.p10 > targetKpa + 1.5 * toleranceKpa) return 'chuck-still-on';
  const since = at - facts.holds[facts.holds.length - 1]!.on;
  const shut = chance(
    e,
    (i) => e.members.path[i] === PATH.shut || e.members.path[i] === PATH.leaking,
  );
  return since > 5 && shut > 0.8 ? 'tire-not-rising' : undefined;
}

function checkWhileOff(s: Situation): Reason | undefined {
  const { facts } = s;
  if (isLowering(s.e, facts)) return lowersNothing(s) ? 'supply-not-moving' : undefined;
  if (facts.lowAir) return 'low-air';
  if (heldInVain(s)) return 'tire-not-rising';
  if (disagree(s)) return 'gauges-disagree';
  return supplyCheck(s);
}

/** The reading after a hold equals the one before, though supply stood well above the tire. */
function heldInVain(s: Situation): boolean {
  const { facts, setup, at } = s;
  const after = facts.gauged[facts.gauged.length - 1];
  const hold = facts.holds[facts.holds.length - 1];
  if (!after || !hold?.off || after.at < hold.off || at - after.at > STANDS_S) return false;
  if (hold.off - hold.on < 15 || facts.bledAt > hold.on) return false;
  const before = facts.gauged[facts.gauged.length - 2]?.kpa ?? setup.tire.startKpa;
  const seen = facts.readings.filter((r) => r.at > hold.on - 30 && r.at < after.at);
  const above = seen.length > 0 && seen.every((r) => r.kpa > after.kpa + 5 * KPA_PER_PSI);
  return above && after.kpa - before < 0.3 * KPA_PER_PSI;
}

function disagree(s: Situation): boolean {
  const last = s.facts.readings[s.facts.readings.length - 1];
  if (!last || s.at - last.at > STANDS_S || last.flowing) return false;
  return s.facts.readings.some(
    (r) =>
      r.source !== last.source &&
      !r.flowing &&
      last.at - r.at <= TOGETHER_S &&
      Math.abs(r.kpa - last.kpa) > DISAGREE_KPA,
  );
}

/** Lowered for a while, and the gauge on the hose stands where it stood. */
function lowersNothing(s: Situation): boolean {
  const { facts, at } = s;
  const since = facts.loweringSince;
  const before = facts.readings.filter((r) => r.at > since - 60 && r.at <= since + 2);
  const last = facts.readings[facts.readings.length - 1];
  const first = before[before.length - 1];
  if (!last || !first || first.source !== last.source || first.flowing) return false;
  if (
    last.at - since < LOWERING_SHOWS_S ||
    last.at - since > LOWERING_LONGEST_S ||
    at - last.at > STANDS_S
  )
    return false;
  return last.kpa > first.kpa - 0.6 * KPA_PER_PSI;
}

/** The supply at a running engine, below the governor's range or with the compressor loaded. */
function supplyCheck(s: Situation): Reason | undefined {
  const { facts, at } = s;
  const last = facts.readings[facts.readings.length - 1];
  if (!last || at - last.at > STANDS_S || facts.speed === undefined || facts.speed === 'off') {
    return undefined;
  }
  const quietSince = Math.max(facts.speedAt, facts.loweringEnded, lastHoldEnd(s)) + 3;
  const run = facts.readings.filter((r) => r.source === last.source && r.at >= quietSince);
  const first = run.find((r) => last.at - r.at <= 120);
  if (!first || run.length < 2 || last.at - first.at < LEAST_SPAN_S) return undefined;
  return judgeBuild(s, first, last);
}

function judgeBuild(s: Situation, first: SeenReading, last: SeenReading): Reason | undefined {
  const { facts } = s;
  const seconds = last.at - first.at;
  const rate = (last.kpa - first.kpa) / seconds;
  const toldLoaded = facts.cutIns.some((at) => at >= first.at - 60 && at <= last.at);
  const cutOutSince = facts.cutOuts.some((at) => at >= first.at - 20);
  if (toldLoaded && !cutOutSince) {
    return rate < LEAST_BUILD && seconds >= LEAST_SPAN_S ? 'not-building' : undefined;
  }
  // Below any usual cut-in (80 to 110 psi) the compressor must pump, whatever this ensemble thinks.
  const low = last.kpa < Math.max(78 * KPA_PER_PSI, s.startCutIn.p10 - 3 * KPA_PER_PSI);
  if (!low) return undefined;
  if (rate <= 0.03) return 'compressor-not-loading';
  return rate < LEAST_BUILD && seconds >= LONG_SPAN_S ? 'not-building' : undefined;
}

function lastHoldEnd(s: Situation): number {
  const hold = s.facts.holds[s.facts.holds.length - 1];
  return hold ? (hold.off ?? hold.on) : -1e6;
}
