/** The chuck is on: keep it, or take it off. */

import { chance } from './belief';
import { costOf, type Goal, rollOut, rollOutBest, sampleFor } from './forecast';
import { planGoal } from './plan';
import type { Decision, Situation } from './situation';
import { evenSpread } from './spread';

/** Chance of ending over the tolerance, and over the limit, at which a hold is ended. */
const OVER_ACCEPTED = 0.06;
const OVER_LIMIT_ACCEPTED = 0.08;
/** Chance of air going out at which a hold on a falling supply is ended. */
const OUTFLOW_ACCEPTED = 0.2;
/** A call to take it off stands for this long once it was shown, s. */
const STICKS_S = 12;

export function callWhileOn(s: Situation): Decision {
  const { e, setup, facts } = s;
  const { targetKpa, toleranceKpa, limitKpa } = setup.tire;
  const goal = planGoal(s);
  const then = (i: number) => gaugeAfter(s, i, goal.hands.takeOff);
  const off = (reason: Decision['reason']): Decision => ({ call: 'chuck-off', reason });
  if (facts.lowAir) return off('supply-at-tire');
  if (limitKpa !== undefined && chance(e, (i) => then(i) > limitKpa) > OVER_LIMIT_ACCEPTED) {
    return off('near-limit');
  }
  const reached = chance(e, (i) => then(i) >= targetKpa - 0.25 * toleranceKpa);
  if (reached >= 0.5) return off('target-reached');
  const over = chance(e, (i) => then(i) > targetKpa + 0.9 * toleranceKpa);
  if (over > OVER_ACCEPTED) return off('gauge-to-be-sure');
  const out = chance(e, (i) => e.members.flow[i]! < 0 && e.members.loaded[i] === 0);
  if (out > OUTFLOW_ACCEPTED) return off('supply-at-tire');
  return keepOrCycle(s, goal);
}

/** Settled gauge pressure of a member's tire when hands have taken the chuck off. */
function gaugeAfter(s: Situation, i: number, seconds: number): number {
  const m = s.e.members;
  const gain = Math.max(0, m.flow[i]!) / m.tireL[i]!;
  return m.tireAbs[i]! + gain * seconds - s.e.controls.atmosphereKpa;
}

function keepOrCycle(s: Situation, goal: Goal): Decision {
  const atmosphere = s.e.controls.atmosphereKpa;
  const sample = sampleFor(s.e);
  const kept = rollOutBest(sample, 'keep-on', goal, atmosphere);
  const keep = kept.outcome;
  const changeIn = evenSpread(keep.change);
  const saidOff = s.facts.shown === 'chuck-off' && s.at - s.facts.shownAt < STICKS_S;
  if (saidOff && changeIn.p50 < 25) return { call: 'chuck-off', reason: 'cycle-again' };
  if (changeIn.p50 <= 1) return { call: 'chuck-off', reason: 'supply-at-tire' };
  if (s.belief.loaded < 0.4) {
    const off = rollOut(sample, 'off-now', kept.goal, atmosphere);
    // It stays on while it gains faster than the cycles that would follow.
    const remaining = goal.aimAbs - atmosphere - s.belief.tire.p50;
    const slow = s.belief.gain.p50 * costOf(off) < remaining;
    if (slow && costOf(off) < costOf(keep) - 2) return { call: 'chuck-off', reason: 'cycle-again' };
  }
  const offBy = Math.round((s.at + Math.max(3, changeIn.p90)) * 10) / 10;
  return { call: 'keep-on', reason: 'air-goes-in', changeIn, offBy };
}
