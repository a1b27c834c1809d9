import fc from 'fast-check';
import unit from 'unitmath';
import { describe, expect, it } from 'vitest';
import {
  absoluteKpa,
  bar,
  barToKpa,
  celsius,
  celsiusToFahrenheit,
  fahrenheit,
  fahrenheitToCelsius,
  feet,
  feetToMetres,
  gaugeKpa,
  kelvinOf,
  kilograms,
  kilogramsToPounds,
  kpaDifference,
  kpaToBar,
  kpaToPsi,
  litresPerCubicInch,
  metres,
  metresToFeet,
  pounds,
  poundsToKilograms,
  pressureBetween,
  psi,
  psiToKpa,
  raisedBy,
  toAbsolute,
  toGauge,
} from './index';

const figure = (min: number, max: number) => fc.double({ min, max, noNaN: true });
/** Twelve figures agree: libraries add up their factors in another order. */
const sameFigure = (got: number, want: number) =>
  expect(Math.abs(got - want)).toBeLessThanOrEqual(1e-12 * Math.max(1, Math.abs(want)));

describe('unit factors', () => {
  it('are the published ones', () => {
    // NIST SP 811 (memory, two libraries agree).
    expect(psiToKpa(psi(1))).toBe(6.894757293168361);
    expect(poundsToKilograms(pounds(1))).toBe(0.45359237);
  });

  it('agree with an independent units library', () => {
    // unitmath 0.8.8
    fc.assert(
      fc.property(figure(0, 300), (value) => {
        sameFigure(psiToKpa(psi(value)), unit(value, 'psi').to('kPa').value);
        sameFigure(kpaToPsi(gaugeKpa(value)), unit(value, 'kPa').to('psi').value);
        sameFigure(barToKpa(bar(value)), unit(value, 'bar').to('kPa').value);
        sameFigure(kpaToBar(gaugeKpa(value)), unit(value, 'kPa').to('bar').value);
        sameFigure(poundsToKilograms(pounds(value)), unit(value, 'lb').to('kg').value);
        sameFigure(kilogramsToPounds(kilograms(value)), unit(value, 'kg').to('lb').value);
        sameFigure(feetToMetres(feet(value)), unit(value, 'ft').to('m').value);
        sameFigure(metresToFeet(metres(value)), unit(value, 'm').to('ft').value);
        sameFigure(value * litresPerCubicInch, unit(value, 'in^3').to('L').value);
        sameFigure(fahrenheitToCelsius(fahrenheit(value)), unit(value, 'degF').to('degC').value);
        sameFigure(celsiusToFahrenheit(celsius(value)), unit(value, 'degC').to('degF').value);
        sameFigure(kelvinOf(celsius(value)), unit(value, 'degC').to('K').value);
      }),
    );
  });

  it('meet where Celsius and Fahrenheit meet', () => {
    expect(celsiusToFahrenheit(celsius(-40))).toBe(-40);
    expect(fahrenheitToCelsius(fahrenheit(212))).toBe(100);
    expect(fahrenheitToCelsius(fahrenheit(-459.67))).toBe(-273.15);
  });

  it('come back to where they started', () => {
    fc.assert(
      fc.property(figure(0, 1400), (value) => {
        sameFigure(psiToKpa(kpaToPsi(gaugeKpa(value))), value);
        sameFigure(barToKpa(kpaToBar(gaugeKpa(value))), value);
        sameFigure(fahrenheitToCelsius(celsiusToFahrenheit(celsius(value))), value);
        sameFigure(poundsToKilograms(kilogramsToPounds(kilograms(value))), value);
        sameFigure(feetToMetres(metresToFeet(metres(value))), value);
      }),
    );
  });
});

describe('gauge and absolute pressure', () => {
  it('differ by the atmosphere', () => {
    const denver = absoluteKpa(83.4);
    expect(toAbsolute(gaugeKpa(700), denver)).toBe(783.4);
    expect(toGauge(absoluteKpa(783.4), denver)).toBeCloseTo(700, 9);
  });

  it('leave differences alone, whatever the atmosphere', () => {
    fc.assert(
      fc.property(figure(0, 1400), figure(0, 1400), figure(20, 108), (high, low, air) => {
        const atmosphere = absoluteKpa(air);
        const between = pressureBetween(gaugeKpa(high), gaugeKpa(low));
        sameFigure(
          toAbsolute(gaugeKpa(high), atmosphere) - toAbsolute(gaugeKpa(low), atmosphere),
          between,
        );
        sameFigure(raisedBy(gaugeKpa(low), between), high);
      }),
    );
    expect(raisedBy(gaugeKpa(700), kpaDifference(-20))).toBe(680);
  });
});
