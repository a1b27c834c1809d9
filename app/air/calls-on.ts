/** The chuck is on: keep it, or take it off. */

import type { Decision, Situation } from './advise';
import { chance } from './belief';
import { sourceAbs } from './coach';
import { costOf, rollOut, sampleFor } from './forecast';
import { planGoal } from './plan';
import { evenSpread } from './spread';

/** Chance of ending over the tolerance that is accepted while the hold goes on. */
const OVER_ACCEPTED = 0.06;
const OVER_LIMIT_ACCEPTED = 0.08;

export function callWhileOn(s: Situation): Decision {
  const { e, setup, facts } = s;
  const m = e.members;
  const { targetKpa, toleranceKpa, limitKpa } = setup.tire;
  const goal = planGoal(s);
  const react = goal.hands.takeOff;
  const atmosphere = e.controls.atmosphereKpa;
  if (facts.lowAir) return { call: 'chuck-off', reason: 'supply-at-tire' };
  const then = (i: number) =>
    m.tireAbs[i]! + (Math.max(0, m.flow[i]!) / m.tireL[i]!) * react - atmosphere;
  if (limitKpa !== undefined && chance(e, (i) => then(i) > limitKpa) > OVER_LIMIT_ACCEPTED) {
    return { call: 'chuck-off', reason: 'near-limit' };
  }
  const reached = chance(e, (i) => then(i) >= targetKpa - 0.25 * toleranceKpa);
  if (reached >= 0.5) return { call: 'chuck-off', reason: 'target-reached' };
  const over = chance(e, (i) => then(i) > targetKpa + 0.9 * toleranceKpa);
  if (over > OVER_ACCEPTED) return { call: 'chuck-off', reason: 'gauge-to-be-sure' };
  const below = chance(
    e,
    (i) => sourceAbs(m, i) < m.tireAbs[i]! + m.warmth[i]! && m.loaded[i] === 0,
  );
  if (below > 0.3) return { call: 'chuck-off', reason: 'supply-at-tire' };
  return keepOrCycle(s, goal);
}

function keepOrCycle(s: Situation, goal: ReturnType<typeof planGoal>): Decision {
  const atmosphere = s.e.controls.atmosphereKpa;
  const sample = sampleFor(s.e);
  const keep = rollOut(sample, 'keep-on', goal, atmosphere);
  const changeIn = evenSpread(keep.change);
  if (s.belief.loaded < 0.4) {
    const off = rollOut(sample, 'off-now', goal, atmosphere);
    if (costOf(off) < costOf(keep) - 2) return { call: 'chuck-off', reason: 'cycle-again' };
  }
  const offBy = Math.round((s.at + Math.max(3, changeIn.p90)) * 10) / 10;
  return { call: 'keep-on', reason: 'air-goes-in', changeIn, offBy };
}
