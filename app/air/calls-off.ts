/** The chuck is off and the tire needs air: gauge, wait, bring the supply down, or put it on. */

import { chance, isLowering } from './belief';
import { lastTouched } from './facts';
import { costOf, type Goal, meanOf, rollOut, rollOutBest, sampleFor } from './forecast';
import { lowestSupply, planGoal } from './plan';
import type { Decision, Situation } from './situation';
import { evenSpread } from './spread';

/** Lowering is asked for only while the compressor is hardly loaded, and stopped when it is. */
const LOADED_LITTLE = 0.25;
const LOADED_LIKELY = 0.85;
/** A supply known no better than this is read before anything else is said, kPa (p90 − p10). */
const UNKNOWN_KPA = 70;
/** What the fill before knew of the supply may be too old for a first call, kPa (p90 − p10). */
const STALE_KPA = 60;
/** The chuck goes on where air is this likely to flow in when hands have done it. */
const FLOWS_LIKELY = 0.8;
/** A hold that brings less than this is not worth the hands, kPa. */
const LEAST_HOLD_KPA = 1.5;
/** A governor gives a little more now and then; said when this sure, with a cut-out known so well. */
const REACH_MARGIN_KPA = 5;
const REACH_SURE = 0.9;
const REACH_SURE_UNHEARD = 0.97;
const KNOWN_CUT_OUT_KPA = 40;
/** A gauge that has shown this much more than is needed, kPa: its error is seldom larger. */
const DENIES_KPA = 14;
/** What a shown call is worth over a change of mind, s. */
const STANDS_S = 6;

export function callWhileOff(s: Situation): Decision {
  const { facts, belief, setup } = s;
  const gauge = needsGauge(s);
  if (isLowering(s.e, facts))
    return gauge && facts.helper ? gaugeMeanwhile(whileLowering(s)) : whileLowering(s);
  if (gauge) return gaugeFirst(s);
  const reach = cannotReach(s);
  if (reach) return reach;
  const spread = belief.supply.p90 - belief.supply.p10;
  if (facts.readings.length === 0 && (!setup.supply || spread > STALE_KPA)) {
    return { call: 'read-supply', reason: 'supply-unknown' };
  }
  if (facts.speed === 'off' && belief.flowsIn < 0.5) return { call: 'wait', reason: 'engine-off' };
  const unsure = belief.flowsIn < 0.95 && belief.flowsIn > 0.05;
  if (unsure && spread > UNKNOWN_KPA) {
    return { call: 'read-supply', reason: 'supply-unsure' };
  }
  return choosePlan(s, planGoal(s));
}

/** With a helper, the wheel gauges while the seat brings the supply down, where it must come down. */
function gaugeFirst(s: Situation): Decision {
  const { targetKpa, toleranceKpa } = s.setup.tire;
  const surelyShort = s.belief.tire.p90 < targetKpa - toleranceKpa;
  if (s.facts.helper && surelyShort && s.facts.readings.length > 0) {
    const plan = choosePlan(s, planGoal(s));
    if (plan.call === 'lower-supply') return gaugeMeanwhile(plan);
  }
  return { call: 'gauge-tire', reason: 'prove-it' };
}

function gaugeMeanwhile(plan: Decision): Decision {
  const cab = plan.call === 'lower-supply' || plan.call === 'stop-lowering' ? plan.call : undefined;
  return { call: 'gauge-tire', reason: 'see-what-went-in', cab, by: plan.by };
}

/** Gauge when the tire may be there already, or is known too badly to time the next hold. */
function needsGauge(s: Situation): boolean {
  const { facts, belief, setup } = s;
  const touched = lastTouched(facts);
  const last = facts.gauged[facts.gauged.length - 1];
  if (touched < 0 || (last && last.at >= touched)) return false;
  const { targetKpa, toleranceKpa } = setup.tire;
  if (belief.tire.p90 >= targetKpa - toleranceKpa) return true;
  return belief.tire.p90 - belief.tire.p10 > toleranceKpa;
}

/** Said when a cut-out was heard, or the fill before knew the governor, and no reading denies it. */
function cannotReach(s: Situation): Decision | undefined {
  const { e, belief, setup, facts } = s;
  const heard = facts.cutOuts.length > 0;
  const known = belief.cutOut.p90 - belief.cutOut.p10 < KNOWN_CUT_OUT_KPA;
  if (!heard && !(setup.supply && known)) return undefined;
  const need = setup.tire.targetKpa - setup.tire.toleranceKpa - REACH_MARGIN_KPA;
  if (facts.readings.some((r) => r.kpa > need + DENIES_KPA)) return undefined;
  const never = chance(e, (i) => e.members.cutOutKpa[i]! < need);
  if (never < (heard ? REACH_SURE : REACH_SURE_UNHEARD)) return undefined;
  return { call: 'cannot-reach', reason: 'governor-too-low', reachKpa: belief.cutOut };
}

