import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { resultsSettled } from '~/commands/compute-result.server';
import { versioned } from '~/fill/wire';
import { Run } from '~/models/run.server';
import { RunEvent } from '~/models/run-event.server';
import * as runRoute from '~/routes/api/run';
import * as eventsRoute from '~/routes/api/run-events';
import { stopReplayPool } from '~/services/replay-pool.server';
import { callApi } from './factories/api';
import { batchOf, createFillFor, createOpenRound, eventOf, runBodyOf } from './factories/run';
import { createLoginSession } from './factories/user';

let place: Awaited<ReturnType<typeof createFillFor>>;
let cookie: string;

beforeAll(async () => {
  place = await createFillFor(await createOpenRound());
  cookie = await createLoginSession(place.owner.id);
});
afterAll(async () => {
  await resultsSettled();
  await stopReplayPool();
});

const send = (body: unknown, more: object = {}) =>
  callApi(eventsRoute, { method: 'POST', params: { runId: place.runId }, cookie, body, ...more });
const stored = () => RunEvent.count({ where: { runId: place.runId } });
const good = () => eventOf({ type: 'cut-out' });
const sendOne = (event: object) => send({ ...batchOf([]), events: [event] });

describe('sending events', () => {
  it('stores a batch and answers its numbers and the server’s time', async () => {
    const before = await stored();
    const batch = batchOf([good(), good()]);
    const { status, json, headers } = await send(batch);
    expect(status).toBe(200);
    expect(json).toEqual({
      stored: batch.events.map(({ id }, index) => ({ id, seq: before + index + 1 })),
      lastSeq: before + 2,
      endedSeq: null,
    });
    expect(Math.abs(Number(headers.get('X-Server-Time')) - Date.now())).toBeLessThan(60_000);
    const read = await callApi(eventsRoute, {
      params: { runId: place.runId },
      cookie,
      query: `?after=${before}`,
    });
    expect(read.json.events).toEqual(
      batch.events.map((event, index) => ({
        seq: before + index + 1,
        side: 'wheel',
        deviceId: batch.deviceId,
        event,
      })),
    );
  });

  it('stores nothing of a batch with bad items, and names every one with what is expected', async () => {
    const before = await stored();
    const bad = [
      good(),
      { ...good(), type: 'launch' },
      eventOf({ type: 'tire-reading', kpa: 1400.5 }),
      good(),
      { ...eventOf({ type: 'tire-reading', kpa: 1 }), kpa: '690' },
      { ...good(), atMs: -1 },
      { ...good(), extra: 1 },
    ];
    const { status, json, headers } = await send({ ...batchOf([]), events: bad });
    expect(status).toBe(400);
    expect(headers.get('Content-Type')).toMatch(/^application\/problem\+json/);
    expect(json).toMatchObject({ status: 400, code: 'bad-input', title: 'bad input' });
    expect(json.errors).toMatchObject(
      [
        { index: 1, field: 'events.type', value: 'launch', expected: /^one of engine, / },
        { index: 2, field: 'events.kpa', value: 1400.5, expected: /0 to 1400 kPa/ },
        { index: 4, field: 'events.kpa', value: '690', expected: /0 to 1400 kPa/ },
        { index: 5, field: 'events.atMs', value: -1, expected: /milliseconds.*24 h/ },
        { index: 6, expected: /without "extra"/ },
      ].map(({ expected, ...rest }) => ({ ...rest, expected: expect.stringMatching(expected) })),
    );
    expect(await stored()).toBe(before);
  });

  it.each([
    ['a day and a millisecond', { atMs: 86_400_001 }],
    ['half a millisecond', { atMs: 0.5 }],
    ['a time that is a text', { atMs: '10' }],
    ['no time', { atMs: undefined }],
    ['no number for a pressure (JSON of NaN)', { type: 'tire-reading', kpa: Number.NaN }],
    ['a pressure below vacuum', { type: 'tire-reading', kpa: -0.1 }],
    ['no id', { id: undefined }],
    ['an id that is none', { id: 'seven' }],
    ['a device time that is none', { deviceTime: 'yesterday' }],
    ['an unknown source', { type: 'supply-reading', kpa: 700, source: 'ear' }],
    ['an unknown call', { type: 'call-shown', call: 'run' }],
    ['an unknown end', { type: 'ended', how: 'bored' }],
  ])('refuses %s', async (_, change) => {
    const before = await stored();
    const { status, json } = await sendOne({ ...good(), ...change });
    expect(status).toBe(400);
    expect(json.errors[0]).toMatchObject({ index: 0, expected: expect.stringMatching(/\w+/) });
    expect(await stored()).toBe(before);
  });

  it('takes the whole day: 0 and 24 h', async () => {
    const batch = batchOf([
      { ...good(), atMs: 0 },
      { ...good(), atMs: 86_400_000 },
    ]);
    expect((await send(batch)).status).toBe(200);
  });

  it('refuses another version, an empty and an endless batch', async () => {
    const batch = batchOf([good()]);
    for (const body of [
      { ...batch, v: 2 },
      { ...batch, events: [] },
      { ...batch, events: Array.from({ length: 501 }, good) },
      { ...batch, deviceId: 'mine' },
      null,
      [],
    ]) {
      expect((await send(body)).status).toBe(400);
    }
  });

  it('refuses what is no JSON, and a form, and a body that is too large', async () => {
    expect((await send('{"v":')).status).toBe(400);
    const form = await send('v=1', { contentType: 'application/x-www-form-urlencoded' });
    expect([form.status, form.json.code]).toEqual([415, 'wrong-type']);
    expect((await send(' '.repeat(1_000_001))).status).toBe(413);
  });

  it('answers 401 to nobody, 404 to an unknown fill, 400 to an id that is none, 405 to PUT', async () => {
    const batch = batchOf([good()]);
    expect((await send(batch, { cookie: undefined })).status).toBe(401);
    expect((await send(batch, { params: { runId: randomUUID() } })).status).toBe(404);
    const malformed = await send(batch, { params: { runId: '1 OR 1=1' } });
    expect(malformed.status).toBe(400);
    expect(malformed.json.errors).toMatchObject([{ field: 'runId', value: '1 OR 1=1' }]);
    expect((await send(batch, { method: 'PUT' })).status).toBe(405);
  });

  it.each(['-1', 'x', '1.5', ''])('refuses to read after "%s"', async (after) => {
    const read = await callApi(eventsRoute, {
      params: { runId: place.runId },
      cookie,
      query: `?after=${after}`,
    });
    expect(read.status).toBe(after === '' ? 200 : 400);
  });
});

