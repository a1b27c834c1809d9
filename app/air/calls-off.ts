/** The chuck is off and the tire needs air: gauge, wait, bring the supply down, or put it on. */
import type { Decision, Situation } from './advise';
import { chance } from './belief';
import { lastTouched } from './facts';
import { costOf, type Goal, rollOut, sampleFor } from './forecast';
import { lowestSupply, planGoal } from './plan';
import { evenSpread } from './spread';

/** Lowering is asked for only while the compressor is hardly loaded. */
const LOADED_LITTLE = 0.25;
const LOADED_LIKELY = 0.55;

export function callWhileOff(s: Situation): Decision {
  const { facts, belief, setup } = s;
  if (facts.lowering) return whileLowering(s);
  if (needsGauge(s)) return { call: 'gauge-tire', reason: 'prove-it' };
  const reach = cannotReach(s);
  if (reach) return reach;
  if (facts.readings.length === 0 && !setup.supply) {
    return { call: 'read-supply', reason: 'supply-unknown' };
  }
  if (facts.speed === 'off' && belief.flowsIn < 0.5) return { call: 'wait', reason: 'engine-off' };
  if (
    belief.supply.p90 - belief.supply.p10 > 70 &&
    belief.flowsIn < 0.95 &&
    belief.flowsIn > 0.05
  ) {
    return { call: 'read-supply', reason: 'supply-unsure' };
  }
  return choosePlan(s, planGoal(s));
}

/** Gauge when the tire may be there already, or is known too badly to time the next hold. */
function needsGauge(s: Situation): boolean {
  const { facts, belief, setup } = s;
  const last = facts.gauged[facts.gauged.length - 1];
  if (lastTouched(facts) < 0 || (last && last.at >= lastTouched(facts))) return false;
  const { targetKpa, toleranceKpa } = setup.tire;
  if (belief.tire.p90 >= targetKpa - toleranceKpa) return true;
  return belief.tire.p90 - belief.tire.p10 > toleranceKpa;
}

function cannotReach(s: Situation): Decision | undefined {
  const { e, belief, setup, facts } = s;
  if (facts.cutOuts.length === 0 && !setup.profile && !setup.supply) return undefined;
  const need = setup.tire.targetKpa - setup.tire.toleranceKpa;
  const never = chance(e, (i) => e.members.cutOutKpa[i]! < need);
  if (never < 0.93) return undefined;
  return { call: 'cannot-reach', reason: 'governor-too-low', reachKpa: belief.cutOut };
}

function whileLowering(s: Situation): Decision {
  const { facts, belief } = s;
  const stop = (reason: Decision['reason']): Decision => ({
    call: 'stop-lowering',
    reason,
    by: facts.lowering,
  });
  if (facts.lowAir) return stop('supply-too-low');
  if (belief.loaded >= LOADED_LIKELY) return stop('cut-in-likely');
  if (belief.supply.p50 <= lowestSupply(s)) return stop('low-enough');
  const outcome = rollOut(
    sampleFor(s.e),
    'lower',
    { ...planGoal(s), hands: { ...planGoal(s).hands, toLowering: 0 } },
    s.e.controls.atmosphereKpa,
  );
  return {
    call: 'lower-supply',
    reason: 'lower-to-cut-in',
    by: facts.lowering,
    changeIn: evenSpread(outcome.change),
  };
}

function choosePlan(s: Situation, goal: Goal): Decision {
  const { belief, facts } = s;
  const atmosphere = s.e.controls.atmosphereKpa;
  const sample = sampleFor(s.e);
  const wait = rollOut(sample, 'wait', goal, atmosphere);
  const now = rollOut(sample, 'on-now', goal, atmosphere);
  const mayLower =
    goal.by !== undefined &&
    belief.loaded < LOADED_LITTLE &&
    belief.supply.p50 > goal.lowestAbs - atmosphere;
  const lower = mayLower ? rollOut(sample, 'lower', goal, atmosphere) : undefined;
  const costWait = costOf(wait);
  const costNow = costOf(now);
  const costLower = lower ? costOf(lower) : Number.POSITIVE_INFINITY;
  if (facts.atSeat && !facts.helper && costNow <= costWait + 1)
    return { call: 'wait', reason: 'not-at-the-wheel' };
  const waitIn = evenSpread(wait.change);
  if ((costNow <= costWait + 1 || waitIn.p50 <= goal.hands.putOn * 0.5) && costNow <= costLower) {
    return { call: 'chuck-on', reason: 'supply-above-tire', changeIn: evenSpread(now.change) };
  }
  if (lower && costLower < costWait - 3) {
    return { call: 'lower-supply', reason: 'lower-to-cut-in', by: goal.by };
  }
  const reason =
    belief.flowsIn > 0.5
      ? 'supply-about-to-fall'
      : belief.loaded > 0.5
        ? 'supply-below-tire'
        : 'wait-for-cut-in';
  return { call: 'wait', reason, changeIn: evenSpread(wait.change) };
}
