/** What the helper in the driver's seat should do, or the person alone while there. */

import type { CabCall } from './contract';
import type { Decision, Situation } from './situation';

/** Fast idle is asked back when it is less likely than this after the pedal. */
const FAST_IDLE_LIKELY = 0.85;

export function cabCall(s: Situation, decision: Decision): CabCall {
  const { facts, belief } = s;
  if (decision.call === 'done' || decision.call === 'cannot-reach') return 'nothing';
  // Whoever is free lowers, by pedal or by drain: both screens say so.
  if (decision.call === 'lower-supply' || decision.call === 'stop-lowering') return decision.call;
  if (facts.speed === 'off') return 'start-engine';
  if (facts.speed !== 'fast-idle') return 'set-fast-idle';
  if (!facts.lowering && facts.pedalSinceSpeed && belief.fastIdle < FAST_IDLE_LIKELY)
    return 'set-fast-idle';
  if (decision.call === 'read-supply' && !wheelGaugeReadsSupply(s)) return 'read-dash';
  return 'nothing';
}

/** Without a gauge on the hose, or with it below a closed valve, only the dash shows the supply. */
export function wheelGaugeReadsSupply(s: Situation): boolean {
  const gauge = s.setup.rig?.gauge ?? 'at-chuck';
  if (gauge === 'dash-only') return false;
  return gauge !== 'below-valve' || s.facts.chuckOn;
}
