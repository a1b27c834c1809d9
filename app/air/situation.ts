/** What a call is decided from, and what it comes to. */
import type { Belief } from './belief';
import type { Advice, FillSetup, Spread } from './contract';
import type { Ensemble } from './ensemble';
import type { Facts } from './facts';

/** What every call is decided from. */
export interface Situation {
  e: Ensemble;
  setup: FillSetup;
  facts: Facts;
  belief: Belief;
  /** The cut-in that was believed when the fill began. */
  startCutIn: Spread;
  at: number;
}

/** A call with what belongs to it alone. */
export type Decision = Pick<Advice, 'call' | 'reason'> &
  Partial<Pick<Advice, 'by' | 'changeIn' | 'reachKpa' | 'offBy' | 'readIn' | 'cab'>>;
