import { QueryTypes, type Transaction } from 'sequelize';
import type { Actor } from '~/access/can';
import type { AppendAnswer, EventsBody } from '~/fill/wire';
import type { WireEvent } from '~/fill/wire-events';
import { sequelize } from '~/models/database.server';
import type { Run } from '~/models/run.server';
import { requireRun } from '~/queries/round-access.server';
import { Refusal } from '~/services/refusal.server';
import { queueResult } from './compute-result.server';
import { markOverlaps } from './mark-overlaps.server';
import { insertEvents, type StoredRow, storedEvents } from './run-event-rows.server';
import { differences } from './same-body.server';

/**
 * Adds events to a fill's log, in one transaction: all of a batch or none of it. What is stored
 * already, from an earlier or a parallel sending, is stored no second time and answers its number.
 * Numbers are given under the run's lock, so they have no gaps and commit in their order.
 * The first end that is stored counts; later ends are kept beside it.
 * @throws Refusal `fill-not-found`, `not-allowed`; `end-not-allowed` for an end by a helper;
 * `other-body` when an id stands for another event; the last two name every index
 */
export async function appendEvents(
  actor: Actor,
  runId: string,
  body: EventsBody,
): Promise<AppendAnswer> {
  const outcome = await sequelize.transaction(async (transaction) => {
    if (body.events.some(({ type }) => type === 'ended')) await lockCoach(runId, transaction);
    const run = await requireRun(actor, 'fill:tap', runId, { transaction, lock: true });
    const role = actor.roles.get(run.coachId);
    refuseEnds(body.events, role === 'helper');
    const known = await storedEvents(runId, body.events, transaction);
    const fresh = newOnes(body, known);
    const lastSeq = await takeNumbers(run, fresh.length, transaction);
    const rows = numbered(fresh, lastSeq);
    const side = role === 'helper' ? 'cab' : 'wheel';
    await insertEvents(runId, rows, { ...body, side, actorId: actor.userId }, transaction);
    const endedSeq = await keepFirstEnd(run, rows, transaction);
    return { stored: numbersOf(body, known, rows), lastSeq, endedSeq, added: rows.length };
  });
  const { added, ...answer } = outcome;
  if (added > 0 && answer.endedSeq !== null) queueResult(runId);
  return answer;
}

/**
 * An end may mark other fills of the coach, so it takes the coach's row before the run's, as the
 * start of a fill does: two that end at once wait for each other and never both.
 */
async function lockCoach(runId: string, transaction: Transaction): Promise<void> {
  await sequelize.query(
    'SELECT id FROM coaches WHERE id = (SELECT coach_id FROM runs WHERE id = :runId) FOR UPDATE',
    { replacements: { runId }, type: QueryTypes.SELECT, transaction },
  );
}

function refuseEnds(events: readonly WireEvent[], isHelper: boolean): void {
  if (!isHelper) return;
  const problems = events.flatMap(({ type }, index) =>
    type === 'ended'
      ? { index, field: 'type', value: type, expected: 'an end by an owner or a driver' }
      : [],
  );
  if (problems.length === 0) return;
  const words = 'A helper taps, and does not end a fill.';
  throw new Refusal('not-allowed', 'end-not-allowed', words, problems);
}

/** Events of the batch that are not stored yet, each once, in the order sent. */
function newOnes(body: EventsBody, known: ReadonlyMap<string, StoredRow>): WireEvent[] {
  const seen = new Map<string, unknown>([...known].map(([id, row]) => [id, row.content]));
  const fresh: WireEvent[] = [];
  const problems = body.events.flatMap((event, index) => {
    const content = { ...event, deviceId: body.deviceId };
    const before = seen.get(event.id);
    if (before === undefined) {
      seen.set(event.id, content);
      fresh.push(event);
      return [];
    }
    return differences(before as Record<string, unknown>, content).map((problem) => ({
      index,
      ...problem,
    }));
  });
  if (problems.length === 0) return fresh;
  const words = 'An id already stands for another event.';
  throw new Refusal('conflict', 'other-body', words, problems);
}

/** Raises the run's last number by `count` and answers it; the lock holds until the commit. */
async function takeNumbers(run: Run, count: number, transaction: Transaction): Promise<number> {
  if (count === 0) return run.lastSeq;
  const [row] = await sequelize.query<{ lastSeq: number }>(
    `UPDATE runs SET last_seq = last_seq + :count WHERE id = :id RETURNING last_seq AS "lastSeq"`,
    { replacements: { count, id: run.id }, type: QueryTypes.SELECT, transaction },
  );
  if (!row) throw new Error(`run ${run.id} is gone while it is locked`);
  return row.lastSeq;
}

function numbered(fresh: readonly WireEvent[], lastSeq: number) {
  return fresh.map((event, place) => ({ event, seq: lastSeq - fresh.length + 1 + place }));
}

async function keepFirstEnd(
  run: Run,
  rows: readonly { event: WireEvent; seq: number }[],
  transaction: Transaction,
): Promise<number | null> {
  if (run.endedSeq !== null) return run.endedSeq;
  const end = rows.find(({ event }) => event.type === 'ended');
  if (!end) return null;
  await run.update({ endedSeq: end.seq }, { transaction });
  await markOverlaps(run, end.event.atMs, transaction);
  return end.seq;
}

function numbersOf(
  body: EventsBody,
  known: ReadonlyMap<string, StoredRow>,
  rows: readonly { event: WireEvent; seq: number }[],
) {
  const seqs = new Map([...known].map(([id, { seq }]) => [id, seq]));
  for (const { event, seq } of rows) seqs.set(event.id, seq);
  return body.events.map(({ id }) => ({ id, seq: seqs.get(id)! }));
}
