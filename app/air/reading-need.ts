/** When the next reading of the supply is wanted. */
import type { Decision, Situation } from './advise';

/** A reading is wanted when the supply is believed within no less than this, kPa (p90 − p10). */
const WIDE_KPA = 32;
/** Readings closer together than this teach little. */
const LEAST_GAP_S = 12;
const USUAL_GAP_S = 40;

/** @returns seconds from `at`; 0 or less: now; undefined: none wanted */
export function readIn(s: Situation, decision: Decision): number | undefined {
  if (decision.call === 'done' || decision.call === 'cannot-reach') return undefined;
  if (decision.call === 'bleed' || decision.call === 'gauge-tire') return undefined;
  const last = s.facts.readings[s.facts.readings.length - 1];
  if (!last) return 0;
  const since = s.at - last.at;
  const wide = s.belief.supply.p90 - s.belief.supply.p10 > WIDE_KPA;
  return Math.round(((wide ? LEAST_GAP_S : USUAL_GAP_S) - since) * 1000) / 1000;
}
