import type { Call } from '~/air';
import { eventWords } from '~/fill/event-words';
import type { Ending, WireEvent } from '~/fill/wire-events';
import type { PressureUnit } from '~/units';
import type { EntryUse, ReviewEntry } from './review-model';

/** The calls as the screen said them; with what the log does not keep left out. */
const calls: Record<Call, string> = {
  'read-supply': 'Read gauge',
  wait: 'Wait',
  'lower-supply': 'Lower supply',
  'stop-lowering': 'Stop lowering',
  'chuck-on': 'Put it on',
  'keep-on': 'Keep it on',
  'chuck-off': 'Take it off',
  'gauge-tire': 'Gauge it',
  bleed: 'Bleed it',
  check: 'Check',
  done: 'Done',
  'cannot-reach': 'Stop here',
};

const valveCalls: Partial<Record<Call, string>> = {
  'chuck-on': 'Open it',
  'keep-on': 'Keep it open',
  'chuck-off': 'Close it',
};

/** The call in one to three words. */
export const callWords = (call: Call, valve: boolean): string =>
  (valve ? valveCalls[call] : undefined) ?? calls[call];

const readingWords = {
  'wheel-gauge': 'Read the gauge at the wheel',
  'dash-gauge': 'Read the dash gauge',
  sensor: 'The sensor read',
};

const endings: Record<Ending, string> = {
  done: 'Ended: done',
  stopped: 'Ended before it was done',
  'cannot-reach': 'Ended: the supply does not reach the target',
};

const uses: Record<Exclude<EntryUse, 'used'>, string> = {
  'taken-back': 'taken back',
  'after-end': 'after the end, not used',
  'already-ended': 'already ended, not used',
};

export type LineKind = 'reading' | 'call' | 'tap';

/** What a row of the table says happened. */
export interface EntryLine {
  kind: LineKind;
  words: string;
  /** Why it does not count. */
  unused?: string;
  /** What was read, gauge kPa. */
  kpa?: number;
}

interface SayHow {
  valve: boolean;
  unit: PressureUnit;
  /** The event that an undo takes back. */
  undone: WireEvent | undefined;
}

/** One event in plain words. */
export function entryLine({ event, use }: ReviewEntry, say: SayHow): EntryLine {
  const unused = use === 'used' ? {} : { unused: uses[use] };
  switch (event.type) {
    case 'supply-reading':
      return { kind: 'reading', words: readingWords[event.source], kpa: event.kpa, ...unused };
    case 'tire-reading':
      return { kind: 'reading', words: 'Gauged the tire', kpa: event.kpa, ...unused };
    case 'call-shown':
      return { kind: 'call', words: `“${callWords(event.call, say.valve)}”`, ...unused };
    case 'ended':
      return { kind: 'tap', words: endings[event.how], ...unused };
    case 'taken-back':
      return { kind: 'tap', words: undoWords(say), ...unused };
    default:
      return { kind: 'tap', words: tapWords(event, say), ...unused };
  }
}

function undoWords({ undone, unit, valve }: SayHow): string {
  if (!undone || undone.type === 'ended') return 'Took something back';
  return `Took back: ${tapWords(undone, { unit, valve })}`;
}

/** The words that the live screen itself uses for a tap. */
function tapWords(
  event: Exclude<WireEvent, { type: 'ended' }>,
  { unit, valve }: Pick<SayHow, 'unit' | 'valve'>,
): string {
  return eventWords({ ...event, at: event.atMs / 1000 }, unit, valve);
}
