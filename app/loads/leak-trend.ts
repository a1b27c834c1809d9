import {
  type AbsoluteKpa,
  type Celsius,
  celsius,
  type GaugeKpa,
  type KpaDifference,
  kpaDifference,
  kpaPerPsi,
  seaLevelKpa,
  toAbsolute,
  toGauge,
} from '~/units';
import { pressureAtTemperature } from './temperature';

/** One reading of one tire, from its history. */
export interface PressureReading {
  at: Date;
  kpa: GaugeKpa;
  /** The tire's own temperature, which is the air's when it is cold; null when nobody noted it. */
  temperature: Celsius | null;
  /** The air's pressure where it was read. */
  atmosphere: AbsoluteKpa;
  /** Air was added or let out just before: what came earlier says nothing about what comes later. */
  adjusted: boolean;
  /** A warm tire's temperature is not the air's; such a reading is left out. */
  warm: boolean;
}

/** A reading brought to the common temperature and atmosphere. */
interface Point {
  days: number;
  kpa: number;
}

interface Slope {
  kpaPerDay: number;
  days: number;
}

const dayMs = 24 * 60 * 60 * 1000;
/** A mean month, days: 365.25 / 12. */
const monthDays = 30.4375;
/** The temperature at which readings are compared, of no consequence but for a per cent or so. */
const commonTemperature = celsius(20);
/** Two readings closer than a week say more about the gauge (half a psi) than about the tire. */
const leastPairDays = 7;
/** Two weeks of watching: then half a psi of gauge is less than the usual loss of a month. */
const leastDays = 14;
/** Sums of days may differ by this much from rounding alone. */
const sameDays = 1e-6;
/** A rise beyond what gauge and thermometer explain: somebody added air and wrote nothing down. */
const unrecordedFillKpa = 3 * kpaPerPsi;

/** What a truck tire loses in a month: 1 to 3 psi. Trade press; GAO-07-246R. */
export const usualLossKpa = {
  least: kpaDifference(kpaPerPsi),
  most: kpaDifference(3 * kpaPerPsi),
};

/**
 * How much pressure a tire loses in a month, kPa; above zero is a loss. Readings are brought to one
 * temperature and atmosphere (ideal gas at constant volume) and compared only between two fills.
 * The answer is the median of the slopes of all pairs, longer pairs counting for more, so that one
 * slip of a thumb doesn't move it; on exact readings it is the regression line's slope.
 * @param readings of one tire, in any order
 * @returns null while it is not known: fewer than two usable readings between two fills, or less
 * than two weeks of them.
 * @throws RangeError when a reading's `at` is not a date.
 */
export function leakPerMonth(readings: readonly PressureReading[]): KpaDifference | null {
  const undated = readings.findIndex(({ at }) => Number.isNaN(at.getTime()));
  if (undated >= 0) throw new RangeError(`at of reading ${undated}: not a date`);
  const stretches = splitAtFills(readings).map(comparablePoints).flatMap(splitAtRises);
  const watched = stretches.reduce((sum, stretch) => sum + daysOf(stretch), 0);
  const kpaPerDay = weightedMedian(stretches.flatMap(slopesWithin));
  if (kpaPerDay === null || watched < leastDays) return null;
  return kpaDifference(-kpaPerDay * monthDays);
}

/** Whether a tire loses more than tires usually do; false while the loss is not known. */
export const leaksUnusually = (perMonth: KpaDifference | null): boolean =>
  perMonth !== null && perMonth > usualLossKpa.most;

// A fill parts the readings before it from those after it even if its own reading is of no use.
function splitAtFills(readings: readonly PressureReading[]): PressureReading[][] {
  const inOrder = readings.toSorted(
    (a, b) => a.at.getTime() - b.at.getTime() || Number(a.adjusted) - Number(b.adjusted),
  );
  return splitBefore(inOrder, (_, reading) => reading.adjusted);
}

const splitAtRises = (points: readonly Point[]): Point[][] =>
  splitBefore(points, (before, point) => point.kpa - before.kpa > unrecordedFillKpa);

function splitBefore<Item>(
  items: readonly Item[],
  parts: (before: Item, item: Item) => boolean,
): Item[][] {
  const stretches: Item[][] = [];
  for (const item of items) {
    const stretch = stretches.at(-1);
    const before = stretch?.at(-1);
    if (stretch === undefined || before === undefined || parts(before, item))
      stretches.push([item]);
    else stretch.push(item);
  }
  return stretches;
}

function comparablePoints(readings: readonly PressureReading[]): Point[] {
  return readings.flatMap(({ at, kpa, temperature, atmosphere, warm }) => {
    if (warm || temperature === null) return [];
    const seaLevel = toGauge(toAbsolute(kpa, atmosphere), seaLevelKpa);
    const common = pressureAtTemperature(seaLevel, temperature, commonTemperature, seaLevelKpa);
    return [{ days: at.getTime() / dayMs, kpa: common }];
  });
}

const daysOf = (points: readonly Point[]): number =>
  (points.at(-1)?.days ?? 0) - (points.at(0)?.days ?? 0);

function slopesWithin(points: readonly Point[]): Slope[] {
  return points.flatMap((early, index) =>
    points.slice(index + 1).flatMap((late) => {
      const days = late.days - early.days;
      return days < leastPairDays ? [] : [{ kpaPerDay: (late.kpa - early.kpa) / days, days }];
    }),
  );
}

/** The slope at which half of the days lie on either side; the middle when it falls between two. */
function weightedMedian(slopes: readonly Slope[]): number | null {
  const rising = slopes.toSorted((a, b) => a.kpaPerDay - b.kpaPerDay);
  const half = rising.reduce((sum, slope) => sum + slope.days, 0) / 2;
  let passed = 0;
  for (const [index, { kpaPerDay, days }] of rising.entries()) {
    passed += days;
    if (passed < half - sameDays) continue;
    const next = rising[index + 1];
    return passed <= half + sameDays && next ? (kpaPerDay + next.kpaPerDay) / 2 : kpaPerDay;
  }
  return null;
}
