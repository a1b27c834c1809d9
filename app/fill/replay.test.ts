import { describe, expect, it } from 'vitest';
import type { FillEvent, FillSetup } from '~/air';
import { chuckSpans } from './chuck-spans';
import type { LogEntry } from './log';
import { replayFill } from './replay';
import type { WireEvent } from './wire-events';

const chuck = (at: number, on: boolean, id = `${at}`): FillEvent => ({ type: 'chuck', on, at, id });

describe('when the chuck was on', () => {
  it('pairs on with off', () => {
    expect(
      chuckSpans([chuck(1, true), chuck(4, false), chuck(9, true), chuck(11, false)], 20),
    ).toEqual([
      { from: 1, to: 4 },
      { from: 9, to: 11 },
    ]);
  });

  it('takes on twice for no change, and off without on for nothing', () => {
    const events = [
      chuck(0, false),
      chuck(1, true),
      chuck(2, true),
      chuck(4, false),
      chuck(5, false),
    ];
    expect(chuckSpans(events, 20)).toEqual([{ from: 1, to: 4 }]);
  });

  it('lasts until the end when it was never taken off', () => {
    expect(chuckSpans([chuck(1, true)], 20)).toEqual([{ from: 1, to: 20 }]);
  });

  it('leaves out what was taken back', () => {
    const back: FillEvent = { type: 'taken-back', of: '4', at: 6 };
    expect(chuckSpans([chuck(1, true), chuck(4, false), back], 20)).toEqual([{ from: 1, to: 20 }]);
  });
});

const setup: FillSetup = {
  tire: { startKpa: 760, targetKpa: 790, toleranceKpa: 7, volumeL: 140, limitKpa: 827 },
  rig: { gauge: 'above-valve', valve: false, stepKpa: 7 },
  seed: 9,
};
const logOf = (events: { at: number; [field: string]: unknown }[]): LogEntry[] =>
  events.map(({ at, ...own }, place) => ({
    event: { id: `e${place}`, ...own, atMs: at * 1000 } as unknown as WireEvent,
    deviceId: 'phone',
    side: 'wheel',
    seq: place + 1,
  }));
const reading = (at: number, kpa: number) => ({
  at,
  type: 'supply-reading',
  source: 'wheel-gauge',
  kpa,
  stepKpa: 7,
});

/** The chuck goes on with the supply 60 kPa below the tire, as the gauge says, for 20 s. */
const losing = logOf([
  { at: 0, type: 'engine', speed: 'idle' },
  reading(1, 700),
  reading(4, 700),
  { at: 6, type: 'chuck', on: true },
  reading(10, 705),
  reading(16, 708),
  { at: 26, type: 'chuck', on: false },
  { at: 40, type: 'tire-reading', kpa: 740 },
  { at: 45, type: 'ended', how: 'stopped' },
  { at: 60, type: 'tire-reading', kpa: 100 },
]);

describe('replaying a fill', () => {
  it('finds the air that was lost to a supply below the tire, and for how long', () => {
    const { result } = replayFill(setup, losing);
    expect(result).toMatchObject({
      startKpa: 760,
      endKpa: 740,
      targetKpa: 790,
      seconds: 45,
      secondsOn: 20,
      timesOn: 1,
      outcome: 'stopped',
    });
    expect(result.secondsBelow).toBeGreaterThan(15);
    expect(result.secondsBelow).toBeLessThanOrEqual(20);
    expect(result.lostKpa).toBeGreaterThan(1);
    expect(result.lowestSupplyKpa).toBeLessThan(760);
  });

  it('finds none lost when the supply was well above', () => {
    const log = logOf([
      reading(1, 830),
      reading(3, 830),
      { at: 5, type: 'chuck', on: true },
      { at: 15, type: 'chuck', on: false },
      { at: 30, type: 'ended', how: 'done' },
    ]);
    const { result } = replayFill(setup, log);
    expect(result).toMatchObject({ lostKpa: 0, secondsBelow: 0, secondsOn: 10, endKpa: null });
  });

  it('samples from the start to the end, at every event, rising', () => {
    const { samples } = replayFill(setup, losing);
    const times = samples.map(({ at }) => at);
    expect([times[0], times.at(-1)]).toEqual([0, 45]);
    for (const { event } of losing.slice(0, 8)) expect(times).toContain(event.atMs / 1000);
    expect(times).toEqual([...new Set(times)].sort((a, b) => a - b));
    for (const { supplyKpa } of samples) {
      expect(supplyKpa.p10).toBeLessThanOrEqual(supplyKpa.p50);
      expect(supplyKpa.p50).toBeLessThanOrEqual(supplyKpa.p90);
    }
  });

  it('does not depend on the order in which the log came', () => {
    const turned = [...losing].reverse();
    const isSame =
      JSON.stringify(replayFill(setup, turned)) === JSON.stringify(replayFill(setup, losing));
    expect(isSame).toBe(true);
  });

  it('goes up to the last tap of a fill that is open, and takes an empty log', () => {
    const open = replayFill(setup, losing.slice(0, 4));
    expect(open.result).toMatchObject({ outcome: null, seconds: 6, secondsOn: 0 });
    expect(replayFill(setup, []).result).toMatchObject({ seconds: 0, timesOn: 0, endKpa: null });
  });

  it('looks no further than ten minutes after the last tap', () => {
    const left = logOf([reading(5, 700), { at: 86_400, type: 'ended', how: 'stopped' }]);
    const { result, samples } = replayFill(setup, left);
    expect(result.seconds).toBe(86_400);
    expect(samples.at(-1)?.at).toBe(605);
    expect(samples.length).toBeLessThan(500);
  });
});
