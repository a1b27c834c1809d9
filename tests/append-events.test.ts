import { randomUUID } from 'node:crypto';
import { afterAll, describe, expect, it } from 'vitest';
import { appendEvents } from '~/commands/append-events.server';
import { resultsSettled } from '~/commands/compute-result.server';
import { Run } from '~/models/run.server';
import { loadFill } from '~/queries/fill.server';
import { loadLog, readEvents } from '~/queries/run-log.server';
import { stopReplayPool } from '~/services/replay-pool.server';
import { addMember } from './factories/coach';
import { batchOf, createOpenFill, eventOf, readingsOf } from './factories/run';
import { createUser } from './factories/user';

afterAll(async () => {
  await resultsSettled();
  await stopReplayPool();
});

const seqsOf = async (runId: string) => (await loadLog(runId)).map(({ seq }) => seq);
const upTo = (count: number) => Array.from({ length: count }, (_, place) => place + 1);

describe('appending events', () => {
  it('stores a hundred parallel copies of one batch once, numbered without gaps', async () => {
    const { actor, runId } = await createOpenFill();
    const batch = batchOf(readingsOf(20));
    const answers = await Promise.all(
      Array.from({ length: 100 }, () => appendEvents(actor, runId, batch)),
    );
    expect(await seqsOf(runId)).toEqual(upTo(20));
    const stored = batch.events.map(({ id }, place) => ({ id, seq: place + 1 }));
    for (const answer of answers) expect(answer).toMatchObject({ stored, lastSeq: 20 });
    expect((await Run.findByPk(runId))?.lastSeq).toBe(20);
  });

  it('numbers parallel batches without gaps, and shows no number before a lower one', async () => {
    const { actor, runId } = await createOpenFill();
    const batches = Array.from({ length: 40 }, (_, place) => batchOf(readingsOf(5, place * 5000)));
    let writing = true;
    const seen: number[][] = [];
    const reader = (async () => {
      while (writing) seen.push(await seqsOf(runId));
    })();
    await Promise.all(batches.map((batch) => appendEvents(actor, runId, batch)));
    writing = false;
    await reader;
    expect(await seqsOf(runId)).toEqual(upTo(200));
    for (const seqs of seen) expect(seqs).toEqual(upTo(seqs.length));
    expect(seen.some((seqs) => seqs.length > 0 && seqs.length < 200)).toBe(true);
  });

  it('keeps the order of each batch', async () => {
    const { actor, runId } = await createOpenFill();
    const batch = batchOf(readingsOf(30).reverse());
    await appendEvents(actor, runId, batch);
    const ids = (await loadLog(runId)).map(({ event }) => event.id);
    expect(ids).toEqual(batch.events.map(({ id }) => id));
  });

  it('stores only the rest of a batch that is partly stored', async () => {
    const { actor, runId } = await createOpenFill();
    const deviceId = randomUUID();
    const [first, second, third] = readingsOf(3);
    await appendEvents(actor, runId, batchOf([second!], deviceId));
    const answer = await appendEvents(actor, runId, batchOf([first!, second!, third!], deviceId));
    expect(answer.stored.map(({ seq }) => seq)).toEqual([2, 1, 3]);
    expect(await seqsOf(runId)).toEqual([1, 2, 3]);
  });

  it('gives back every event as it was sent', async () => {
    const { actor, runId } = await createOpenFill();
    const events = [
      eventOf({ type: 'engine', speed: 'fast-idle' }, 0),
      eventOf({ type: 'supply-reading', source: 'dash-gauge', kpa: 812.25, how: 'typed' }, 10),
      eventOf({ type: 'lowering', by: 'drain', on: true }, 86_400_000),
      eventOf({ type: 'taken-back', of: randomUUID() }),
      { ...eventOf({ type: 'cut-out' }), offsetMs: null, suspect: true },
    ];
    const batch = batchOf(events);
    await appendEvents(actor, runId, batch);
    const { events: read, lastSeq, endedSeq } = await readEvents(actor, runId, 0);
    expect(read.map(({ event }) => event)).toEqual(events);
    expect(new Set(read.map(({ deviceId }) => deviceId))).toEqual(new Set([batch.deviceId]));
    expect(new Set(read.map(({ side }) => side))).toEqual(new Set(['wheel']));
    expect({ lastSeq, endedSeq }).toEqual({ lastSeq: 5, endedSeq: null });
    expect((await readEvents(actor, runId, 3)).events.map(({ seq }) => seq)).toEqual([4, 5]);
  });

  it('answers a very long log in parts, and gives the page all of it', async () => {
    const { actor, runId } = await createOpenFill();
    const answers = [];
    for (let batch = 0; batch < 5; batch++) {
      answers.push(await appendEvents(actor, runId, batchOf(readingsOf(500))));
    }
    expect(answers.at(-1)?.lastSeq).toBe(2500);
    const first = await readEvents(actor, runId, 0);
    expect([first.events.length, first.lastSeq]).toEqual([2000, 2500]);
    const rest = await readEvents(actor, runId, 2000);
    expect(rest.events.map(({ seq }) => seq)).toEqual(upTo(2500).slice(2000));
    expect((await loadFill(actor, runId)).run.log).toHaveLength(2500);
  });

  it('refuses an id with another body, names the places and stores nothing of the batch', async () => {
    const { actor, runId } = await createOpenFill();
    const [first, second, third] = readingsOf(3);
    const deviceId = randomUUID();
    await appendEvents(actor, runId, batchOf([first!], deviceId));
    const changed = { ...first!, kpa: 812 } as typeof first & object;
    const twice = { ...third!, atMs: 77 };
    const sent = appendEvents(actor, runId, batchOf([second!, changed, third!, twice], deviceId));
    await expect(sent).rejects.toMatchObject({
      status: 409,
      code: 'other-body',
      problems: [
        { index: 1, field: 'kpa', value: 812 },
        { index: 3, field: 'atMs', value: 77 },
      ],
    });
    expect(await seqsOf(runId)).toEqual([1]);
    expect((await Run.findByPk(runId))?.lastSeq).toBe(1);
  });

  it('leaves nothing half written when the database refuses a row', async () => {
    const { actor, runId } = await createOpenFill();
    const beyondColumn = { ...eventOf({ type: 'cut-out' }), atMs: 86_400_001 };
    await expect(
      appendEvents(actor, runId, batchOf([...readingsOf(3), beyondColumn])),
    ).rejects.toThrow();
    expect(await seqsOf(runId)).toEqual([]);
    expect((await Run.findByPk(runId))?.lastSeq).toBe(0);
  });

  it('keeps two ends and lets the lower number count', async () => {
    const { actor, runId } = await createOpenFill();
    const ends = [
      eventOf({ type: 'ended', how: 'stopped' }, 9000),
      eventOf({ type: 'ended', how: 'done' }, 5000),
    ];
    const answers = await Promise.all(
      ends.map((end) => appendEvents(actor, runId, batchOf([end]))),
    );
    const log = await loadLog(runId);
    expect(log).toHaveLength(2);
    expect(answers.map(({ endedSeq }) => endedSeq)).toEqual([1, 1]);
    expect((await Run.findByPk(runId))?.endedSeq).toBe(1);
  });
});

