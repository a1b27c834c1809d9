import { describe, expect, expectTypeOf, it } from 'vitest';
import {
  type AbsoluteKpa,
  absoluteKpa,
  type Bar,
  barToKpa,
  type Celsius,
  celsius,
  celsiusToFahrenheit,
  feet,
  feetToMetres,
  formatPressure,
  formatPressureDifference,
  type GaugeKpa,
  gaugeKpa,
  type KpaDifference,
  kilograms,
  kpaDifference,
  kpaToPsi,
  litres,
  type Metres,
  metres,
  type Psi,
  pounds,
  pressureBetween,
  psi,
  psiToKpa,
  type Seconds,
  seconds,
  standardAtmosphere,
  toAbsolute,
  toGauge,
} from './index';

const gauge = gaugeKpa(700);
const absolute = absoluteKpa(801.325);
const sea = absoluteKpa(101.325);

describe('quantities as types (checked by tsc)', () => {
  it('keeps gauge and absolute pressure apart', () => {
    expectTypeOf<GaugeKpa>().not.toExtend<AbsoluteKpa>();
    expectTypeOf<AbsoluteKpa>().not.toExtend<GaugeKpa>();
    // @ts-expect-error an absolute pressure is not a gauge pressure
    toAbsolute(absolute, sea);
    // @ts-expect-error a gauge pressure is not an absolute one
    toGauge(gauge, sea);
    // @ts-expect-error the atmosphere is absolute
    toAbsolute(gauge, gauge);
    // @ts-expect-error only gauge pressures are shown
    formatPressure(absolute, 'kPa');
    expectTypeOf(toAbsolute(gauge, sea)).toEqualTypeOf<AbsoluteKpa>();
    expectTypeOf(toGauge(absolute, sea)).toEqualTypeOf<GaugeKpa>();
  });

  it('keeps kPa, psi and bar apart', () => {
    expectTypeOf<GaugeKpa>().not.toExtend<Psi>();
    expectTypeOf<Psi>().not.toExtend<GaugeKpa>();
    expectTypeOf<Bar>().not.toExtend<GaugeKpa>();
    // @ts-expect-error kPa where psi is wanted
    psiToKpa(gauge);
    // @ts-expect-error psi where kPa is wanted
    kpaToPsi(psi(100));
    // @ts-expect-error psi where bar is wanted
    barToKpa(psi(100));
    // @ts-expect-error psi where kPa is wanted
    formatPressure(psi(100), 'psi');
  });

  it('keeps a difference apart from a pressure', () => {
    expectTypeOf<KpaDifference>().not.toExtend<GaugeKpa>();
    expectTypeOf(pressureBetween(gauge, gauge)).toEqualTypeOf<KpaDifference>();
    // @ts-expect-error a pressure is not a difference
    formatPressureDifference(gauge, 'psi');
    // @ts-expect-error a difference is not a pressure
    formatPressure(kpaDifference(5), 'psi');
  });

  it('refuses bare numbers and other quantities', () => {
    // @ts-expect-error a bare number has no unit
    formatPressure(700, 'kPa');
    // @ts-expect-error feet where metres are wanted
    standardAtmosphere(feet(100));
    // @ts-expect-error °F is not °C
    celsiusToFahrenheit(celsiusToFahrenheit(celsius(20)));
    expectTypeOf<Celsius>().not.toExtend<Metres>();
    expectTypeOf<Seconds>().not.toExtend<Metres>();
    expectTypeOf(feetToMetres(feet(1))).toEqualTypeOf<Metres>();
  });

  it('is a plain number at run time', () => {
    expectTypeOf<GaugeKpa>().toExtend<number>();
    expect(JSON.stringify({ kpa: gauge })).toBe('{"kpa":700}');
  });
});

describe('constructors', () => {
  it.each([
    ['gauge pressure in kPa', gaugeKpa],
    ['absolute pressure in kPa', absoluteKpa],
    ['pressure difference in kPa', kpaDifference],
    ['gauge pressure in psi', psi],
    ['temperature in °C', celsius],
    ['volume in L', litres],
    ['mass in kg', kilograms],
    ['mass in lb', pounds],
    ['length in m', metres],
    ['time in s', seconds],
  ])('refuse what is not a finite number: %s', (name, make) => {
    expect(() => make(Number.NaN)).toThrow(new RangeError(`${name}: NaN is not a finite number`));
    expect(() => make(Number.POSITIVE_INFINITY)).toThrow(RangeError);
  });

  it('refuse what cannot be, naming quantity and value', () => {
    expect(() => absoluteKpa(-1)).toThrow('absolute pressure in kPa: -1 is below 0');
    expect(() => celsius(-300)).toThrow('temperature in °C: -300 is below -273.15');
    expect(() => litres(-5)).toThrow('volume in L: -5 is below 0');
    expect(() => toAbsolute(gaugeKpa(-150), sea)).toThrow(RangeError);
  });
});
