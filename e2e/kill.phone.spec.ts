import { setTimeout as wait } from 'node:timers/promises';
import { expect, test } from '@playwright/test';
import type { Phone } from '~/fill/phone';
import { testEnvironment } from '../db/setup/test-app';
import { startOwnApp } from './setup/own-app';
import { query, server } from './setup/server';

// The factories open the database that the app under test uses.
const port = Number(new URL(server.url).port);
Object.assign(process.env, testEnvironment({ ...server, port }));

/** A phone as the browser makes it, over the network to `url`, with somebody signed in. */
async function openPhone(url: string, cookie: string): Promise<Phone> {
  const { createPhone } = await import('~/fill/phone');
  const { memoryStorage } = await import('~/fill/outbox-storage');
  const { openDevice } = await import('~/fill/device');
  return createPhone({
    ticks: { monotonic: () => performance.now(), wall: () => Date.now() },
    device: openDevice(undefined),
    fetch: (path, init) =>
      fetch(url + path, { ...init, headers: { ...init.headers, Cookie: cookie } }),
    storage: memoryStorage(),
    after: (ms, then) => {
      const timer = setTimeout(then, ms);
      return () => clearTimeout(timer);
    },
    random: Math.random,
  });
}

interface Row {
  id: string;
  seq: number;
  [column: string]: unknown;
}
const rowsOf = (runId: string) =>
  query<Row>('SELECT id, seq FROM run_events WHERE run_id = $1 ORDER BY seq', [runId]);

test('a server killed in the middle of a fill loses nothing acknowledged and repeats nothing', async () => {
  test.setTimeout(180_000);
  const { createOpenRound, usualSetup } = await import('../tests/factories/run');
  const { createLoginSession } = await import('../tests/factories/user');
  const { startFill, tap, endFill } = await import('~/fill/commands');
  const { owner, coachId, roundId, tires } = await createOpenRound();
  const cookie = await createLoginSession(owner.id);
  const app = await startOwnApp();
  const phone = await openPhone(app.url, cookie);
  try {
    const tireId = tires['steer-left'];
    const place = { roundId, coachId, tireId, position: 'steer-left' as const };
    const runId = startFill({ ...place, setup: usualSetup }, phone);
    const log = () => phone.store.getState().runs[runId]?.log ?? [];
    const acknowledged = () => log().filter(({ seq }) => seq !== null);
    const tapped: string[] = [];
    /** Taps until the server is gone, and on for a while. */
    const burst = async (isGone: () => boolean) => {
      for (let after = 0; after < 30; after += isGone() ? 1 : 0) {
        tapped.push(
          tap(runId, { type: 'supply-reading', source: 'wheel-gauge', kpa: 700 }, undefined, phone),
        );
        await wait(10);
      }
    };
    for (let kill = 0; kill < 4; kill++) {
      const before = acknowledged().length;
      let gone = false;
      const tapping = burst(() => gone);
      await expect.poll(() => acknowledged().length).toBeGreaterThan(before);
      await app.kill();
      gone = true;
      const known = acknowledged().map(({ event, seq }) => ({ id: event.id, seq }));
      const stored = await rowsOf(runId);
      for (const one of known) expect(stored).toContainEqual(one);
      await tapping;
      expect(phone.outbox.state().pending).toBeGreaterThan(0);
      await app.startAgain();
      phone.outbox.flush();
      await expect.poll(() => phone.outbox.state().pending, { timeout: 40_000 }).toBe(0);
    }
    tapped.push(endFill(runId, 'stopped', phone));
    await expect.poll(() => phone.outbox.state().pending, { timeout: 40_000 }).toBe(0);
    expect(phone.outbox.state().refused).toEqual([]);

    const rows = await rowsOf(runId);
    expect(rows.map(({ seq }) => seq)).toEqual(tapped.map((_, index) => index + 1));
    expect(rows.map(({ id }) => id)).toEqual(tapped);
    const numbers = new Map(rows.map(({ id, seq }) => [id, seq]));
    for (const { event, seq } of log()) expect(numbers.get(event.id)).toBe(seq);

    // The worker of the built server computes the result.
    const results = () =>
      query('SELECT last_seq, result FROM run_results WHERE run_id = $1', [runId]);
    await expect.poll(async () => (await results()).length, { timeout: 30_000 }).toBe(1);
    expect((await results())[0]).toMatchObject({
      last_seq: tapped.length,
      result: { outcome: 'stopped', timesOn: 0 },
    });
  } finally {
    await app.stop();
  }
});
