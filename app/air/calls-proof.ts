/** Gauged: done, over, or more air. */
import type { Decision, Situation } from './situation';

/** Readings are rounded; a hair over the tolerance is within it. */
const HAIR_KPA = 0.05;
/** Most time that is spent on letting a warm tire settle, s. */
const SETTLE_S = 20;

/** @returns undefined where the tire needs air */
export function callAfterProof(
  s: Situation,
  proven: { at: number; kpa: number },
): Decision | undefined {
  const { targetKpa, toleranceKpa, warm } = s.setup.tire;
  const over = proven.kpa - targetKpa;
  const atStart = s.facts.gauged.length === 0;
  const settledOver = s.belief.tire.p50 - targetKpa;
  if (Math.abs(over) <= toleranceKpa + HAIR_KPA) {
    if (atStart || settledOver > -toleranceKpa * 1.3) {
      return { call: 'done', reason: 'in-tolerance' };
    }
    return undefined;
  }
  if (over < 0) return undefined;
  if (warm) return { call: 'done', reason: 'warm-over-target' };
  if (settledOver > 0.8 * toleranceKpa || atStart) return { call: 'bleed', reason: 'over-target' };
  const waited = s.at - proven.at;
  if (waited < SETTLE_S)
    return { call: 'wait', reason: 'let-it-settle', changeIn: fixed(SETTLE_S - waited) };
  return { call: 'gauge-tire', reason: 'prove-it' };
}

export function callWhileBleeding(s: Situation): Decision {
  const { targetKpa, toleranceKpa } = s.setup.tire;
  if (s.belief.tire.p50 <= targetKpa + 0.3 * toleranceKpa) {
    return { call: 'gauge-tire', reason: 'prove-it' };
  }
  return { call: 'bleed', reason: 'over-target' };
}

export function fixed(seconds: number): { p10: number; p50: number; p90: number } {
  const value = Math.max(0, Math.round(seconds * 1000) / 1000);
  return { p10: value, p50: value, p90: value };
}
