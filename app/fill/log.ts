import type { FillEvent } from '~/air';
import type { StoredEvent } from './wire';
import type { Ending, WireEvent } from './wire-events';

/** One event of a run as a phone keeps it: numbered once the server has it. */
export interface LogEntry {
  readonly event: WireEvent;
  readonly deviceId: string;
  readonly side: 'wheel' | 'cab';
  readonly seq: number | null;
}

/** A run's events by time. A new array whenever something changes, never one changed in place. */
export type RunLog = readonly LogEntry[];

export interface RunEnd {
  readonly id: string;
  readonly how: Ending;
  readonly atMs: number;
  readonly seq: number | null;
}

/** Adds entries by id. What the server has numbered wins over this phone's own copy. */
export function mergeLog(log: RunLog, incoming: readonly (LogEntry | StoredEvent)[]): RunLog {
  const byId = new Map(log.map((entry) => [entry.event.id, entry]));
  let changed = false;
  for (const entry of incoming) {
    const known = byId.get(entry.event.id);
    if (known && (known.seq !== null || entry.seq === null)) continue;
    byId.set(entry.event.id, entry);
    changed = true;
  }
  return changed ? [...byId.values()].sort(byTime) : log;
}

/** Writes the server's numbers beside the events that it has stored. */
export function numberLog(log: RunLog, stored: readonly { id: string; seq: number }[]): RunLog {
  const seqs = new Map(stored.map(({ id, seq }) => [id, seq]));
  return log.map((entry) =>
    entry.seq === null && seqs.has(entry.event.id)
      ? { ...entry, seq: seqs.get(entry.event.id)! }
      : entry,
  );
}

/** The end that counts: the lowest number, or this phone's own while none has a number. */
export function endOf(log: RunLog): RunEnd | undefined {
  let end: RunEnd | undefined;
  for (const { event, seq } of log) {
    if (event.type !== 'ended') continue;
    if (end && (seq ?? Number.POSITIVE_INFINITY) >= (end.seq ?? Number.POSITIVE_INFINITY)) continue;
    end = { id: event.id, how: event.how, atMs: event.atMs, seq };
  }
  return end;
}

const readAs = new WeakMap<RunLog, readonly FillEvent[]>();

/**
 * What the engine is given: the log without its ends, and without what happened after the end that
 * counts. The same array for the same log.
 */
export function fillEventsOf(log: RunLog): readonly FillEvent[] {
  const known = readAs.get(log);
  if (known) return known;
  const lastMs = endOf(log)?.atMs ?? Number.POSITIVE_INFINITY;
  const events = log.flatMap(({ event }) => (event.atMs <= lastMs ? toFillEvent(event) : []));
  readAs.set(log, events);
  return events;
}

/** The highest number up to which nothing is missing: what to ask the server for more after. */
export function lastSeqOf(log: RunLog): number {
  const seqs = new Set(log.map(({ seq }) => seq));
  let last = 0;
  while (seqs.has(last + 1)) last += 1;
  return last;
}

function toFillEvent(wire: WireEvent): FillEvent[] {
  if (wire.type === 'ended') return [];
  const { atMs, deviceSeq, deviceTime, offsetMs, suspect, ...own } = wire;
  return [{ at: atMs / 1000, ...own }];
}

function byTime(left: LogEntry, right: LogEntry): number {
  const apart = left.event.atMs - right.event.atMs;
  if (apart !== 0) return apart;
  return left.event.id < right.event.id ? -1 : 1;
}
