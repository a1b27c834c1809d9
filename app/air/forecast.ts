/**
 * Running members ahead under a plan, with the same step function as the filter. A plan is where
 * to begin; after that every member follows the cycle: on while it gains, off when it does not,
 * bring the supply down where the coach allows it, on again on the rising side.
 */

import { standardDraw } from './arithmetic';
import { type Controls, createMembers, type Members, PATH, sourceAbs, step } from './coach';
import type { LowerBy } from './contract';
import type { Ensemble } from './ensemble';
import { pickByWeight } from './renewal';

export const ROLLOUT_MEMBERS = 24;
/** Steps of a rollout: fine while the next call depends on it, coarser after. */
const FINE_STEP_S = 1;
const FINE_UNTIL_S = 24;
const COARSE_STEP_S = 2;
const COARSE_UNTIL_S = 90;
const COARSEST_STEP_S = 4;
export const HORIZON_S = 420;

export type Plan =
  | 'on-now'
  | 'wait'
  | 'lower'
  | 'go-on-lowering'
  | 'stop-lowering'
  | 'keep-on'
  | 'off-now';

/** What hands need, s. */
export interface Hands {
  putOn: number;
  takeOff: number;
  gauge: number;
  /** From the call to the first fall of pressure, and from the stop back to the wheel. */
  toLowering: number;
  fromLowering: number;
}

export interface Goal {
  /** Absolute kPa, settled: where to stop, and what is good enough. */
  aimAbs: number;
  enoughAbs: number;
  limitAbs: number;
  /** How the supply may be brought down; none: wait for it. */
  by: LowerBy | undefined;
  lowestAbs: number;
  /** Gain a second, kPa, under which a hold on a falling supply is given up. */
  leastGain: number;
  hands: Hands;
}

export interface Outcome {
  /** Per member: seconds until the call changes, until done (capped), kPa lost by reverse flow. */
  change: Float64Array;
  done: Float64Array;
  lost: Float64Array;
  /** 1 where the supply stood above the tire when the chuck first went on. */
  flowed: Float64Array;
  /** kPa gained by the end of the first hold. */
  gained: Float64Array;
}

/** The supply must stand this much above the tire before the chuck goes on, kPa. */
export const MARGIN_KPA = 1.5;
/** A tire that is still low at the end is charged this much time a kPa. */
const SECONDS_PER_KPA = 5;

const PHASE = {
  waiting: 0,
  puttingOn: 1,
  on: 2,
  takingOff: 3,
  goingToLower: 4,
  lowering: 5,
  comingBack: 6,
  gauging: 7,
} as const;
type Phase = (typeof PHASE)[keyof typeof PHASE];

const work = createMembers(ROLLOUT_MEMBERS);

/** An even sample of the ensemble for rollouts; all rollouts of one advice start from it. */
export function sampleFor(e: Ensemble): Members {
  const sample = createMembers(ROLLOUT_MEMBERS);
  pickByWeight(e.members, e.weights, sample, 0.5);
  for (let j = 0; j < sample.n; j++) {
    const shift = Math.sqrt(sample.doubt[j]!) * standardDraw(j);
    sample.supplyAbs[j] = sample.supplyAbs[j]! + shift;
    sample.serviceAbs[j] = sample.serviceAbs[j]! + shift;
    sample.accessoryAbs[j] = sample.accessoryAbs[j]! + shift;
  }
  return sample;
}

export function createOutcome(): Outcome {
  return {
    change: new Float64Array(ROLLOUT_MEMBERS),
    done: new Float64Array(ROLLOUT_MEMBERS),
    lost: new Float64Array(ROLLOUT_MEMBERS),
    flowed: new Float64Array(ROLLOUT_MEMBERS),
    gained: new Float64Array(ROLLOUT_MEMBERS),
  };
}

export function rollOut(sample: Members, plan: Plan, goal: Goal, atmosphereKpa: number): Outcome {
  work.all.set(sample.all);
  if (plan !== 'go-on-lowering') work.idleHands.fill(0);
  const outcome = createOutcome();
  const still: Controls = { pedal: false, drain: false, bleeding: false, atmosphereKpa };
  const lowering: Controls = { ...still, [goal.by ?? 'drain']: true };
  for (let i = 0; i < work.n; i++) runMember(i, plan, goal, still, lowering, outcome);
  return outcome;
}

function firstPhase(plan: Plan): Phase {
  if (plan === 'on-now') return PHASE.puttingOn;
  if (plan === 'keep-on') return PHASE.on;
  if (plan === 'off-now') return PHASE.takingOff;
  if (plan === 'lower') return PHASE.goingToLower;
  if (plan === 'go-on-lowering') return PHASE.lowering;
  return plan === 'stop-lowering' ? PHASE.comingBack : PHASE.waiting;
}

/** How long a phase lasts that only takes time; the others end by what the air does. */
function lasting(phase: Phase, hands: Hands): number {
  if (phase === PHASE.puttingOn) return hands.putOn;
  if (phase === PHASE.takingOff) return hands.takeOff;
  if (phase === PHASE.goingToLower) return hands.toLowering;
  if (phase === PHASE.comingBack) return hands.fromLowering;
  return phase === PHASE.gauging ? hands.gauge : -1;
}

