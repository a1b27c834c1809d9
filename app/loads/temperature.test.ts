import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  absoluteKpa,
  celsius,
  fahrenheit,
  fahrenheitToCelsius,
  gaugeKpa,
  kpaPerPsi,
  psi,
  psiToKpa,
  seaLevelKpa,
} from '~/units';
import { pressureAtTemperature } from './index';

const degrees = fc.double({ min: -40, max: 80, noNaN: true });
const pressure = fc.double({ min: 0, max: 1400, noNaN: true });
const air = fc.double({ min: 50, max: 108, noNaN: true });

describe('pressure at another temperature', () => {
  it.each([
    [80, 1.79],
    [100, 2.17],
    [110, 2.35],
    [120, 2.54],
  ])('%i psi at 70 °F rises by %f psi at 80 °F', (start, rise) => {
    // ideal gas law (computed): 70 to 80 °F at constant volume, gauge, sea level
    const [from, to] = [fahrenheit(70), fahrenheit(80)].map(fahrenheitToCelsius);
    const warmer = pressureAtTemperature(psiToKpa(psi(start)), from!, to!, seaLevelKpa);
    expect(warmer / kpaPerPsi - start).toBeCloseTo(rise, 2);
  });

  it('comes back to where it was', () => {
    fc.assert(
      fc.property(pressure, degrees, degrees, air, (kpa, cold, hot, atmosphere) => {
        const [from, to, around] = [celsius(cold), celsius(hot), absoluteKpa(atmosphere)];
        const there = pressureAtTemperature(gaugeKpa(kpa), from, to, around);
        expect(pressureAtTemperature(there, to, from, around)).toBeCloseTo(kpa, 8);
      }),
    );
  });

  it('is higher when hotter, and by more the higher it was', () => {
    const whole = fc.integer({ min: -40, max: 79 });
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 1399 }), whole, (kpa, degree) => {
        const riseOf = (start: number) =>
          pressureAtTemperature(gaugeKpa(start), celsius(degree), celsius(80), seaLevelKpa) - start;
        expect(riseOf(kpa)).toBeGreaterThan(0);
        expect(riseOf(kpa + 1)).toBeGreaterThan(riseOf(kpa));
      }),
    );
  });

  it('goes by way of any third temperature', () => {
    fc.assert(
      fc.property(pressure, degrees, degrees, degrees, (kpa, a, b, c) => {
        const [from, by, to] = [celsius(a), celsius(b), celsius(c)];
        const half = pressureAtTemperature(gaugeKpa(kpa), from, by, seaLevelKpa);
        const direct = pressureAtTemperature(gaugeKpa(kpa), from, to, seaLevelKpa);
        expect(pressureAtTemperature(half, by, to, seaLevelKpa)).toBeCloseTo(direct, 8);
      }),
    );
  });

  it('refuses absolute zero and what lies below vacuum', () => {
    const zero = celsius(-273.15);
    expect(() => pressureAtTemperature(gaugeKpa(700), zero, celsius(20), seaLevelKpa)).toThrow(
      'from: -273.15 °C is not above absolute zero',
    );
    expect(() => pressureAtTemperature(gaugeKpa(700), celsius(20), zero, seaLevelKpa)).toThrow(
      'to: -273.15 °C is not above absolute zero',
    );
    expect(() =>
      pressureAtTemperature(gaugeKpa(-200), celsius(20), celsius(30), seaLevelKpa),
    ).toThrow(RangeError);
  });
});
