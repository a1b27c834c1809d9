import type { Call, FillEvent } from '~/air';
import { chuckSpans, type TimeSpan } from '~/fill/chuck-spans';
import type { TraceSample } from '~/fill/replay';
import { type PressureUnit, pressureRange } from '~/units';
import { callWords, type EntryLine, entryLine } from './entry-words';
import type { ReviewEntry, ReviewTrace } from './review-model';

/** One point of the curves. Pressures are gauge kPa; times are seconds since the start. */
export interface CurvePoint {
  at: number;
  supply: number;
  /** 80 % of the estimate lies between these. */
  band: [number, number];
  tire: number;
  /** Supply and tire, where the chuck was on though the supply was below the tire. */
  lack: [number, number] | null;
}

export type ReadingKind = 'wheel-gauge' | 'dash-gauge' | 'sensor' | 'tire';

export interface ReadingDot {
  at: number;
  kpa: number;
  kind: ReadingKind;
}

export interface ShownCall {
  at: number;
  call: Call;
  words: string;
}

export interface ChartView {
  /** Seconds: the end of the fill, or of what is known of it. */
  until: number;
  points: CurvePoint[];
  readings: ReadingDot[];
  onSpans: TimeSpan[];
  calls: ShownCall[];
  targetKpa: number;
}

/** One row of the table. */
export interface TableLine extends EntryLine {
  id: string;
  at: number;
  clockAt: Date;
  fromCab: boolean;
  /** The estimate at that time; undefined after the fill's end. */
  supply: { p10: number; p50: number; p90: number } | undefined;
  tire: number | undefined;
}

/** What the chart draws. Only what counted is drawn; the table has the rest. */
export function chartOf(trace: ReviewTrace): ChartView {
  const used = trace.entries.filter(({ use }) => use === 'used');
  const until = Math.max(1, trace.samples.at(-1)?.at ?? 0, ...used.map(secondsOf));
  const onSpans = chuckSpans(used.flatMap(chuckOf), until);
  return {
    until,
    points: curveOf(trace.samples, onSpans),
    readings: used.flatMap(dotOf),
    onSpans,
    calls: callsOf(used, trace.valve),
    targetKpa: trace.targetKpa,
  };
}

/** Every event in words, by time, with the estimate of that time. */
export function linesOf(trace: ReviewTrace, unit: PressureUnit): TableLine[] {
  const byId = new Map(trace.entries.map(({ event }) => [event.id, event]));
  return trace.entries.map((entry) => {
    const { event } = entry;
    const at = secondsOf(entry);
    const undone = event.type === 'taken-back' ? byId.get(event.of) : undefined;
    const sample = sampleAt(trace.samples, at);
    return {
      ...entryLine(entry, { valve: trace.valve, unit, undone }),
      id: event.id,
      at,
      clockAt: new Date(trace.startedAt.getTime() + event.atMs),
      fromCab: entry.side === 'cab',
      supply: sample?.supplyKpa,
      tire: sample?.tireKpa.p50,
    };
  });
}

const secondsOf = ({ event }: ReviewEntry) => event.atMs / 1000;

function chuckOf(entry: ReviewEntry): FillEvent[] {
  const { event } = entry;
  return event.type === 'chuck' ? [{ type: 'chuck', on: event.on, at: secondsOf(entry) }] : [];
}

function dotOf(entry: ReviewEntry): ReadingDot[] {
  const { event } = entry;
  const at = secondsOf(entry);
  if (event.type === 'tire-reading') return [{ at, kpa: event.kpa, kind: 'tire' }];
  if (event.type === 'supply-reading') return [{ at, kpa: event.kpa, kind: event.source }];
  return [];
}

/** A call that is said again without another between is one call. */
function callsOf(used: readonly ReviewEntry[], valve: boolean): ShownCall[] {
  const calls: ShownCall[] = [];
  for (const entry of used) {
    if (entry.event.type !== 'call-shown') continue;
    const { call } = entry.event;
    if (calls.at(-1)?.call === call) continue;
    calls.push({ at: secondsOf(entry), call, words: callWords(call, valve) });
  }
  return calls;
}

/**
 * The samples with a point of its own at each edge of a hold and wherever supply and tire meet, so
 * that the hatch begins and ends where it should.
 */
function curveOf(samples: readonly TraceSample[], onSpans: readonly TimeSpan[]): CurvePoint[] {
  const times = new Set(samples.map(({ at }) => at));
  for (const { from, to } of onSpans) times.add(from).add(to);
  for (const at of meetings(samples)) times.add(at);
  return [...times]
    .sort((a, b) => a - b)
    .flatMap((at) => {
      const sample = sampleAt(samples, at);
      return sample ? pointOf(sample, onSpans) : [];
    });
}

function pointOf(
  { at, supplyKpa, tireKpa }: TraceSample,
  onSpans: readonly TimeSpan[],
): CurvePoint {
  const isOn = onSpans.some(({ from, to }) => at >= from && at <= to);
  // A hair of tolerance: at a meeting the two differ by a rounding error.
  const isBelow = supplyKpa.p50 <= tireKpa.p50 + 1e-6;
  return {
    at,
    supply: supplyKpa.p50,
    band: [asPressure(supplyKpa.p10), asPressure(supplyKpa.p90)],
    tire: tireKpa.p50,
    lack: isOn && isBelow ? [supplyKpa.p50, tireKpa.p50] : null,
  };
}

/** Keeps the edges of a very unsure estimate inside of what a gauge pressure can be. */
const asPressure = (kpa: number) =>
  Math.min(pressureRange.maximum, Math.max(pressureRange.minimum, kpa));

/** The times at which the middle estimates of supply and tire are the same. */
function meetings(samples: readonly TraceSample[]): number[] {
  const headroom = ({ supplyKpa, tireKpa }: TraceSample) => supplyKpa.p50 - tireKpa.p50;
  return samples.flatMap((sample, index) => {
    const next = samples[index + 1];
    if (!next) return [];
    const [before, after] = [headroom(sample), headroom(next)];
    if (before * after >= 0) return [];
    return [sample.at + ((next.at - sample.at) * before) / (before - after)];
  });
}

/** The estimate at a time, on a straight line between two samples; undefined outside of them. */
export function sampleAt(samples: readonly TraceSample[], at: number): TraceSample | undefined {
  const index = samples.findIndex((sample) => sample.at >= at);
  const after = samples[index];
  const before = samples[index - 1];
  if (!after || after.at === at) return after;
  if (!before) return undefined;
  const share = (at - before.at) / (after.at - before.at);
  const blend = (key: 'supplyKpa' | 'tireKpa') => ({
    p10: between(before[key].p10, after[key].p10, share),
    p50: between(before[key].p50, after[key].p50, share),
    p90: between(before[key].p90, after[key].p90, share),
  });
  return { at, supplyKpa: blend('supplyKpa'), tireKpa: blend('tireKpa') };
}

const between = (from: number, to: number, share: number) => from + (to - from) * share;
