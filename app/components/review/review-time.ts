import { formatDuration, seconds } from '~/units';

/** "9:12:05" of the clock where the round was made. */
export const clockTime = (at: Date, timeZone: string): string =>
  format(at, { hour: 'numeric', minute: '2-digit', second: '2-digit', timeZone });

/** "14 November 2026" where the round was made. */
export const dayOf = (at: Date, timeZone: string): string =>
  format(at, { day: 'numeric', month: 'long', year: 'numeric', timeZone });

/** "9:12" of the clock where the round was made. */
export const minuteOf = (at: Date, timeZone: string): string =>
  format(at, { hour: 'numeric', minute: '2-digit', timeZone });

/** "1:34" since the fill's start, whole seconds that have passed. */
export const sinceStart = (at: number): string => formatDuration(seconds(Math.floor(at)));

function format(at: Date, options: Intl.DateTimeFormatOptions): string {
  return new Intl.DateTimeFormat('en-GB', options).format(at);
}
