/** The goal that rollouts are run for: where to stop, how to lower, what hands need. */

import type { LowerBy } from './contract';
import type { Goal, Hands } from './forecast';
import { KPA_PER_PSI } from './priors';
import type { Situation } from './situation';

/** Usual hands until this person's are known, s. */
const PUT_ON_S = 3;
const TAKE_OFF_S = 2;
const GAUGE_S = 8;
const WALK_S = 8;
/** Never lower under 80 psi, nor 3 psi below the believed cut-in. */
const LOWEST_KPA = 80 * KPA_PER_PSI;
const BELOW_CUT_IN_KPA = 3 * KPA_PER_PSI;

/** Seconds from the call to the chuck being off: usual at first, then this person's own. */
export function reactionOf(reactions: readonly number[]): number {
  let sum = 2 * TAKE_OFF_S;
  for (const seconds of reactions) sum += Math.max(0.5, seconds - 0.5);
  return sum / (reactions.length + 2);
}

/** Alone the drain is preferred: the pedal means two walks. With a helper the pedal is at hand. */
export function wayToLower(s: Situation): LowerBy | undefined {
  const allowed = s.setup.lowerBy ?? [];
  if (s.facts.lowAir || allowed.length === 0) return undefined;
  const first: LowerBy = s.facts.helper ? 'pedal' : 'drain';
  return allowed.includes(first) ? first : allowed[0];
}

export function lowestSupply(s: Situation): number {
  return Math.max(LOWEST_KPA, s.belief.cutIn.p10 - BELOW_CUT_IN_KPA);
}

function handsOf(s: Situation, by: LowerBy | undefined): Hands {
  const walk = by === 'pedal' && !s.facts.helper ? (s.setup.crew?.walkSeconds ?? WALK_S) : 0;
  return {
    putOn: PUT_ON_S,
    takeOff: reactionOf(s.facts.reactions),
    gauge: GAUGE_S,
    toLowering: 3 + walk,
    fromLowering: 2 + walk,
  };
}

export function planGoal(s: Situation): Goal {
  const { targetKpa, toleranceKpa, limitKpa } = s.setup.tire;
  const atmosphere = s.e.controls.atmosphereKpa;
  const by = wayToLower(s);
  return {
    aimAbs: targetKpa - 0.2 * toleranceKpa + atmosphere,
    enoughAbs: targetKpa - 0.8 * toleranceKpa + atmosphere,
    limitAbs: (limitKpa ?? 2000) + atmosphere,
    by,
    lowestAbs: lowestSupply(s) + atmosphere,
    leastGain: by ? 0.2 : 0.03,
    hands: handsOf(s, by),
  };
}
