import { describe, expect, it, vi } from 'vitest';
import { drawCoach } from './coach';
import { roundsByCrew } from './crew-round';
import { figuresOf, quantile } from './figures';
import { type Habits, USUAL } from './habits';
import { roundByEye } from './people-round';
import { PLAIN } from './person-traits';

/** A quick coach and a slower one; the first below 200 whose front tires are out of reach. */
const REACHABLE = [8, 10];
const BEYOND = Array.from({ length: 200 }, (_, i) => i).find((id) =>
  drawCoach(id).tires.some((tire) => !tire.reachable),
)!;

const round = (id: number, habits: Habits = USUAL) =>
  roundsByCrew(id, { habits, rounds: 1, createFill: null });

const untimed = (fills: ReturnType<typeof round>) =>
  fills.map((fill) => ({ ...fill, adviseMs: [] }));

/** Whole rounds are simulated: slow on a machine that is busy with other things, ms. */
vi.setConfig({ testTimeout: 60_000 });

describe('a crew that follows the all-seeing adviser', () => {
  it.each(REACHABLE)('ends each tire of coach %i gauged within tolerance', (id) => {
    for (const fill of round(id)) {
      expect(fill).toMatchObject({ done: true, proven: true, overLimit: false });
      expect(fill.seconds).toBeGreaterThan(fill.perfectSeconds * 0.8);
    }
  });

  it('lives the same round twice', () => {
    expect(untimed(round(8))).toEqual(untimed(round(8)));
  });

  it('is told that a tire above the governor cannot be reached', () => {
    const beyond = round(BEYOND).filter((fill) => !fill.reachable);
    expect(beyond.length).toBeGreaterThan(0);
    for (const fill of beyond) expect(fill).toMatchObject({ saidUnreachable: true, done: false });
  });

  it('gets done alone, with the pedal a walk away', () => {
    const alone = round(13, { ...USUAL, alone: true }).filter((fill) => fill.reachable);
    expect(alone.length).toBe(2);
    for (const fill of alone) expect(fill).toMatchObject({ done: true, proven: true });
  });
});

describe('a plain person', () => {
  it('lives the same round twice, and needs longer than the perfect player', () => {
    const fills = roundByEye(8, PLAIN, 1);
    expect(roundByEye(8, PLAIN, 1)).toEqual(fills);
    for (const fill of fills) expect(fill.seconds).toBeGreaterThan(fill.perfectSeconds);
  });
});

describe('the figures', () => {
  it('take quantiles between neighbours, and of endless times too', () => {
    expect(quantile([4, 1, 2, 3], 0.5)).toBe(2.5);
    expect(quantile([1, 2, Number.POSITIVE_INFINITY], 0.99)).toBe(Number.POSITIVE_INFINITY);
    expect(quantile([], 0.5)).toBeNaN();
  });

  it('count a fill that was not done as one that never ends', () => {
    const [fill] = round(8);
    const never = { ...fill!, done: false };
    expect(figuresOf([never]).ratioMedian).toBe(Number.POSITIVE_INFINITY);
    expect(figuresOf([never]).failed).toBe(1);
  });
});
