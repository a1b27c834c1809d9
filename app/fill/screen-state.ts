import type { Advice, FillSetup } from '~/air';
import { formatPressure, gaugeKpa, type PressureUnit } from '~/units';
import { type Answer, answersOf } from './answers';
import { callLooks, type Side, titleOf } from './call-words';
import { type Countdown, clockText, countdownText, type TimeText } from './countdown';
import type { LogFacts } from './log-facts';
import { type Notice, noticeOf } from './notice';
import { nextOf, whyOf } from './reason-words';
import { type VesselState, vesselOf, whole } from './vessel-state';

/** What takes the middle of the screen: the vessel, a keypad, or the pedal's safety words. */
type Body = 'vessel' | 'tire-keypad' | 'pedal-cautions';

/** Everything that the live screen shows, derived: nothing here is kept. */
export interface ScreenState {
  call: Advice['call'];
  side: Side;
  /** The chuck is not where it belongs: the call is large. */
  act: boolean;
  title: string;
  time: TimeText | undefined;
  /** While the chuck is on: the clock time by which it must be off, "10:42:30". */
  offBy: string | undefined;
  why: string;
  /** With `check` and `cannot-reach`: what to do about it. */
  next: string | undefined;
  body: Body;
  vessel: VesselState;
  notice: Notice | undefined;
  answers: readonly Answer[];
  /** A reading is wanted now. */
  readNow: boolean;
  /** "The gauge reads lower while air moves" stands under the row. */
  airMoves: boolean;
  /** For the two hidden regions: call and reason, `alert` for taking the chuck off. */
  heard: { urgent: boolean; text: string };
}

export interface ScreenInput {
  advice: Advice;
  setup: FillSetup;
  unit: PressureUnit;
  /** Seconds since the fill's start. */
  at: number;
  facts: LogFacts;
  countdown: Countdown | undefined;
  /** The time that was said for this hold, seconds since the fill's start. */
  offBy: number | undefined;
  /** The pedal's safety words were read in this fill. */
  pedalAccepted: boolean;
  wallClock: (at: number) => Date;
}

/** What to show for one advice. */
export function screenState(input: ScreenInput): ScreenState {
  const { advice, setup, unit, facts } = input;
  const valve = setup.rig?.valve ?? false;
  const by = advice.by ?? facts.lowering ?? setup.lowerBy?.[0];
  const mustReadPedal = advice.call === 'lower-supply' && by === 'pedal' && !input.pedalAccepted;
  const title = titleOf(advice, { valve, helper: facts.helper, by });
  const why = whyOf(advice.reason, figuresOf(advice, setup, unit, valve));
  const look = callLooks[advice.call];
  const offBy = offByOf(input);
  return {
    call: advice.call,
    side: look.side === 'as-is' ? checkSide(advice, facts) : look.side,
    act: look.act || (facts.chuckOn && mustComeOff(advice)),
    title,
    time: mustReadPedal ? undefined : timeOf(input),
    offBy,
    why,
    next: nextOf(advice.reason, valve),
    body: bodyOf(advice, mustReadPedal),
    vessel: vesselOf(advice, setup, unit),
    notice: mustReadPedal ? undefined : noticeOf(advice, facts, setup),
    answers: answersOf(advice, facts, { valve, by, mustReadPedal }),
    readNow: advice.call === 'read-supply' || (advice.readIn ?? 1) <= 0,
    airMoves: facts.chuckOn,
    heard: {
      urgent: advice.call === 'chuck-off',
      text: [`${title}.`, why, offBy && advice.call === 'keep-on' && `Off by ${offBy}.`]
        .filter(Boolean)
        .join(' '),
    },
  };
}

/** Calls that don't name the chuck, and yet it has to come off. */
function mustComeOff({ call, reason }: Advice): boolean {
  return call === 'cannot-reach' || call === 'done' || reason === 'low-air';
}

function checkSide(advice: Advice, facts: LogFacts): Side {
  return facts.chuckOn && !mustComeOff(advice) ? 'on' : 'off';
}

function bodyOf({ call }: Advice, mustReadPedal: boolean): Body {
  if (mustReadPedal) return 'pedal-cautions';
  return call === 'gauge-tire' || call === 'bleed' ? 'tire-keypad' : 'vessel';
}

/** The likely range while the supply is not known; else the countdown, where one makes sense. */
function timeOf({ advice, at, countdown, unit }: ScreenInput): TimeText | undefined {
  if (advice.call === 'read-supply') {
    const { p10, p90 } = advice.supplyKpa;
    return { figure: `${whole(p10, unit)}–${whole(p90, unit)}`, after: `${unit}?` };
  }
  const counted: Advice['call'][] = ['wait', 'keep-on', 'chuck-on', 'lower-supply'];
  if (!counted.includes(advice.call) || !countdown) return undefined;
  const text = countdownText(countdown, at);
  if (advice.call !== 'chuck-on') return text;
  // How long it will stay on is a guess until it is on.
  return { before: 'about', ...text, after: [text.after, 'on'].filter(Boolean).join(' ') };
}

function offByOf({ offBy, facts, wallClock }: ScreenInput): string | undefined {
  return facts.chuckOn && offBy !== undefined ? clockText(wallClock(offBy)) : undefined;
}

function figuresOf(advice: Advice, { tire }: FillSetup, unit: PressureUnit, valve: boolean) {
  const shown = (kpa: number) => formatPressure(gaugeKpa(kpa), unit, { trim: true });
  return {
    target: shown(tire.targetKpa),
    tire: shown(advice.tireKpa.p50),
    reach: advice.reachKpa && shown(advice.reachKpa.p50),
    valve,
  };
}
