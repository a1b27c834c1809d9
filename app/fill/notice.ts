import type { Advice, FillSetup } from '~/air';
import type { NewFillEvent } from './live-driver';
import type { LogFacts } from './log-facts';

/** One line above the gauge row: a task in the cab, or the caution that applies now. */
export interface Notice {
  text: string;
  /** A line for newcomers and no caution. */
  isHint?: boolean;
  /** A key that says it is done. */
  done?: { label: string; event: NewFillEvent } | { label: string; opens: 'dash-gauge' };
}

/** What stands in the line now; a task comes before a caution. */
export function noticeOf(advice: Advice, facts: LogFacts, setup: FillSetup): Notice | undefined {
  return cabTask(advice, facts) ?? caution(advice, facts, setup);
}

function cabTask({ cab, call }: Advice, facts: LogFacts): Notice | undefined {
  // The chuck comes first: nobody walks to the seat while it should go on or come off.
  if (call === 'chuck-on' || call === 'chuck-off') return undefined;
  const who = facts.helper ? 'Helper: ' : '';
  const say = (text: string) => who + (who ? text : text.charAt(0).toUpperCase() + text.slice(1));
  switch (cab) {
    case 'start-engine':
      return {
        text: say('start the engine.'),
        done: { label: 'It runs', event: { type: 'engine', speed: 'idle' } },
      };
    case 'set-fast-idle':
      return {
        text: say('set fast idle.'),
        done: { label: 'Fast idle set', event: { type: 'engine', speed: 'fast-idle' } },
      };
    case 'read-dash':
      return {
        text: say('read the dash gauge.'),
        done: { label: 'Dash value', opens: 'dash-gauge' },
      };
    default:
      return undefined;
  }
}

function caution(advice: Advice, facts: LogFacts, { rig, tire }: FillSetup): Notice | undefined {
  if (facts.lowering === 'pedal') {
    return { text: 'Hands out of wheels and linkage while somebody pumps.' };
  }
  if (facts.chuckOn) {
    const on = rig?.valve ? 'the valve is open' : 'the chuck is on';
    return { text: `Never leave this tire while ${on}.` };
  }
  if (!facts.everOn && ['wait', 'chuck-on', 'lower-supply'].includes(advice.call)) {
    return { text: 'Stand to the side, never before the sidewall.' };
  }
  if (tire.warm && advice.call === 'gauge-tire') {
    return { text: 'A warm tire reads high. Check it again cold.' };
  }
  return undefined;
}
