import { describe, expect, it } from 'vitest';
import { createClock } from './clock';
import { createRunTimes } from './run-times';
import type { RunState } from './store';
import type { WireEvent } from './wire-events';

const epoch = Date.UTC(2026, 4, 4, 9);

/** A page that opened at `openedMs` after the fill's start on a phone that is `wrongBy` off. */
function page(openedMs: number, wrongBy = 0) {
  let real = openedMs;
  const ticks = { monotonic: () => real - openedMs, wall: () => epoch + real + wrongBy };
  const clock = createClock(ticks);
  return {
    clock,
    times: createRunTimes(clock, 'this'),
    pass: (ms: number) => {
      real += ms;
    },
    ask: () => {
      const now = clock.monotonic();
      clock.sample({ sentAt: now, receivedAt: now, serverTime: epoch + real });
    },
  };
}

const runOf = (taps: { deviceId: string; atMs: number; deviceTime: number }[]): RunState =>
  ({
    id: 'run',
    startedAt: new Date(epoch).toISOString(),
    log: taps.map(({ deviceId, atMs, deviceTime }) => ({
      deviceId,
      event: { atMs, deviceTime: new Date(deviceTime).toISOString() } as WireEvent,
    })),
  }) as unknown as RunState;

describe('time since a fill’s start', () => {
  it('is the monotonic clock’s on the page that began it, whatever the server says', () => {
    const { times, pass, ask } = page(0, 3_600_000);
    times.begin('run');
    pass(1234.5);
    expect(times.elapsedMs(runOf([]))).toBe(1234.5);
    ask();
    expect(times.elapsedMs(runOf([]))).toBe(1234.5);
  });

  it('goes on after a reload from the last own tap, though the phone’s clock is an hour off', () => {
    const wrongBy = 3_600_000;
    const { times, pass } = page(10_000, wrongBy);
    const own = { deviceId: 'this', atMs: 8000, deviceTime: epoch + 8000 + wrongBy };
    const other = { deviceId: 'other', atMs: 9000, deviceTime: epoch };
    expect(times.elapsedMs(runOf([own, other]))).toBe(10_000);
    pass(500);
    expect(times.elapsedMs(runOf([own, other]))).toBe(10_500);
  });

  it('is the server’s for another phone’s fill', () => {
    const { times, ask } = page(20_000, -120_000);
    ask();
    expect(times.elapsedMs(runOf([{ deviceId: 'other', atMs: 1, deviceTime: epoch }]))).toBe(
      20_000,
    );
  });

  it('stays between 0 and 24 h', () => {
    const early = page(-5000);
    expect(early.times.elapsedMs(runOf([]))).toBe(0);
    const late = page(90_000_000);
    expect(late.times.elapsedMs(runOf([]))).toBe(86_400_000);
  });
});
