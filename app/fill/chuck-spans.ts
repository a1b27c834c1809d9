import type { FillEvent } from '~/air';

/** Seconds since the fill's start. */
export interface TimeSpan {
  readonly from: number;
  readonly to: number;
}

/** When the chuck was on: *on* twice is no change, and one never taken off lasts until the end. */
export function chuckSpans(events: readonly FillEvent[], until: number): TimeSpan[] {
  const gone = new Set(events.flatMap((event) => (event.type === 'taken-back' ? event.of : [])));
  const spans: TimeSpan[] = [];
  let since: number | undefined;
  for (const event of events) {
    if (event.type !== 'chuck' || (event.id && gone.has(event.id))) continue;
    if (event.on) since ??= event.at;
    if (event.on || since === undefined) continue;
    spans.push({ from: since, to: event.at });
    since = undefined;
  }
  if (since !== undefined && since < until) spans.push({ from: since, to: until });
  return spans;
}
