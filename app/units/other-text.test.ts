import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  altitudeUnits,
  celsius,
  feet,
  feetToMetres,
  formatAltitude,
  formatTemperature,
  formatVolume,
  litres,
  metres,
  parseAltitude,
  parseTemperature,
  parseVolume,
  temperatureUnits,
} from './index';

const problemOf = (read: { ok: boolean; problem?: string }) => read.problem;

describe('temperatures', () => {
  it('are shown whole, with a true minus', () => {
    expect(formatTemperature(celsius(20), '°F')).toBe('68 °F');
    expect(formatTemperature(celsius(-5.2), '°C')).toBe('−5 °C');
    expect(formatTemperature(celsius(-0.2), '°C')).toBe('0 °C');
    expect(formatTemperature(celsius(21.25), '°C', { digits: 1, withUnit: false })).toBe('21.3');
  });

  it('are read in the field’s unit or in the one written out', () => {
    expect(parseTemperature('68', '°F')).toEqual({ ok: true, value: 20 });
    expect(parseTemperature('20 °C', '°F')).toEqual({ ok: true, value: 20 });
    expect(parseTemperature('20c', '°F')).toEqual({ ok: true, value: 20 });
    expect(parseTemperature('-12,5', '°C')).toEqual({ ok: true, value: -12.5 });
  });

  it('are refused with the reason', () => {
    expect(problemOf(parseTemperature('', '°C'))).toBe('empty');
    expect(problemOf(parseTemperature('warm', '°C'))).toBe('not-a-number');
    expect(problemOf(parseTemperature('72', '°C'))).toBe('out-of-range');
    expect(problemOf(parseTemperature('-9999', '°F'))).toBe('out-of-range');
  });

  it('come back from what is shown', () => {
    const degrees = fc.double({ min: -60, max: 60, noNaN: true });
    fc.assert(
      fc.property(degrees, fc.constantFrom(...temperatureUnits), (value, unit) => {
        const back = parseTemperature(formatTemperature(celsius(value), unit), unit);
        expect(back.ok && Math.abs(back.value - value) <= 0.5 + 1e-9).toBe(true);
      }),
    );
  });
});

describe('altitudes', () => {
  it('are shown whole', () => {
    expect(formatAltitude(feetToMetres(feet(5280)), 'ft')).toBe('5280 ft');
    expect(formatAltitude(metres(-12.3), 'm')).toBe('−12 m');
  });

  it('are read with a mark between thousands', () => {
    for (const text of ['5280', '5,280', '5.280', '5280 ft', '5,280 feet'])
      expect(parseAltitude(text, 'ft')).toEqual({ ok: true, value: feetToMetres(feet(5280)) });
    expect(parseAltitude('1609.5', 'm')).toEqual({ ok: true, value: 1609.5 });
    expect(parseAltitude('1,609 m', 'ft')).toEqual({ ok: true, value: 1609 });
  });

  it('are refused with the reason', () => {
    expect(problemOf(parseAltitude('', 'ft'))).toBe('empty');
    expect(problemOf(parseAltitude('5,28,0', 'ft'))).toBe('not-a-number');
    expect(parseAltitude('40000', 'ft')).toEqual({
      ok: false,
      problem: 'out-of-range',
      minimum: -500,
      maximum: 11_000,
    });
  });

  it('come back from what is shown, bounds included', () => {
    const altitude = fc.double({ min: -500, max: 11_000, noNaN: true });
    fc.assert(
      fc.property(altitude, fc.constantFrom(...altitudeUnits), (value, unit) => {
        const back = parseAltitude(formatAltitude(metres(value), unit), unit);
        expect(back.ok && Math.abs(back.value - value) <= 0.5 + 1e-9).toBe(true);
      }),
      {
        examples: [
          [11_000, 'ft'],
          [-500, 'ft'],
        ],
      },
    );
  });
});

describe('volumes', () => {
  it('are shown and read in litres', () => {
    expect(formatVolume(litres(148.4))).toBe('148 L');
    expect(parseVolume('148,5 l')).toEqual({ ok: true, value: 148.5 });
    expect(problemOf(parseVolume('0'))).toBe('out-of-range');
    expect(problemOf(parseVolume('148 gal'))).toBe('not-a-number');
  });
});
