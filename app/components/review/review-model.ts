import type { Spread } from '~/air';
import type { WireEvent } from '~/fill/wire-events';

/** What the estimate said at one moment of the fill, gauge kPa. */
export interface ReviewSample {
  /** Seconds since the fill's start. */
  at: number;
  supplyKpa: Spread;
  /** Settled. */
  tireKpa: Spread;
}

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
  samples: readonly ReviewSample[];
  /** By number. */
  entries: readonly ReviewEntry[];
}

/** What was computed from the log of a fill that has ended. Pressures are gauge kPa. */
export interface ReviewResult {
  startKpa: number;
  /** As gauged after the last hold; null when nobody gauged it. */
  endKpa: number | null;
  targetKpa: number;
  toleranceKpa: number;
  secondsOn: number;
  timesOn: number;
  /** Of the tire's pressure, through a supply that was below it; kPa. */
  lostKpa: number;
  highestSupplyKpa: number;
  lowestSupplyKpa: number;
  engineVersion: string;
  lastSeq: number;
}
