import type { Advice, Call, Spread } from '~/air';

/** A countdown that runs evenly although the forecast behind it is made anew three times a second. */
export interface Countdown {
  call: Call;
  /** Seconds since the fill's start. */
  endsAt: number;
  vague: boolean;
}

export interface TimeText {
  before?: string;
  figure: string;
  after?: string;
}

/** Seconds, and share of the time left, by which a forecast may differ before the display follows. */
const driftSeconds = 2;
const driftShare = 0.12;
/** A forecast whose 80 % band is wider than this, or than itself, is "about" (our choice). */
const vagueSeconds = 15;

/** Keeps the running countdown unless the call is another one or the forecast has moved away. */
export function followCountdown(
  previous: Countdown | undefined,
  advice: Advice,
  at: number,
): Countdown | undefined {
  const spread = advice.changeIn;
  if (!spread) return undefined;
  const fresh = { call: advice.call, endsAt: at + spread.p50, vague: isVague(spread) };
  if (previous?.call !== advice.call) return fresh;
  const drift = Math.abs(fresh.endsAt - previous.endsAt);
  if (drift > Math.max(driftSeconds, driftShare * spread.p50)) return fresh;
  return { ...previous, vague: fresh.vague };
}

function isVague({ p10, p50, p90 }: Spread): boolean {
  return p90 - p10 > Math.max(vagueSeconds, p50);
}

/** "0:42" under a minute; "about 3 min" when long, "about 0:50" when vague; "soon" at the end. */
export function countdownText({ endsAt, vague }: Countdown, at: number): TimeText {
  const left = Math.max(0, Math.round(endsAt - at));
  if (left === 0) return { figure: 'soon' };
  if (left >= 60) return { before: 'about', figure: String(Math.round(left / 60)), after: 'min' };
  if (!vague) return { figure: minuteText(left) };
  const rounded = Math.max(10, Math.round(left / 10) * 10);
  if (rounded === 60) return { before: 'about', figure: '1', after: 'min' };
  return { before: 'about', figure: minuteText(rounded) };
}

function minuteText(seconds: number): string {
  return `0:${String(seconds).padStart(2, '0')}`;
}

/** A time on the wall clock, rounded down to five seconds: an "off by" must never come too late. */
export function clockText(time: Date): string {
  const seconds = Math.floor(time.getSeconds() / 5) * 5;
  return [time.getHours(), time.getMinutes(), seconds]
    .map((part, index) => (index === 0 ? String(part) : String(part).padStart(2, '0')))
    .join(':');
}
