import type { Advice, Call, LowerBy } from '~/air';
import { reasonWords } from './reason-words';

/** Where the chuck belongs, and so whether the panel is filled or framed. */
export type Side = 'on' | 'off' | 'unknown';

interface CallLook {
  /** `as-is`: wherever the chuck is now, it belongs there. */
  side: Side | 'as-is';
  /** The chuck is not yet where it belongs: the call takes the vessel's space. */
  act: boolean;
}

/** How each call looks: filled or framed, large or small. */
export const callLooks: Record<Call, CallLook> = {
  'read-supply': { side: 'unknown', act: false },
  wait: { side: 'off', act: false },
  'lower-supply': { side: 'off', act: false },
  'stop-lowering': { side: 'off', act: false },
  'chuck-on': { side: 'on', act: true },
  'keep-on': { side: 'on', act: false },
  'chuck-off': { side: 'off', act: true },
  'gauge-tire': { side: 'off', act: false },
  bleed: { side: 'off', act: false },
  check: { side: 'as-is', act: false },
  done: { side: 'off', act: false },
  'cannot-reach': { side: 'off', act: false },
};

type SayHow = { valve: boolean; helper: boolean; by: LowerBy | undefined };

/** The call in one to three words, imperative. */
export function titleOf(advice: Advice, { valve, helper, by }: SayHow): string {
  switch (advice.call) {
    case 'read-supply':
      return 'Read gauge';
    case 'wait':
      return 'Wait';
    case 'lower-supply':
      if (by === 'drain') return 'Open the drain';
      return helper ? 'Call for pedal' : 'Press the pedal';
    case 'stop-lowering':
      if (by === 'drain') return 'Close the drain';
      return helper ? 'Call stop' : 'Leave the pedal';
    case 'chuck-on':
      return valve ? 'Open it' : 'Put it on';
    case 'keep-on':
      return valve ? 'Keep it open' : 'Keep it on';
    case 'chuck-off':
      return valve ? 'Close it' : 'Take it off';
    case 'gauge-tire':
      return 'Gauge it';
    case 'bleed':
      return 'Bleed it';
    case 'check':
      return reasonWords[advice.reason].title ?? 'Check';
    case 'done':
      return 'Done';
    case 'cannot-reach':
      return 'Stop here';
  }
}
