import { beforeEach, describe, expect, it } from 'vitest';
import {
  acknowledgeCautions,
  closeRound,
  endFill,
  recordColdReading,
  startFill,
  startRound,
  takeBack,
  tap,
} from './commands';
import { openDevice } from './device';
import { endOf, fillEventsOf } from './log';
import { memoryStorage } from './outbox-storage';
import { createPhone, type Phone } from './phone';
import { newestReadings } from './store';
import {
  afterwardsKeys,
  cautionsBody,
  closingBody,
  eventsBody,
  readingBody,
  roundBody,
  runBody,
} from './wire';

const epoch = Date.UTC(2026, 4, 4, 9);
let ms: number;
let phone: Phone;
let requests: { address: string; method: string; body: Record<string, unknown> }[];
/** What the server answers to a batch of events, by place. */
let numbering: boolean;

beforeEach(() => {
  ms = 0;
  requests = [];
  numbering = true;
  phone = createPhone({
    ticks: { monotonic: () => ms, wall: () => epoch + ms },
    device: openDevice(undefined),
    storage: memoryStorage(),
    after: () => () => {},
    random: () => 0.5,
    fetch: async (address, init) => {
      const body = JSON.parse(String(init.body));
      requests.push({ address, method: String(init.method), body });
      if (!numbering) throw new TypeError('no network');
      const ids = (body.events ?? []).map(({ id }: { id: string }) => id);
      const stored = ids.map((id: string, place: number) => ({ id, seq: place + 1 }));
      return Response.json({ stored }, { headers: { 'X-Server-Time': String(epoch + ms) } });
    },
  });
});

const round = {
  coachId: '3f0c8a52-6b1e-4d0f-9a7c-2e5d8b914c66',
  place: 'Larch Hollow',
  altitudeM: 300,
  ambientC: 12,
  timeZone: 'America/Denver',
  withHelper: true,
};
const tireId = '9c1b1c9e-31a7-4f55-8d20-5b7a6c0f2e11';
const setup = {
  tire: { startKpa: 690, targetKpa: 724, toleranceKpa: 7, volumeL: 140 },
  seed: 3,
};
const sentAll = () => expect.poll(() => phone.outbox.state().pending).toBe(0);
const startTestFill = (roundId: string) =>
  startFill({ roundId, coachId: round.coachId, tireId, position: 'steer-left', setup }, phone);

describe('commands on the phone', () => {
  it('show at once and send bodies that the server takes, in causal order', async () => {
    const roundId = startRound(round, phone);
    acknowledgeCautions(roundId, phone);
    const readingId = recordColdReading(roundId, { tireId, kpa: 689.5, warm: false }, phone);
    const runId = startTestFill(roundId);
    ms = 1500;
    const chuck = tap(runId, { type: 'chuck', on: true }, 1.25, phone);
    takeBack(runId, chuck, phone);
    ms = 1501;
    endFill(runId, 'stopped', phone);
    closeRound(roundId, afterwardsKeys, phone);

    const state = phone.store.getState();
    expect(state.rounds[roundId]).toMatchObject({
      place: 'Larch Hollow',
      startedAt: '2026-05-04T09:00:00.000Z',
      cautionsAt: '2026-05-04T09:00:00.000Z',
      closedAt: '2026-05-04T09:00:01.501Z',
      readings: [{ id: readingId, kpa: 689.5 }],
    });
    const log = state.runs[runId]!.log;
    expect(log.map(({ event }) => [event.type, event.atMs])).toEqual([
      ['chuck', 1250],
      ['taken-back', 1500],
      ['ended', 1501],
    ]);
    expect(endOf(log)?.how).toBe('stopped');
    await sentAll();
    expect(requests.map(({ method, address }) => `${method} ${address}`)).toEqual([
      `PUT /api/v1/rounds/${roundId}`,
      `PUT /api/v1/rounds/${roundId}/cautions`,
      `PUT /api/v1/rounds/${roundId}/readings/${readingId}`,
      `PUT /api/v1/runs/${runId}`,
      `POST /api/v1/runs/${runId}/events`,
      `PUT /api/v1/rounds/${roundId}/closing`,
    ]);
    const schemas = [roundBody, cautionsBody, readingBody, runBody, eventsBody, closingBody];
    schemas.forEach((schema, place) => {
      expect(schema.parse(requests[place]?.body)).toEqual(requests[place]?.body);
    });
    expect(phone.store.getState().runs[runId]!.log.map(({ seq }) => seq)).toEqual([1, 2, 3]);
  });

  it('work without signal, and say how much is not sent', async () => {
    numbering = false;
    const roundId = startRound(round, phone);
    const runId = startTestFill(roundId);
    tap(runId, { type: 'cut-out' }, undefined, phone);
    expect(fillEventsOf(phone.store.getState().runs[runId]!.log)).toMatchObject([
      { type: 'cut-out', at: 0 },
    ]);
    await expect.poll(() => phone.store.getState().outbox.retrying).toBe(true);
    expect(phone.store.getState().outbox).toMatchObject({ pending: 3, refused: [] });
  });

  it('stamp taps with the device’s count, its own time and the offset used', async () => {
    const roundId = startRound(round, phone);
    const runId = startTestFill(roundId);
    const first = tap(runId, { type: 'cut-out' }, undefined, phone);
    await sentAll();
    ms = 2000.4;
    const second = tap(runId, { type: 'cut-in' }, undefined, phone);
    const [a, b] = phone.store.getState().runs[runId]!.log.map(({ event }) => event);
    expect(a).toMatchObject({ id: first, offsetMs: null, suspect: true, deviceSeq: 1, atMs: 0 });
    expect(b).toMatchObject({ id: second, offsetMs: 0, suspect: false, deviceSeq: 2, atMs: 2000 });
  });

  it('let the reading of a tire that was read last count', () => {
    const roundId = startRound(round, phone);
    recordColdReading(roundId, { tireId, kpa: 600, warm: false }, phone);
    ms = 1000;
    recordColdReading(roundId, { tireId, kpa: 610, warm: true }, phone);
    const state = phone.store.getState().rounds[roundId]!;
    expect(newestReadings(state).get(tireId)).toMatchObject({ kpa: 610, warm: true });
  });
});
