import { endOf } from '~/fill/log';
import type { StoredEvent } from '~/fill/wire';
import type { EntryUse, ReviewEntry } from './review-model';

/**
 * Says of each event what became of it, by time. The end with the lowest number is the end; what
 * happened after it, and the ends after it, are kept and not used.
 */
export function sayWhatCounts(events: readonly StoredEvent[]): ReviewEntry[] {
  const end = endOf(events);
  const counts = ({ event }: StoredEvent) => !end || event.atMs <= end.atMs;
  const gone = new Set(
    events.flatMap((entry) =>
      entry.event.type === 'taken-back' && counts(entry) ? [entry.event.of] : [],
    ),
  );
  const fateOf = (entry: StoredEvent): EntryUse => {
    if (entry.event.type === 'ended') return entry.event.id === end?.id ? 'used' : 'already-ended';
    if (!counts(entry)) return 'after-end';
    return gone.has(entry.event.id) ? 'taken-back' : 'used';
  };
  return [...events]
    .sort((a, b) => a.event.atMs - b.event.atMs || a.seq - b.seq)
    .map((entry) => ({
      seq: entry.seq,
      side: entry.side,
      event: entry.event,
      use: fateOf(entry),
    }));
}