function runMember(
  i: number,
  plan: Plan,
  goal: Goal,
  still: Controls,
  lowering: Controls,
  outcome: Outcome,
): void {
  const m = work;
  let phase: Phase = firstPhase(plan);
  const first = phase;
  let left = lasting(phase, goal.hands);
  let change = -1;
  let onAt = -1;
  const tireAtStart = m.tireAbs[i]!;
  let lost = 0;
  let t = 0;
  const openPath = m.path[i] === PATH.off ? PATH.seated : m.path[i]!;
  if (phase === PHASE.waiting || phase >= PHASE.goingToLower) m.path[i] = PATH.off;
  let h = FINE_STEP_S;
  for (; t < HORIZON_S; t += h) {
    h = t < FINE_UNTIL_S ? FINE_STEP_S : t < COARSE_UNTIL_S ? COARSE_STEP_S : COARSEST_STEP_S;
    // A hold that has just begun has no flow yet to judge it by.
    const next = t === 0 && phase === PHASE.on ? phase : nextPhase(m, i, phase, left, goal);
    if (next !== phase) {
      if (change < 0 && !(plan === 'on-now' && first === phase)) change = t;
      if (phase === PHASE.gauging && next === PHASE.on) break;
      if (phase === PHASE.on && outcome.gained[i] === 0) {
        outcome.gained[i] = m.tireAbs[i]! - tireAtStart;
      }
      phase = next;
      left = lasting(phase, goal.hands);
      if (phase === PHASE.on) {
        m.path[i] = openPath;
        if (onAt < 0) {
          onAt = t;
          outcome.flowed[i] = sourceAbs(m, i) > m.tireAbs[i]! + m.warmth[i]! ? 1 : 0;
        }
      }
      if (phase !== PHASE.on && phase !== PHASE.takingOff) m.path[i] = PATH.off;
    }
    step(m, i, i + 1, h, phase === PHASE.lowering ? lowering : still);
    if (m.flow[i]! < 0) lost -= (m.flow[i]! * h) / m.tireL[i]!;
    left -= h;
  }
  const short = Math.max(0, goal.enoughAbs - m.tireAbs[i]!);
  outcome.change[i] = change < 0 ? HORIZON_S : change;
  outcome.done[i] = t >= HORIZON_S ? HORIZON_S + short * SECONDS_PER_KPA : t;
  outcome.lost[i] = lost;
}

function nextPhase(m: Members, i: number, phase: Phase, left: number, goal: Goal): Phase {
  const tire = m.tireAbs[i]!;
  switch (phase) {
    case PHASE.waiting:
      if (tire >= goal.enoughAbs) return PHASE.gauging;
      return m.loaded[i] === 1 && sourceAbs(m, i) > tire + MARGIN_KPA ? PHASE.puttingOn : phase;
    case PHASE.puttingOn:
      return left <= 0 ? PHASE.on : phase;
    case PHASE.on:
      return endsHold(m, i, goal) ? PHASE.takingOff : phase;
    case PHASE.takingOff:
      if (left > 0) return phase;
      if (tire >= goal.enoughAbs) return PHASE.gauging;
      return goal.by && m.loaded[i] === 0 ? PHASE.goingToLower : PHASE.waiting;
    case PHASE.goingToLower:
      return left <= 0 ? PHASE.lowering : phase;
    case PHASE.lowering:
      return m.loaded[i] === 1 || m.supplyAbs[i]! < goal.lowestAbs ? PHASE.comingBack : phase;
    case PHASE.comingBack:
      return left <= 0 ? PHASE.waiting : phase;
    case PHASE.gauging:
      return left <= 0 ? PHASE.on : phase;
  }
}

function endsHold(m: Members, i: number, goal: Goal): boolean {
  const gain = m.flow[i]! / m.tireL[i]!;
  if (m.tireAbs[i]! + gain * goal.hands.takeOff >= goal.aimAbs) return true;
  if (sourceAbs(m, i) < m.tireAbs[i]! + m.warmth[i]! && m.loaded[i] === 0) return true;
  return m.loaded[i] === 0 && m.sinceSwitch[i]! > 1 && gain < goal.leastGain;
}

/** Mean time to done, with lost air charged. */
export function costOf(outcome: Outcome): number {
  let sum = 0;
  for (let i = 0; i < ROLLOUT_MEMBERS; i++) sum += outcome.done[i]! + 25 * outcome.lost[i]!;
  return sum / ROLLOUT_MEMBERS;
}

/** Gains under which a hold may be given up, kPa a second: cycle early, or stay to the last. */
const LEAST_GAINS = [0.2, 0.05];

/** The same plan, holding on for longer or shorter: the better of both, and the goal for it. */
export function rollOutBest(
  sample: Members,
  plan: Plan,
  goal: Goal,
  atmosphereKpa: number,
): { outcome: Outcome; goal: Goal } {
  let best = { outcome: rollOut(sample, plan, goal, atmosphereKpa), goal };
  if (!goal.by) return best;
  for (const leastGain of LEAST_GAINS) {
    if (leastGain === goal.leastGain) continue;
    const other = { ...goal, leastGain };
    const outcome = rollOut(sample, plan, other, atmosphereKpa);
    if (costOf(outcome) < costOf(best.outcome)) best = { outcome, goal: other };
  }
  return best;
}

export function meanOf(values: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < values.length; i++) sum += values[i]!;
  return sum / values.length;
}
