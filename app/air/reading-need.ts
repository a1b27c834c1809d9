/** When the next reading of the supply is wanted: only where it may change a call. */
import type { Decision, Situation } from './situation';

/** Readings closer together than this teach little, s. */
const LEAST_GAP_S = 14;
/** One comes about once a minute unasked; somewhat later it is asked for, s. */
const USUAL_GAP_S = 75;
/** A supply known to within this is known well enough for any call, kPa (p90 − p10). */
const NARROW_KPA = 14;
/** With the chuck on the gain follows the supply: known no better than this it is read, kPa. */
const BLIND_KPA = 60;
const UNSEEN_GAP_S = 22;
/** After lowering ends, a loaded compressor shows on the gauge within this, s. */
const LOADING_SHOWS_S = 9;
/** A call that may change so soon is worth a reading, s. */
const SOON_S = 8;
/** After the chuck goes on the gauge settles; its drop tells how fast the air goes, s. */
const DROP_SHOWS_S = 6;

/** @returns seconds from `at`; 0 or less: now; undefined: none wanted */
export function readIn(s: Situation, decision: Decision): number | undefined {
  const { call } = decision;
  if (call === 'done' || call === 'cannot-reach' || call === 'bleed') return undefined;
  if (call === 'gauge-tire' || call === 'chuck-off') return undefined;
  const last = s.facts.readings[s.facts.readings.length - 1];
  if (!last) return 0;
  const soon = call === 'wait' && decision.changeIn !== undefined && decision.changeIn.p10 < SOON_S;
  if (call === 'wait' && afterLowering(s)) {
    return Math.round((s.facts.loweringEnded + LOADING_SHOWS_S - s.at) * 1000) / 1000;
  }
  const wide = s.belief.supply.p90 - s.belief.supply.p10 > NARROW_KPA;
  const unseen = s.facts.chuckOn && (mayLoadUnseen(s) || isBlind(s));
  const gap = unseen ? UNSEEN_GAP_S : matters(s) || (soon && wide) ? LEAST_GAP_S : USUAL_GAP_S;
  const regular = last.at + gap - s.at;
  return Math.round(Math.min(regular, dropReading(s, last.at)) * 1000) / 1000;
}

/** Whether the compressor loaded is not known yet: its rise, or no rise, will show. */
function afterLowering(s: Situation): boolean {
  const { facts, belief, at } = s;
  const last = facts.readings[facts.readings.length - 1];
  const shown = last !== undefined && last.at > facts.loweringEnded + LOADING_SHOWS_S / 2;
  const open = belief.loaded > 0.05 && belief.loaded < 0.95;
  return !shown && open && at - facts.loweringEnded < 60;
}

/** Unloaded and near cut-in: whether it loads decides how much goes in. */
function mayLoadUnseen({ belief }: Situation): boolean {
  return belief.loaded < 0.9 && belief.supply.p10 < belief.cutIn.p90;
}

function isBlind({ belief }: Situation): boolean {
  return belief.supply.p90 - belief.supply.p10 > BLIND_KPA;
}

/** Whether the supply may be on either side of the tire, as far as is known. */
function matters(s: Situation): boolean {
  const { supply, tire, flowsIn } = s.belief;
  if (supply.p90 - supply.p10 < NARROW_KPA) return false;
  if (s.facts.lowering) return supply.p90 - supply.p10 > 2 * NARROW_KPA;
  const near = supply.p10 < tire.p50 + NARROW_KPA && supply.p90 > tire.p50 - NARROW_KPA;
  return near && flowsIn > 0.08 && (flowsIn < 0.92 || s.facts.chuckOn);
}

/** The first reading with air moving tells the conductance, where it is not known yet. */
function dropReading(s: Situation, lastAt: number): number {
  const hold = s.facts.holds[s.facts.holds.length - 1];
  if (!hold || hold.off !== undefined || lastAt > hold.on) return Number.POSITIVE_INFINITY;
  const { gain } = s.belief;
  if (gain.p90 < 2 * gain.p10) return Number.POSITIVE_INFINITY;
  return hold.on + DROP_SHOWS_S - s.at;
}