/** The longer it takes, the less sure one must be: a compressor that cycles under the pedal. */
function loadedEnough({ facts, at }: Situation): number {
  const told = facts.cutIns.some((cutIn) => cutIn > facts.loweringSince);
  const seconds = at - facts.loweringSince;
  if (told || seconds > 45) return 0.3;
  return seconds > 22 ? 0.5 : LOADED_LIKELY;
}

function whileLowering(s: Situation): Decision {
  const { facts, belief, e } = s;
  const by = facts.lowering;
  const stop = (reason: Decision['reason']): Decision => ({ call: 'stop-lowering', reason, by });
  if (facts.lowAir) return stop('supply-too-low');
  if (belief.loaded >= loadedEnough(s)) return stop('cut-in-likely');
  if (belief.supply.p50 <= lowestSupply(s)) return stop('low-enough');
  const ahead = rollOut(sampleFor(e), 'go-on-lowering', planGoal(s), e.controls.atmosphereKpa);
  return {
    call: 'lower-supply',
    reason: 'lower-to-cut-in',
    by,
    changeIn: evenSpread(ahead.change),
  };
}

interface Weighed {
  call: 'chuck-on' | 'wait' | 'lower-supply';
  cost: number;
  decision: Decision;
}

/** Runs the ensemble ahead under each plan that is open, and takes the one that is done soonest. */
function choosePlan(s: Situation, first: Goal): Decision {
  const { facts, e } = s;
  const atmosphere = e.controls.atmosphereKpa;
  const sample = sampleFor(e);
  const put = rollOutBest(sample, 'on-now', first, atmosphere);
  const now = put.outcome;
  const goal = put.goal;
  const wait = rollOut(sample, 'wait', goal, atmosphere);
  const waitIn = evenSpread(wait.change);
  const waits: Decision = { call: 'wait', reason: waitReason(s), changeIn: waitIn };
  const puts: Decision = {
    call: 'chuck-on',
    reason: 'supply-above-tire',
    changeIn: evenSpread(now.change),
  };
  const atOnce = waitIn.p50 <= 0.5 * goal.hands.putOn;
  const short = goal.enoughAbs - atmosphere - s.belief.tire.p50;
  const worthIt = atOnce || meanOf(now.gained) > Math.min(LEAST_HOLD_KPA, 0.5 * short);
  const flows = meanOf(now.flowed) >= FLOWS_LIKELY;
  const plans: Weighed[] = [{ call: 'wait', cost: costOf(wait) + 1, decision: waits }];
  if (flows && worthIt) {
    const cost = Math.min(costOf(now), atOnce ? costOf(wait) : costOf(now));
    plans.push({ call: 'chuck-on', cost, decision: puts });
  }
  if (mayLower(s, goal)) {
    const lower = rollOut(sample, 'lower', goal, atmosphere);
    plans.push({
      call: 'lower-supply',
      cost: costOf(lower) + 2,
      decision: { call: 'lower-supply', reason: 'lower-to-cut-in', by: goal.by },
    });
  }
  const best = soonest(s, plans);
  if (best.call === 'chuck-on' && facts.atSeat && !facts.helper) {
    return { ...waits, reason: 'not-at-the-wheel' };
  }
  return best.decision;
}

function soonest(s: Situation, plans: Weighed[]): Weighed {
  const cost = (plan: Weighed) => plan.cost - (plan.call === s.facts.shown ? STANDS_S : 0);
  return plans.reduce((best, plan) => (cost(plan) < cost(best) ? plan : best));
}

/** Never while the compressor may be loaded, nor below cut-in less 3 psi, nor under 80 psi. */
function mayLower(s: Situation, goal: Goal): boolean {
  if (!goal.by || s.belief.loaded >= LOADED_LITTLE) return false;
  return s.belief.supply.p50 > goal.lowestAbs - s.e.controls.atmosphereKpa;
}

function waitReason(s: Situation): Decision['reason'] {
  if (s.belief.flowsIn > 0.5) return 'supply-about-to-fall';
  return s.belief.loaded > 0.5 ? 'supply-below-tire' : 'wait-for-cut-in';
}
