import { describe, expect, it } from 'vitest';
import type { TraceSample } from '~/fill/replay';
import type { WireEvent } from '~/fill/wire-events';
import type { ReviewEntry, ReviewTrace } from './review-model';
import { chartOf, linesOf, sampleAt } from './review-view';

const spread = (kpa: number) => ({ p10: kpa - 10, p50: kpa, p90: kpa + 10 });
const sample = (at: number, supply: number, tire: number): TraceSample => ({
  at,
  supplyKpa: spread(supply),
  tireKpa: spread(tire),
});

let seq = 0;
type Said = Record<string, unknown> & { type: WireEvent['type'] };
function entry(at: number, event: Said, use: ReviewEntry['use'] = 'used'): ReviewEntry {
  seq += 1;
  const stamp = { id: `e${seq}`, atMs: at * 1000, deviceSeq: seq, offsetMs: 0, suspect: false };
  const deviceTime = '2026-11-14T16:00:00.000Z';
  return { seq, side: 'wheel', use, event: { ...stamp, deviceTime, ...event } as WireEvent };
}

const traceOf = (samples: TraceSample[], entries: ReviewEntry[]): ReviewTrace => ({
  startedAt: new Date('2026-11-14T16:12:05Z'),
  timeZone: 'America/Denver',
  valve: false,
  targetKpa: 720,
  samples,
  entries,
});

const on = (at: number) => entry(at, { type: 'chuck', on: true });
const off = (at: number) => entry(at, { type: 'chuck', on: false });

describe('the chart of a fill', () => {
  it('hatches only while the chuck is on and the supply is below the tire', () => {
    const samples = [sample(0, 650, 700), sample(10, 650, 700), sample(30, 750, 700)];
    const { points } = chartOf(traceOf(samples, [on(10), off(30)]));
    const hatched = points.filter(({ lack }) => lack !== null).map(({ at }) => at);
    // From 650 to 750 in 20 s: the supply meets the tire's 700 halfway.
    expect(hatched).toEqual([10, 20]);
  });

  it('hatches nothing while the chuck is off', () => {
    const samples = [sample(0, 600, 700), sample(60, 620, 700)];
    expect(chartOf(traceOf(samples, [])).points.every(({ lack }) => lack === null)).toBe(true);
  });

  it('has a point at each edge of a hold', () => {
    const samples = [sample(0, 750, 700), sample(60, 760, 710)];
    const { points, onSpans } = chartOf(traceOf(samples, [on(13), on(15), off(42)]));
    expect(onSpans).toEqual([{ from: 13, to: 42 }]);
    expect(points.map(({ at }) => at)).toEqual([0, 13, 42, 60]);
  });

  it('draws only what counted', () => {
    const reading = { type: 'supply-reading', source: 'dash-gauge', kpa: 640 } as const;
    const entries = [
      entry(1, reading),
      entry(2, reading, 'taken-back'),
      entry(9, reading, 'after-end'),
    ];
    const { readings } = chartOf(traceOf([sample(0, 640, 700), sample(5, 640, 700)], entries));
    expect(readings).toEqual([{ at: 1, kpa: 640, kind: 'dash-gauge' }]);
  });

  it('names a call once when it is said twice in a row', () => {
    const said = (at: number, call: string) => entry(at, { type: 'call-shown', call });
    const entries = [said(0, 'wait'), said(1, 'wait'), said(4, 'chuck-on'), said(9, 'wait')];
    const { calls } = chartOf(traceOf([sample(0, 700, 700), sample(9, 700, 700)], entries));
    expect(calls.map(({ at, words }) => `${at} ${words}`)).toEqual([
      '0 Wait',
      '4 Put it on',
      '9 Wait',
    ]);
  });

  it('keeps the edges of a very unsure estimate within what a pressure can be', () => {
    const wild = { at: 0, supplyKpa: { p10: -1e12, p50: 700, p90: 1e12 }, tireKpa: spread(700) };
    expect(chartOf(traceOf([wild], [])).points[0]?.band).toEqual([0, 1400]);
  });
});

describe('the table of a fill', () => {
  it('says what happened in words, with what was read and the estimate of that time', () => {
    const entries = [
      entry(5, { type: 'supply-reading', source: 'wheel-gauge', kpa: 655 }),
      entry(10, { type: 'call-shown', call: 'chuck-off' }),
      entry(20, { type: 'ended', how: 'stopped' }, 'already-ended'),
    ];
    const lines = linesOf(traceOf([sample(0, 600, 700), sample(10, 700, 710)], entries), 'psi');
    expect(lines.map(({ words, kpa, unused }) => ({ words, kpa, unused }))).toEqual([
      { words: 'Read the gauge at the wheel', kpa: 655, unused: undefined },
      { words: '“Take it off”', kpa: undefined, unused: undefined },
      { words: 'Ended before it was done', kpa: undefined, unused: 'already ended, not used' },
    ]);
    expect(lines[0]).toMatchObject({ supply: { p50: 650 }, tire: 705 });
    expect(lines[0]?.clockAt).toEqual(new Date('2026-11-14T16:12:10Z'));
    expect(lines[2]?.supply).toBeUndefined();
  });

  it('names what was taken back', () => {
    const tap = entry(3, { type: 'cut-out' }, 'taken-back');
    const undo = entry(4, { type: 'taken-back', of: tap.event.id });
    const lines = linesOf(traceOf([], [tap, undo]), 'psi');
    expect(lines[0]?.unused).toBe('taken back');
    expect(lines[1]?.words).toBe('Took back: It purged');
  });
});

describe('the estimate between two samples', () => {
  it('lies on a straight line, and is unknown outside of them', () => {
    const samples = [sample(0, 600, 700), sample(10, 700, 710)];
    expect(sampleAt(samples, 2.5)?.supplyKpa.p50).toBe(625);
    expect(sampleAt(samples, 11)).toBeUndefined();
    expect(sampleAt([], 0)).toBeUndefined();
  });
});
