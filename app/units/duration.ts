import { type Quantity, quantity } from './quantity';

/** The house's own unit of time. */
export type Seconds = Quantity<'s'>;

const minute = 60;
const hour = 60 * minute;

/** @throws RangeError when `value` is not finite. */
export const seconds = (value: number): Seconds => quantity('time in s', value);

/**
 * A time that has passed: `"0:42"`, `"12:05"`, `"1:02:05"`, to the nearest second.
 * @throws RangeError when it is below zero.
 */
export function formatDuration(value: Seconds): string {
  const whole = Math.round(quantity('duration in s', value, 0));
  const tail = (whole % minute).toString().padStart(2, '0');
  const minutes = Math.floor(whole / minute);
  if (whole < hour) return `${minutes}:${tail}`;
  return `${Math.floor(minutes / 60)}:${(minutes % 60).toString().padStart(2, '0')}:${tail}`;
}

/**
 * A time still to come: `"0:42"` under a minute, else in words, `"about 3 min"`. It runs out at
 * "0:00" and not before, so seconds are rounded up; what is overdue reads "0:00".
 * @param vague true when the forecast is too wide for a figure in seconds
 */
export function formatCountdown(value: Seconds, { vague = false } = {}): string {
  const left = Math.ceil(Math.max(0, value));
  if (!vague && left < minute) return formatDuration(seconds(left));
  return formatRoughDuration(seconds(left));
}

/** A rough time in words: `"about 20 s"`, `"about 3 min"`, `"about 2 h"`. Never "about 0". */
export function formatRoughDuration(value: Seconds): string {
  const tens = Math.max(10, Math.round(value / 10) * 10);
  if (tens < minute) return `about ${tens} s`;
  const minutes = Math.round(value / minute);
  if (minutes <= 90) return `about ${Math.max(1, minutes)} min`;
  return `about ${Math.round(value / hour)} h`;
}
