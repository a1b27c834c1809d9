import { kpaPerBar, kpaPerPsi, type PressureUnit } from '~/units';
import type { ChartView } from './review-view';

/** The band may make the axis longer by this share of what else is drawn, upward and downward. */
const bandShare = 0.5;

/**
 * What the axis of pressure has to hold, gauge kPa. A very unsure estimate, as at the start, runs
 * out of the picture: it would squeeze the rest.
 */
export function drawnRange({ points, readings, targetKpa }: ChartView): [number, number] {
  const lines = [
    targetKpa,
    ...points.flatMap(({ supply, tire }) => [supply, tire]),
    ...readings.map(({ kpa }) => kpa),
  ];
  const [low, high] = [Math.min(...lines), Math.max(...lines)];
  const more = bandShare * (high - low);
  return [
    Math.max(low - more, Math.min(low, ...points.map(({ band }) => band[0]))),
    Math.min(high + more, Math.max(high, ...points.map(({ band }) => band[1]))),
  ];
}

const pressureSteps: Record<PressureUnit, { kpa: number; steps: readonly number[] }> = {
  psi: { kpa: kpaPerPsi, steps: [1, 2, 5, 10, 20, 50, 100] },
  kPa: { kpa: 1, steps: [10, 20, 50, 100, 200, 500] },
  bar: { kpa: kpaPerBar, steps: [0.1, 0.2, 0.5, 1, 2, 5] },
};

const timeSteps = [5, 10, 15, 30, 60, 120, 300, 600, 900, 1800, 3600, 7200, 14_400, 21_600];

/** The most gradations on the axis of pressure. */
const mostPressures = 7;

/**
 * Round figures of the reader's unit that enclose what is drawn, few enough to read.
 * @returns gauge kPa, rising; the first and the last are the ends of the axis
 */
export function pressureTicks(lowKpa: number, highKpa: number, unit: PressureUnit): number[] {
  const { kpa, steps } = pressureSteps[unit];
  const count = (step: number) =>
    Math.ceil(highKpa / kpa / step) - Math.floor(lowKpa / kpa / step) + 1;
  const step = steps.find((each) => count(each) <= mostPressures) ?? steps.at(-1)!;
  const first = Math.floor(lowKpa / kpa / step);
  return Array.from(
    { length: Math.max(2, count(step)) },
    (_, place) => (first + place) * step * kpa,
  );
}

/** Round times from 0 to at most `until`, at most `most` of them; seconds. */
export function timeTicks(until: number, most: number): number[] {
  const step = timeSteps.find((each) => Math.floor(until / each) + 1 <= most) ?? timeSteps.at(-1)!;
  return Array.from({ length: Math.floor(until / step) + 1 }, (_, place) => place * step);
}
