import type { FillResult, TraceSample } from '~/fill/replay';
import type { WireEvent } from '~/fill/wire-events';

/**
 * What became of an event: it counted; it was taken back; it happened after the end; it says again
 * that the fill ended.
 */
export type EntryUse = 'used' | 'taken-back' | 'after-end' | 'already-ended';

/** One event of the log. */
export interface ReviewEntry {
  seq: number;
  side: 'wheel' | 'cab';
  use: EntryUse;
  event: WireEvent;
}

/** Everything that chart and table are made from. */
export interface ReviewTrace {
  startedAt: Date;
  /** Of the round, such as America/Denver. */
  timeZone: string;
  /** The air path is opened and closed by a shut-off valve. */
  valve: boolean;
  targetKpa: number;
  /** By time, the first at the start, the last at the end. */
  samples: readonly TraceSample[];
  /** By number. */
  entries: readonly ReviewEntry[];
}

/** What was computed from the log of a fill that has ended. */
export type ReviewResult = FillResult & { engineVersion: string; lastSeq: number };
