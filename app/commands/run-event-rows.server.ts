import { QueryTypes, type Transaction } from 'sequelize';
import type { WireEvent } from '~/fill/wire-events';
import { sequelize } from '~/models/database.server';
import { RunEvent } from '~/models/run-event.server';
import { toWireEvent } from '~/queries/run-log.server';

/** An event that is in the log: its number, and everything that was sent of it. */
export interface StoredRow {
  seq: number;
  content: WireEvent & { deviceId: string };
}

/** Those of `events` that are stored under this run, by id. */
export async function storedEvents(
  runId: string,
  events: readonly WireEvent[],
  transaction: Transaction,
): Promise<ReadonlyMap<string, StoredRow>> {
  const rows = await RunEvent.findAll({
    where: { runId, id: events.map(({ id }) => id) },
    transaction,
  });
  return new Map(
    rows.map((row) => [
      row.id,
      { seq: row.seq, content: { ...toWireEvent(row), deviceId: row.deviceId } },
    ]),
  );
}

/** Who sent a batch, and from which side of the coach. */
interface Sender {
  deviceId: string;
  side: 'wheel' | 'cab';
  actorId: string;
}

// One statement for the whole batch: ten times as fast as a row at a time.
const insert = `
  INSERT INTO run_events (run_id, side, actor_id, device_id,
    seq, id, type, at_ms, body, device_seq, device_time, offset_ms, suspect)
  SELECT $1::uuid, $2::text, $3::uuid, $4::uuid, * FROM unnest(
    $5::integer[], $6::uuid[], $7::text[], $8::integer[], $9::jsonb[],
    $10::integer[], $11::timestamptz[], $12::integer[], $13::boolean[])`;

export async function insertEvents(
  runId: string,
  rows: readonly { event: WireEvent; seq: number }[],
  sender: Sender,
  transaction: Transaction,
): Promise<void> {
  if (rows.length === 0) return;
  const column = <Value>(pick: (event: WireEvent) => Value) => rows.map(({ event }) => pick(event));
  const bind = [
    runId,
    sender.side,
    sender.actorId,
    sender.deviceId,
    rows.map(({ seq }) => seq),
    column(({ id }) => id),
    column(({ type }) => type),
    column(({ atMs }) => atMs),
    column((event) => JSON.stringify(ownFields(event))),
    column(({ deviceSeq }) => deviceSeq),
    column(({ deviceTime }) => deviceTime),
    column(({ offsetMs }) => offsetMs),
    column(({ suspect }) => suspect),
  ];
  await sequelize.query(insert, { bind, type: QueryTypes.RAW, transaction });
}

/** What only this type of event has: the columns hold the rest. */
function ownFields(event: WireEvent): Record<string, unknown> {
  const { id, type, atMs, deviceSeq, deviceTime, offsetMs, suspect, ...own } = event;
  return own;
}
