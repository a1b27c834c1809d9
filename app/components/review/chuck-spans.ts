import type { ReviewEntry } from './review-model';

/** Seconds since the start. */
export interface TimeSpan {
  from: number;
  to: number;
}

/** When the chuck was on. *On* twice is no change; one that never came off lasts until the end. */
export function chuckSpans(used: readonly ReviewEntry[], until: number): TimeSpan[] {
  const spans: TimeSpan[] = [];
  let since: number | undefined;
  for (const { event } of used) {
    if (event.type !== 'chuck') continue;
    const at = event.atMs / 1000;
    if (event.on) since ??= at;
    if (event.on || since === undefined) continue;
    spans.push({ from: since, to: at });
    since = undefined;
  }
  if (since !== undefined && since < until) spans.push({ from: since, to: until });
  return spans;
}