describe('starting a fill over the wire', () => {
  const put = (body: object, runId = randomUUID()) =>
    callApi(runRoute, { method: 'PUT', params: { runId }, cookie, body });

  it('refuses a set-up out of range and names the field in it', async () => {
    const body = runBodyOf(place.roundId, place.tires['tag-left'] ?? randomUUID());
    const { tire } = body.setup;
    const wrong = [
      [{ ...tire, startKpa: 1401 }, 'setup.tire.startKpa'],
      [{ ...tire, toleranceKpa: 0 }, 'setup.tire.toleranceKpa'],
      [{ ...tire, volumeL: -3 }, 'setup.tire.volumeL'],
      [{ ...tire, targetKpa: 900, limitKpa: 800 }, 'setup.tire.targetKpa'],
    ] as const;
    for (const [changed, field] of wrong) {
      const { status, json } = await put({ ...body, setup: { ...body.setup, tire: changed } });
      expect(status).toBe(400);
      expect(json.errors).toMatchObject([{ field }]);
    }
    expect(await Run.count({ where: { roundId: place.roundId } })).toBe(1);
  });

  it('refuses an unknown kind of run', async () => {
    const { kind, ...body } = runBodyOf(place.roundId, randomUUID());
    const { status, json } = await put(versioned({ ...body, kind: 'race' }));
    expect([status, kind]).toEqual([400, 'fill']);
    expect(json.errors).toMatchObject([{ field: 'kind', value: 'race', expected: 'one of fill' }]);
  });
});
