// @vitest-environment happy-dom
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { catchUp, keepCaughtUp } from './catch-up';
import { startFill, tap } from './commands';
import { openDevice } from './device';
import { memoryStorage } from './outbox-storage';
import { createPhone, listen, type Phone } from './phone';
import { putRun, type RunState } from './store';
import { storeSource } from './store-source';
import type { StoredEvent } from './wire';

const epoch = Date.UTC(2026, 4, 4, 9);
let ms: number;
let online: boolean;
let phone: Phone;
let calls: { method: string; address: string }[];
/** What the server has of the fill's log. */
let served: StoredEvent[];

beforeEach(() => {
  vi.useFakeTimers();
  [ms, online, calls, served] = [0, true, [], []];
  phone = createPhone({
    ticks: { monotonic: () => ms, wall: () => epoch + ms },
    device: openDevice(undefined),
    storage: memoryStorage(),
    after: () => () => {},
    random: () => 0,
    fetch: async (address, { method = 'GET', body }) => {
      calls.push({ method, address });
      if (!online) throw new TypeError('no network');
      const sent: { id: string }[] = body ? (JSON.parse(String(body)).events ?? []) : [];
      const stored = sent.map(({ id }, place) => ({ id, seq: 101 + place }));
      const json = { stored, events: served, lastSeq: 0, endedSeq: null };
      return Response.json(json, { headers: { 'X-Server-Time': String(epoch + ms) } });
    },
  });
});
afterEach(() => vi.useRealTimers());

const setup = { tire: { startKpa: 690, targetKpa: 724, toleranceKpa: 7, volumeL: 140 }, seed: 3 };
const place = {
  roundId: 'round',
  coachId: 'coach',
  tireId: 'tire',
  position: 'steer-left',
} as const;
const start = () => startFill({ ...place, setup }, phone);
const settled = () => vi.advanceTimersByTimeAsync(0);
const posts = () => calls.filter(({ method }) => method === 'POST').length;

const told = (seq: number, atMs: number): StoredEvent => ({
  seq,
  side: 'cab',
  deviceId: 'other',
  event: {
    type: 'cut-out',
    id: `from-the-cab-${seq}`,
    atMs,
    deviceSeq: seq,
    deviceTime: new Date(epoch + atMs).toISOString(),
    offsetMs: 0,
    suspect: false,
  },
});

describe('a phone tied to its page', () => {
  it('sends what is left when the page goes, and asks the person first', async () => {
    listen(phone, window);
    const runId = start();
    await settled();
    online = false;
    tap(runId, { type: 'cut-out' }, 1, phone);
    await settled();
    const before = posts();
    const going = new Event('beforeunload', { cancelable: true });
    window.dispatchEvent(going);
    expect(going.defaultPrevented).toBe(true);
    window.dispatchEvent(new Event('pagehide'));
    expect(posts()).toBe(before + 1);
    online = true;
    window.dispatchEvent(new Event('online'));
    await settled();
    expect(phone.outbox.state().pending).toBe(0);
    const again = new Event('beforeunload', { cancelable: true });
    window.dispatchEvent(again);
    expect(again.defaultPrevented).toBe(false);
  });
});

describe('catching up', () => {
  it('merges what another phone tapped, and asks after the last number it has', async () => {
    const runId = start();
    served = [told(1, 500), told(2, 900)];
    await catchUp(phone, runId);
    expect(phone.store.getState().runs[runId]?.log.map(({ seq }) => seq)).toEqual([1, 2]);
    await catchUp(phone, runId);
    expect(calls.at(-1)?.address).toBe(`/api/v1/runs/${runId}/events?after=2`);
    expect(phone.store.getState().runs[runId]?.log).toHaveLength(2);
  });

  it('changes nothing without signal, or for a fill that is not here', async () => {
    const runId = start();
    online = false;
    await catchUp(phone, runId);
    await catchUp(phone, 'nowhere');
    expect(phone.store.getState().runs[runId]?.log).toEqual([]);
  });

  it('asks on opening, soon after for what the former page still sent, and stops when told', async () => {
    const runId = start();
    await settled();
    const gets = () => calls.filter(({ method }) => method === 'GET').length;
    const stop = keepCaughtUp(phone, runId, window);
    expect(gets()).toBe(1);
    await vi.advanceTimersByTimeAsync(1500);
    expect(gets()).toBe(2);
    await vi.advanceTimersByTimeAsync(10_000);
    expect(gets()).toBe(4);
    stop();
    await vi.advanceTimersByTimeAsync(60_000);
    expect(gets()).toBe(4);
  });
});

describe('the live screen’s source', () => {
  const open = (runId: string, onMayNotEnd = () => {}) =>
    storeSource(phone, runId, { tireName: 'Steer left', unit: 'psi', onMayNotEnd });

  it('shows a tap at once and tells its listeners, with the time of the press', () => {
    const runId = start();
    const source = open(runId);
    let changes = 0;
    const stop = source.subscribe(() => {
      changes += 1;
    });
    ms = 2500;
    expect(source.now()).toBe(2.5);
    const id = source.tap({ type: 'chuck', on: true }, 2.25);
    expect(source.events()).toEqual([{ type: 'chuck', on: true, at: 2.25, id }]);
    expect(source.events()).toBe(source.events());
    source.takeBack(id);
    expect(source.events()).toContainEqual(expect.objectContaining({ type: 'taken-back', of: id }));
    expect(changes).toBe(2);
    stop();
    expect(source.wallClock(62.5).getTime()).toBe(epoch + 62_500);
  });

  it.each([
    ['done', 'done'],
    ['cannot-reach', 'cannot-reach'],
    ['wait', 'stopped'],
  ] as const)('ends as the screen last said: %s is %s', (call, how) => {
    const runId = start();
    const source = open(runId);
    source.tap({ type: 'call-shown', call: 'read-supply' }, 1);
    source.tap({ type: 'call-shown', call }, 2);
    expect(source.ended()).toBe(false);
    ms = 3000;
    source.end();
    expect(source.ended()).toBe(true);
    const last = phone.store.getState().runs[runId]?.log.at(-1)?.event;
    expect(last).toMatchObject({ type: 'ended', how, atMs: 3000 });
  });

  it('ends nothing for a helper, who is told', () => {
    const runId = start();
    const run = phone.store.getState().runs[runId] as RunState;
    putRun(phone.store, { ...run, id: 'helped', mayEnd: false });
    const onMayNotEnd = vi.fn();
    const source = open('helped', onMayNotEnd);
    source.end();
    expect(onMayNotEnd).toHaveBeenCalledOnce();
    expect(source.ended()).toBe(false);
  });
});
