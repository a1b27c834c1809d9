import type { Advice, LowerBy } from '~/air';
import type { NewFillEvent } from './live-driver';
import type { LogFacts } from './log-facts';

/** A key that answers the present call. */
export interface Answer {
  label: string;
  /** What the key records; or what it does on this screen. */
  does: { event: NewFillEvent } | { step: 'end' | 'accept-pedal' };
  /** Filled blue, filled ink, or plain: filled when this is the thing to do now. */
  fill: 'in' | 'ink' | 'plain';
}

export interface AnswerFrame {
  valve: boolean;
  by: LowerBy | undefined;
  /** The pedal's safety words are to be read before the call is shown. */
  mustReadPedal: boolean;
}

const chuck = (on: boolean): Answer['does'] => ({ event: { type: 'chuck', on } });

/** The full-width keys below the gauge row: one, or two where a question has two answers. */
export function answersOf(advice: Advice, facts: LogFacts, frame: AnswerFrame): Answer[] {
  if (frame.mustReadPedal) {
    return [{ label: 'I have read this', does: { step: 'accept-pedal' }, fill: 'ink' }];
  }
  const words = frame.valve
    ? { on: 'It’s open', off: 'It’s closed' }
    : { on: 'It’s on', off: 'It’s off' };
  if (facts.chuckOn && ['done', 'cannot-reach'].includes(advice.call)) {
    return [{ label: words.off, does: chuck(false), fill: 'ink' }];
  }
  switch (advice.call) {
    case 'chuck-on':
      return [{ label: words.on, does: chuck(true), fill: 'in' }];
    case 'chuck-off':
      return [{ label: words.off, does: chuck(false), fill: 'ink' }];
    case 'lower-supply':
    case 'stop-lowering':
      return [loweringAnswer(advice.call === 'lower-supply', frame.by ?? 'pedal')];
    case 'done':
      return [{ label: 'Finish this tire', does: { step: 'end' }, fill: 'in' }];
    case 'cannot-reach':
      return [{ label: 'End this fill', does: { step: 'end' }, fill: 'ink' }];
    case 'check':
      if (advice.reason === 'chuck-still-on') {
        const still = frame.valve ? 'Still open' : 'Still on';
        return [
          { label: still, does: chuck(true), fill: 'plain' },
          { label: words.off, does: chuck(false), fill: 'plain' },
        ];
      }
  }
  const on = !facts.chuckOn;
  if (advice.reason === 'low-air' && !on) {
    return [{ label: words.off, does: chuck(false), fill: 'ink' }];
  }
  return [{ label: on ? words.on : words.off, does: chuck(on), fill: 'plain' }];
}

function loweringAnswer(on: boolean, by: LowerBy): Answer {
  const label =
    by === 'drain'
      ? on
        ? 'Drain is open'
        : 'Drain is closed'
      : on
        ? 'Pedal in use'
        : 'Pedal let go';
  return { label, does: { event: { type: 'lowering', by, on } }, fill: 'ink' };
}
