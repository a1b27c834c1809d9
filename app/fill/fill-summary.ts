import type { WheelPosition } from '~/loads';
import { endOf, fillEventsOf, type RunLog } from './log';
import type { Ending } from './wire-events';

/** A fill as the round's page lists it. */
export interface FillSummary {
  readonly id: string;
  readonly tireId: string;
  readonly position: WheelPosition;
  /** ISO 8601. */
  readonly startedAt: string;
  /** How it ended; null while it is open. */
  readonly how: Ending | null;
  /** What the tire was last gauged at, kPa; null when it wasn't. */
  readonly endKpa: number | null;
}

interface Filled {
  readonly id: string;
  readonly tireId: string;
  readonly position: WheelPosition;
  readonly startedAt: string;
  readonly log: RunLog;
}

export function summariseFill({ id, tireId, position, startedAt, log }: Filled): FillSummary {
  const how = endOf(log)?.how ?? null;
  return { id, tireId, position, startedAt, how, endKpa: lastGaugedKpa(log) };
}

/** The last reading of the tire that was not taken back, gauge kPa; null when there is none. */
export function lastGaugedKpa(log: RunLog): number | null {
  const events = fillEventsOf(log);
  const gone = new Set(events.flatMap((event) => (event.type === 'taken-back' ? event.of : [])));
  let last: { at: number; kpa: number } | undefined;
  for (const event of events) {
    if (event.type !== 'tire-reading' || (event.id && gone.has(event.id))) continue;
    if (!last || event.at >= last.at) last = event;
  }
  return last?.kpa ?? null;
}
