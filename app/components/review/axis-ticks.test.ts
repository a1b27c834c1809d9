import { describe, expect, it } from 'vitest';
import { kpaPerPsi } from '~/units';
import { drawnRange, pressureTicks, timeTicks } from './axis-ticks';
import type { ChartView } from './review-view';

describe('the axis of pressure', () => {
  it('has round figures of the reader’s unit that enclose what is drawn', () => {
    const psi = pressureTicks(91.2 * kpaPerPsi, 118.4 * kpaPerPsi, 'psi');
    expect(psi.map((kpa) => Math.round(kpa / kpaPerPsi))).toEqual([
      90, 95, 100, 105, 110, 115, 120,
    ]);
    expect(pressureTicks(628, 816, 'kPa')).toEqual([600, 650, 700, 750, 800, 850]);
    const bar = pressureTicks(628, 816, 'bar').map((kpa) => (kpa / 100).toFixed(1));
    expect(bar).toEqual(['6.0', '6.5', '7.0', '7.5', '8.0', '8.5']);
  });

  it('has two ends even when everything is at one pressure', () => {
    expect(pressureTicks(700, 700, 'kPa').length).toBeGreaterThanOrEqual(2);
  });

  it('is not squeezed by an estimate that is very unsure', () => {
    const point = { supply: 650, tire: 700, lack: null };
    const view = {
      points: [
        { ...point, at: 0, band: [0, 1400] },
        { ...point, at: 1, band: [645, 655] },
      ],
      readings: [{ at: 1, kpa: 640, kind: 'wheel-gauge' }],
      targetKpa: 740,
    } as unknown as ChartView;
    expect(drawnRange(view)).toEqual([590, 790]);
  });
});

describe('the axis of time', () => {
  it('has as many round times as there is room for, from the start', () => {
    expect(timeTicks(152, 6)).toEqual([0, 30, 60, 90, 120, 150]);
    expect(timeTicks(152, 4)).toEqual([0, 60, 120]);
    expect(timeTicks(1500, 6)).toEqual([0, 300, 600, 900, 1200, 1500]);
  });

  it('stays short over a whole day', () => {
    expect(timeTicks(86_400, 5).length).toBeLessThanOrEqual(5);
  });
});
