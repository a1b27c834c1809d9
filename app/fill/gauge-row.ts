import type { Spread } from '~/air';

/** The offered values of a gauge, lowest first, kPa. They stay until there is a reason to change. */
export interface GaugeRow {
  values: readonly number[];
  /** What lies between two offered values, kPa: the reading is no finer than that. */
  stepKpa: number;
  /** When these values came up without a tap, seconds on a running clock. */
  changedAt: number | undefined;
  /** What stood there before that change. */
  before: readonly number[] | undefined;
  /** How many readings in a row were the middle value. */
  middles: number;
  /** A reading was tapped: the next forecast, which knows of it, offers anew. */
  tapped: boolean;
}

export interface RowWish {
  forecast: Spread;
  /** One graduation of the person's own gauge, kPa. */
  gaugeStepKpa: number;
  /** Three, or two on a narrow screen. */
  count: number;
}

/** No value changes within this many seconds before a press; one that did is asked about. */
const settleSeconds = 1.5;
/** After as many middle values in a row the next reading is typed: a thumb that only agrees. */
const middlesBeforeTyping = 3;

/** Values around the forecast, wide apart while the forecast is. */
export function offerRow({ forecast, gaugeStepKpa, count }: RowWish, middles = 0): GaugeRow {
  const stepKpa = spacing(forecast, gaugeStepKpa, count);
  const middle = Math.round(forecast.p50 / gaugeStepKpa) * gaugeStepKpa;
  const lowest = middle - Math.floor((count - 1) / 2) * stepKpa;
  const first = Math.max(0, lowest);
  const values = Array.from({ length: count }, (_, index) => first + index * stepKpa);
  return { values, stepKpa, changedAt: undefined, before: undefined, middles, tapped: false };
}

/** Wider steps than this would be guesses and not readings (our choice). */
const mostSteps = 5;

function spacing({ p10, p90 }: Spread, gaugeStepKpa: number, count: number): number {
  const steps = Math.round((p90 - p10) / (count + 0.6) / gaugeStepKpa);
  return Math.min(mostSteps, Math.max(1, steps)) * gaugeStepKpa;
}

/** Offers anew only when the forecast has left the values and no thumb is down. */
export function followForecast(
  row: GaugeRow,
  wish: RowWish,
  { now, pressing }: { now: number; pressing: boolean },
): GaugeRow {
  if (row.tapped) return offerRow(wish, row.middles);
  const resized = row.values.length !== wish.count;
  if (pressing || !(resized || hasLeft(row, wish.forecast.p50))) return row;
  return { ...offerRow(wish, row.middles), changedAt: now, before: row.values };
}

function hasLeft({ values, stepKpa }: GaugeRow, forecastKpa: number): boolean {
  const lowest = values[0] ?? 0;
  const highest = values.at(-1) ?? 0;
  return forecastKpa < lowest - stepKpa / 2 || forecastKpa > highest + stepKpa / 2;
}

/**
 * The value that stood under the thumb until just before the press, if it changed too shortly
 * before to have been read: the person is asked which one was meant.
 */
export function valueBefore(row: GaugeRow, index: number, pressedAt: number): number | undefined {
  if (row.changedAt === undefined || pressedAt - row.changedAt >= settleSeconds) return undefined;
  const before = row.before?.[index];
  return before === row.values[index] ? undefined : before;
}

/** After a tap the values may move: that is what the thumb expects. `index` −1 is a typed value. */
export function afterReading(row: GaugeRow, index: number): GaugeRow {
  const isMiddle = row.values.length === 3 && index === 1;
  return { ...row, tapped: true, middles: isMiddle ? row.middles + 1 : 0 };
}

/** True when the next prompt should open the keypad blank instead of the row. */
export function wantsTyping(row: GaugeRow): boolean {
  return row.middles >= middlesBeforeTyping;
}
