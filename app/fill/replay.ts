import {
  type AirProfile,
  createFill,
  type Fill,
  type FillEvent,
  type FillSetup,
  type Spread,
} from '~/air';
import { chuckSpans, type TimeSpan } from './chuck-spans';
import { lastGaugedKpa } from './fill-summary';
import { endOf, fillEventsOf, mergeLog, type RunLog } from './log';
import type { Ending } from './wire-events';

/** What the engine believed at one moment of a fill, gauge kPa. */
export interface TraceSample {
  /** Seconds since the fill's start. */
  readonly at: number;
  readonly supplyKpa: Spread;
  /** Settled. */
  readonly tireKpa: Spread;
}

/** What a fill came to. Pressures are gauge kPa. */
export interface FillResult {
  readonly startKpa: number;
  /** As last gauged; null when nobody gauged it. */
  readonly endKpa: number | null;
  readonly targetKpa: number;
  readonly toleranceKpa: number;
  /** Seconds from the start to the end. */
  readonly seconds: number;
  readonly secondsOn: number;
  readonly timesOn: number;
  /** Of the tire's pressure, lost to a supply that was below it; kPa, estimated. */
  readonly lostKpa: number;
  /** Seconds with the chuck on while the supply was below the tire, estimated. */
  readonly secondsBelow: number;
  readonly highestSupplyKpa: number;
  readonly lowestSupplyKpa: number;
  /** Null while the fill is open. */
  readonly outcome: Ending | null;
}

export interface Replayed {
  readonly result: FillResult;
  readonly samples: TraceSample[];
  readonly profile: AirProfile;
}

/** More samples than this show no more on a chart; a long fill is sampled more coarsely. */
const mostSamples = 400;

/** A fill that was left open says nothing more this long after its last tap, s. */
const watchedS = 600;

/**
 * Replays a fill's log by the engine, from its start to its end, or to the last event of a fill that
 * is open.
 * @throws RangeError from the engine, for a set-up or an event that it doesn't take
 */
export function replayFill(setup: FillSetup, log: RunLog): Replayed {
  // A log that comes from the server is by number; who was where when goes by time.
  const events = fillEventsOf(mergeLog([], log));
  const end = endOf(log);
  const until = end ? end.atMs / 1000 : (events.at(-1)?.at ?? 0);
  const fill = createFill(setup);
  for (const event of events) fill.apply(event);
  const on = chuckSpans(events, until);
  const watched = Math.min(until, (events.at(-1)?.at ?? 0) + watchedS);
  const samples = sampleTimes(events, watched).map((at) => sampleOf(fill, at));
  const result = {
    ...figuresOf(setup, samples, on),
    endKpa: lastGaugedKpa(log),
    seconds: until,
    outcome: end?.how ?? null,
  };
  return { result, samples, profile: fill.profile() };
}

/** An even grid, and every event, so that no edge of a hold falls between two samples. */
function sampleTimes(events: readonly FillEvent[], until: number): number[] {
  const step = Math.max(1, Math.ceil(until / mostSamples));
  const times = new Set(events.filter(({ type }) => type !== 'call-shown').map(({ at }) => at));
  for (let at = 0; at < until; at += step) times.add(at);
  times.add(until);
  return [...times].sort((a, b) => a - b);
}

function sampleOf(fill: Fill, at: number): TraceSample {
  const { supplyKpa, tireKpa } = fill.advise(at);
  return { at, supplyKpa: rounded(supplyKpa), tireKpa: rounded(tireKpa) };
}

/** To a hundredth of a kPa: far below what any gauge shows, and half the bytes. */
function rounded({ p10, p50, p90 }: Spread): Spread {
  const round = (kpa: number) => Math.round(kpa * 100) / 100;
  return { p10: round(p10), p50: round(p50), p90: round(p90) };
}

function figuresOf({ tire }: FillSetup, samples: readonly TraceSample[], on: readonly TimeSpan[]) {
  const supply = samples.map(({ supplyKpa }) => supplyKpa.p50);
  return {
    startKpa: tire.startKpa,
    targetKpa: tire.targetKpa,
    toleranceKpa: tire.toleranceKpa,
    secondsOn: on.reduce((sum, { from, to }) => sum + to - from, 0),
    timesOn: on.length,
    ...lossOf(samples, on),
    highestSupplyKpa: Math.max(...supply),
    lowestSupplyKpa: Math.min(...supply),
  };
}

function lossOf(samples: readonly TraceSample[], on: readonly TimeSpan[]) {
  let lostKpa = 0;
  let secondsBelow = 0;
  samples.forEach((sample, index) => {
    const next = samples[index + 1];
    const isOn = next && on.some(({ from, to }) => sample.at >= from && next.at <= to);
    if (!next || !isOn || sample.supplyKpa.p50 >= sample.tireKpa.p50) return;
    secondsBelow += next.at - sample.at;
    lostKpa += Math.max(0, sample.tireKpa.p50 - next.tireKpa.p50);
  });
  return { lostKpa, secondsBelow };
}
