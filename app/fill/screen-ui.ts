import type { Advice } from '~/air';
import { type Countdown, followCountdown } from './countdown';
import { afterReading, followForecast, type GaugeRow, offerRow, wantsTyping } from './gauge-row';
import type { NewFillEvent } from './live-driver';

export type KeypadFor = 'wheel-gauge' | 'dash-gauge' | 'tire';

interface Keypad {
  reads: KeypadFor;
  text: string;
  /** What was wrong with the last try, beside the field. */
  problem: string | undefined;
}

/** Something to be asked about once, before it is recorded. */
export type Question =
  | { kind: 'far'; event: NewFillEvent; at: number; shown: string; expected: string }
  | { kind: 'which'; choices: readonly { event: NewFillEvent; shown: string }[]; at: number }
  | { kind: 'pedal'; event: NewFillEvent; at: number }
  | { kind: 'end' };

/** What was entered last; it can be taken back until `until`, seconds on a running clock. */
export interface Entered {
  id: string | undefined;
  text: string;
  until: number;
}

/** What the screen itself remembers between two advices. The log knows the rest. */
export interface ScreenUi {
  row: GaugeRow | undefined;
  countdown: Countdown | undefined;
  /** The clock time that was said for this hold, seconds since the fill's start. */
  offBy: number | undefined;
  keypad: Keypad | undefined;
  question: Question | undefined;
  entered: Entered | undefined;
  more: boolean;
  pedalAccepted: boolean;
}

export const blankUi: ScreenUi = {
  row: undefined,
  countdown: undefined,
  offBy: undefined,
  keypad: undefined,
  question: undefined,
  entered: undefined,
  more: false,
  pedalAccepted: false,
};

/** How long an entry can be taken back, seconds. */
export const takeBackSeconds = 10;

export interface RowFrame {
  gaugeStepKpa: number;
  count: number;
}

export type UiAction =
  | { type: 'advised'; advice: Advice; at: number; now: number; pressing: boolean; frame: RowFrame }
  | { type: 'recorded'; entered: Entered; index: number | undefined }
  | { type: 'said'; entered: Entered }
  | { type: 'taken-back' }
  | { type: 'open-keypad'; reads: KeypadFor }
  | { type: 'type'; text: string }
  | { type: 'refuse'; problem: string }
  | { type: 'ask'; question: Question }
  | { type: 'close' }
  | { type: 'open-more' }
  | { type: 'accept-pedal' };

/** The screen's own memory, step by step. */
export function nextUi(ui: ScreenUi, action: UiAction): ScreenUi {
  switch (action.type) {
    case 'advised':
      return advised(ui, action);
    case 'recorded':
      return {
        ...ui,
        ...closed,
        entered: action.entered,
        row: rowAfter(ui, action.index),
      };
    case 'said':
      return { ...ui, ...closed, entered: action.entered };
    case 'taken-back':
      return { ...ui, ...closed, entered: undefined };
    case 'open-keypad':
      return { ...ui, ...closed, keypad: { reads: action.reads, text: '', problem: undefined } };
    case 'type':
      return typed(ui, action.text);
    case 'refuse':
      return ui.keypad ? { ...ui, keypad: { ...ui.keypad, problem: action.problem } } : ui;
    case 'ask':
      return { ...ui, more: false, question: action.question };
    case 'close':
      return { ...ui, ...closed };
    case 'open-more':
      return { ...ui, ...closed, more: true };
    case 'accept-pedal':
      return { ...ui, pedalAccepted: true };
  }
}

const closed = { keypad: undefined, question: undefined, more: false } as const;

function advised(ui: ScreenUi, action: UiAction & { type: 'advised' }): ScreenUi {
  const { advice, at, now, pressing, frame } = action;
  const wish = { forecast: advice.supplyKpa, ...frame };
  const row = ui.row ? followForecast(ui.row, wish, { now, pressing }) : offerRow(wish);
  const countdown = followCountdown(ui.countdown, advice, at);
  const offBy = followOffBy(ui.offBy, advice);
  return { ...ui, row, countdown, offBy, keypad: keypadFor(ui, row, advice, pressing) };
}

/** A later forecast moves the time that was said only by as much as this, seconds (our choice). */
const offByLaterSeconds = 15;
const offByEarlierSeconds = 3;

/** Keeps the time that was said for a hold: it may come earlier at once, later only by a good deal. */
function followOffBy(said: number | undefined, { call, offBy }: Advice): number | undefined {
  if (offBy === undefined) return call === 'chuck-off' || call === 'check' ? said : undefined;
  if (said === undefined) return offBy;
  const later = offBy - said;
  return later > offByLaterSeconds || later < -offByEarlierSeconds ? offBy : said;
}

/** A call for the tire's reading opens its keypad; a thumb that only agrees gets a blank one. */
function keypadFor(ui: ScreenUi, row: GaugeRow, advice: Advice, pressing: boolean) {
  const gauging = advice.call === 'gauge-tire' || advice.call === 'bleed';
  if (ui.keypad?.reads === 'tire' && !gauging && ui.keypad.text === '') return undefined;
  if (ui.keypad || pressing || ui.question || ui.more) return ui.keypad;
  if (gauging) return { reads: 'tire' as const, text: '', problem: undefined };
  const asked = advice.call === 'read-supply' || (advice.readIn ?? 1) <= 0;
  if (!asked || !wantsTyping(row)) return undefined;
  return { reads: 'wheel-gauge' as const, text: '', problem: undefined };
}

function rowAfter({ row }: ScreenUi, index: number | undefined) {
  return row && index !== undefined ? afterReading(row, index) : row;
}

function typed(ui: ScreenUi, text: string): ScreenUi {
  return ui.keypad ? { ...ui, keypad: { ...ui.keypad, text, problem: undefined } } : ui;
}
