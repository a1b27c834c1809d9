import { Op } from 'sequelize';
import type { Actor } from '~/access/can';
import type { EventsAnswer, StoredEvent } from '~/fill/wire';
import type { WireEvent } from '~/fill/wire-events';
import { RunEvent } from '~/models/run-event.server';
import { requireRun } from './round-access.server';

/** Most events in one answer; `lastSeq` tells whether there are more. */
const longestAnswer = 2000;

/** The event as it was sent. */
export function toWireEvent(row: RunEvent): WireEvent {
  const { id, type, atMs, deviceSeq, deviceTime, offsetMs, suspect, body } = row;
  const stamp = { id, atMs, deviceSeq, deviceTime: deviceTime.toISOString(), offsetMs, suspect };
  return { type, ...stamp, ...body } as WireEvent;
}

/** A fill's log after the number `after`, by number. */
export async function loadLog(runId: string, after = 0, most?: number): Promise<StoredEvent[]> {
  const rows = await RunEvent.findAll({
    where: { runId, seq: { [Op.gt]: after } },
    order: [['seq', 'ASC']],
    ...(most === undefined ? {} : { limit: most }),
  });
  return rows.map((row) => ({
    seq: row.seq,
    side: row.side,
    deviceId: row.deviceId,
    event: toWireEvent(row),
  }));
}

/**
 * What a phone has not yet of a fill's log.
 * @param after the last number that the phone has; 0 for all
 * @throws Refusal `fill-not-found`, `not-allowed`
 */
export async function readEvents(
  actor: Actor,
  runId: string,
  after: number,
): Promise<EventsAnswer> {
  // The fill is read first: what is appended meanwhile shows as a lastSeq that is behind, never as
  // a gap, since numbers commit in their order.
  const run = await requireRun(actor, 'fill:see', runId);
  const events = await loadLog(runId, after, longestAnswer);
  const lastSeq = Math.max(run.lastSeq, events.at(-1)?.seq ?? 0);
  return { events, lastSeq, endedSeq: run.endedSeq };
}