describe('who may append', () => {
  it('lets a helper tap from the cab, and end nothing', async () => {
    const { coachId, runId } = await createOpenFill();
    const helper = await addMember(coachId, (await createUser()).id, 'helper');
    await appendEvents(helper, runId, batchOf(readingsOf(1)));
    const [entry] = await loadLog(runId);
    expect(entry?.side).toBe('cab');
    const end = eventOf({ type: 'ended', how: 'done' }, 5000);
    await expect(
      appendEvents(helper, runId, batchOf([...readingsOf(1), end])),
    ).rejects.toMatchObject({
      status: 403,
      code: 'end-not-allowed',
      problems: [{ index: 1, field: 'type', value: 'ended' }],
    });
    expect(await seqsOf(runId)).toEqual([1]);
  });

  it('refuses a viewer with 403 and hides the fill from a stranger with 404', async () => {
    const { coachId, runId } = await createOpenFill();
    const viewer = await addMember(coachId, (await createUser()).id, 'viewer');
    const { actor: stranger } = await createOpenFill();
    const batch = batchOf(readingsOf(1));
    await expect(appendEvents(viewer, runId, batch)).rejects.toMatchObject({ status: 403 });
    const missing = { status: 404, code: 'fill-not-found' };
    await expect(appendEvents(stranger, runId, batch)).rejects.toMatchObject(missing);
    await expect(appendEvents(stranger, randomUUID(), batch)).rejects.toMatchObject(missing);
    await expect(loadFill(viewer, 'no-id')).rejects.toMatchObject(missing);
    expect((await readEvents(viewer, runId, 0)).events).toEqual([]);
    await expect(readEvents(stranger, runId, 0)).rejects.toMatchObject(missing);
  });
});
