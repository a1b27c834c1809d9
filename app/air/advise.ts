/** From belief and facts to one call. The order of the questions is the order of what matters. */
import { believe } from './belief';
import { cabCall } from './calls-cab';
import { callWhileOff } from './calls-off';
import { callWhileOn } from './calls-on';
import { callAfterProof, callWhileBleeding } from './calls-proof';
import { checkNow } from './checks';
import type { Advice, FillEvent, FillSetup, Spread } from './contract';
import type { Ensemble } from './ensemble';
import { proof, readFacts } from './facts';
import { readIn } from './reading-need';
import type { Decision, Situation } from './situation';

export function adviseAt(
  e: Ensemble,
  events: readonly FillEvent[],
  setup: FillSetup,
  at: number,
  startCutIn: Spread,
): Advice {
  const facts = readFacts(events, setup);
  const belief = believe(e);
  const situation: Situation = { e, setup, facts, belief, startCutIn, at };
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
  const check = checkNow(s);
  if (check) return check;
  if (s.facts.bleeding) return callWhileBleeding(s);
  if (s.facts.chuckOn) return callWhileOn(s);
  const proven = proof(s.facts, s.setup);
  const settled = proven && callAfterProof(s, proven);
  return settled ?? callWhileOff(s);
}
