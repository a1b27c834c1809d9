/** From belief and facts to one call. The order of the questions is the order of what matters. */
import { type Belief, believe } from './belief';
import { cabCall } from './calls-cab';
import { callWhileOff } from './calls-off';
import { callWhileOn } from './calls-on';
import { callAfterProof, callWhileBleeding } from './calls-proof';
import type { Advice, FillEvent, FillSetup } from './contract';
import type { Ensemble } from './ensemble';
import { type Facts, proof, readFacts } from './facts';
import { readIn } from './reading-need';

/** What every call is decided from. */
export interface Situation {
  e: Ensemble;
  setup: FillSetup;
  facts: Facts;
  belief: Belief;
  at: number;
}

/** A call with what belongs to it alone. */
export type Decision = Pick<Advice, 'call' | 'reason'> &
  Partial<Pick<Advice, 'by' | 'changeIn' | 'reachKpa' | 'offBy' | 'readIn' | 'cab'>>;

export function adviseAt(
  e: Ensemble,
  events: readonly FillEvent[],
  setup: FillSetup,
  at: number,
): Advice {
  const facts = readFacts(events, setup);
  const belief = believe(e);
  const situation: Situation = { e, setup, facts, belief, at };
  const decision = decide(situation);
  return {
    cab: cabCall(situation, decision),
    readIn: readIn(situation, decision),
    supplyKpa: belief.supply,
    tireKpa: belief.tire,
    loaded: belief.loaded,
    flowsIn: belief.flowsIn,
    cutInKpa: belief.cutIn,
    cutOutKpa: belief.cutOut,
    ...decision,
  };
}

function decide(s: Situation): Decision {
  if (s.facts.bleeding) return callWhileBleeding(s);
  if (s.facts.chuckOn) return callWhileOn(s);
  const proven = proof(s.facts, s.setup);
  const settled = proven && callAfterProof(s, proven);
  return settled ?? callWhileOff(s);
}
