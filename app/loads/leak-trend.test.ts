import fc from 'fast-check';
import { linearRegression } from 'simple-statistics';
import { describe, expect, it } from 'vitest';
import {
  celsius,
  gaugeKpa,
  kpaDifference,
  kpaPerPsi,
  metres,
  seaLevelKpa,
  standardAtmosphere,
} from '~/units';
import { leakPerMonth, leaksUnusually, type PressureReading, pressureAtTemperature } from './index';

const dayMs = 86_400_000;
const startMs = Date.UTC(2031, 2, 1, 8);
const month = 365.25 / 12;

const reading = (
  day: number,
  kpa: number,
  change: Partial<PressureReading> = {},
): PressureReading => ({
  at: new Date(startMs + day * dayMs),
  kpa: gaugeKpa(kpa),
  temperature: celsius(20),
  atmosphere: seaLevelKpa,
  adjusted: false,
  warm: false,
  ...change,
});

/** What a gauge would show of a tire that holds `kpa` at 20 °C and sea level. */
const seenAt = (day: number, kpa: number, degrees: number, altitude: number): PressureReading => {
  const atmosphere = standardAtmosphere(metres(altitude));
  const temperature = celsius(degrees);
  const atSeaLevel = pressureAtTemperature(gaugeKpa(kpa), celsius(20), temperature, seaLevelKpa);
  return reading(day, atSeaLevel + seaLevelKpa - atmosphere, { temperature, atmosphere });
};

const slopePerMonth = (readings: readonly PressureReading[]) =>
  -linearRegression(readings.map(({ at, kpa }) => [at.getTime() / dayMs, kpa])).m * month;

describe('loss in a month', () => {
  it('is the regression line’s slope on exact readings', () => {
    // simple-statistics, linearRegression
    const days = fc.uniqueArray(fc.integer({ min: 0, max: 400 }), { minLength: 3, maxLength: 12 });
    const loss = fc.double({ min: -1, max: 30, noNaN: true });
    fc.assert(
      fc.property(days, loss, (onDays, perMonth) => {
        fc.pre(Math.max(...onDays) - Math.min(...onDays) >= 14);
        const readings = onDays.map((day) => reading(day, 760 - (perMonth * day) / month));
        expect(leakPerMonth(readings)).toBeCloseTo(perMonth, 6);
        expect(leakPerMonth(readings)).toBeCloseTo(slopePerMonth(readings), 6);
      }),
    );
  });

  it('lies near the regression line’s slope on readings a gauge could give', () => {
    // simple-statistics, linearRegression; readings rounded to 1 psi
    const readings = Array.from({ length: 12 }, (_, index) => {
      const exact = 760 - 12 * ((index * 15) / month);
      return reading(index * 15, Math.round(exact / kpaPerPsi) * kpaPerPsi);
    });
    expect(Math.abs(leakPerMonth(readings)! - slopePerMonth(readings))).toBeLessThan(1);
    expect(Math.abs(leakPerMonth(readings)! - 12)).toBeLessThan(1);
  });

  it('is not moved by one slip of a thumb, as the regression line is', () => {
    const readings = [0, 20, 40, 60, 80, 100].map((day) => reading(day, 760 - day * 0.3));
    const slipped = readings.with(5, reading(100, 530));
    expect(Math.abs(leakPerMonth(slipped)! - 0.3 * month)).toBeLessThan(1.5);
    expect(Math.abs(slopePerMonth(slipped) - 0.3 * month)).toBeGreaterThan(30);
  });

  it('is nothing for a tight tire, whatever the weather and the altitude', () => {
    // ideal gas law at constant volume; U.S. Standard Atmosphere 1976
    const place = fc.tuple(fc.integer({ min: -20, max: 45 }), fc.integer({ min: 0, max: 3000 }));
    fc.assert(
      fc.property(fc.array(place, { minLength: 2, maxLength: 10 }), (places) => {
        const readings = places.map(([degrees, altitude], index) =>
          seenAt(index * 30, 760, degrees, altitude),
        );
        expect(leakPerMonth(readings)).toBeCloseTo(0, 6);
      }),
    );
  });

  it('is taken between fills and not across them', () => {
    const readings = [0, 1, 2, 3, 4].flatMap((round) => [
      reading(round * 30, 750),
      reading(round * 30, 760, { adjusted: true }),
    ]);
    expect(leakPerMonth(readings)).toBeCloseTo((10 / 30) * month, 6);
  });

  it('is parted by a fill whose own reading is of no use', () => {
    const readings = [
      reading(0, 760),
      reading(30, 750),
      reading(30, 760, { adjusted: true, temperature: null }),
      reading(60, 758),
      reading(90, 748),
    ];
    expect(leakPerMonth(readings)).toBeCloseTo((10 / 30) * month, 6);
  });

  it('is taken between fills that nobody wrote down', () => {
    const readings = [760, 750, 785, 775, 765].map((kpa, index) => reading(index * 30, kpa));
    expect(leakPerMonth(readings)).toBeCloseTo((10 / 30) * month, 6);
  });

  it('does not depend on the order of the readings', () => {
    const any = fc.array(
      fc.tuple(fc.integer({ min: 0, max: 300 }), fc.double({ min: 600, max: 800, noNaN: true })),
      { maxLength: 12 },
    );
    fc.assert(
      fc.property(any, (list) => {
        const unique = [...new Map(list)].map(([day, kpa]) => reading(day, kpa));
        expect(leakPerMonth(unique.toReversed())).toBe(leakPerMonth(unique));
      }),
    );
  });

  it.each([
    ['there is nothing', []],
    ['there is one reading', [reading(0, 760)]],
    ['there are less than two weeks', [reading(0, 760), reading(13, 755)]],
    ['one is warm', [reading(0, 760), reading(30, 750, { warm: true })]],
    ['the temperature is missing', [reading(0, 760), reading(30, 750, { temperature: null })]],
    [
      'every reading follows a fill',
      [0, 30, 60].map((day) => reading(day, 760, { adjusted: true })),
    ],
  ])('is not known while %s', (_, readings) => {
    expect(leakPerMonth(readings)).toBeNull();
  });

  it('refuses a reading without a date', () => {
    const undated = reading(0, 760, { at: new Date('once') });
    expect(() => leakPerMonth([reading(0, 750), undated])).toThrow('at of reading 1: not a date');
  });

  it('is unusual above 3 psi', () => {
    // trade press: 1 to 3 psi a month
    expect(leaksUnusually(kpaDifference(2.9 * kpaPerPsi))).toBe(false);
    expect(leaksUnusually(kpaDifference(3.1 * kpaPerPsi))).toBe(true);
    expect(leaksUnusually(null)).toBe(false);
  });
});
