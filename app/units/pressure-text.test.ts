import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  defaultStepKpa,
  formatPressure,
  formatPressureDifference,
  gaugeKpa,
  kpaDifference,
  parsePressure,
  parsePressureDifference,
  pressureUnits,
  psi,
  psiToKpa,
} from './index';

const halfShown = { psi: 0.05 * 6.8948, kPa: 0.5, bar: 0.5 };

describe('pressures on the screen', () => {
  it.each([
    ['psi', '104.5 psi'],
    ['kPa', '721 kPa'],
    ['bar', '7.21 bar'],
  ] as const)('have the decimals that suit %s', (unit, shown) => {
    expect(formatPressure(psiToKpa(psi(104.5)), unit)).toBe(shown);
  });

  it('take another count of decimals, drop closing zeros and leave the unit out when asked', () => {
    const target = psiToKpa(psi(110));
    expect(formatPressure(target, 'psi')).toBe('110.0 psi');
    expect(formatPressure(target, 'psi', { trim: true })).toBe('110 psi');
    expect(formatPressure(psiToKpa(psi(104.5)), 'psi', { trim: true })).toBe('104.5 psi');
    expect(formatPressure(target, 'psi', { digits: 0, withUnit: false })).toBe('110');
    expect(formatPressure(gaugeKpa(700), 'bar', { trim: true })).toBe('7 bar');
    expect(formatPressure(gaugeKpa(700), 'kPa', { trim: true })).toBe('700 kPa');
  });

  it('show differences scaled and never moved, with a true minus', () => {
    expect(formatPressureDifference(kpaDifference(6.894757293168361), 'psi')).toBe('1.0 psi');
    expect(formatPressureDifference(kpaDifference(-27.58), 'psi')).toBe('−4.0 psi');
    expect(formatPressureDifference(kpaDifference(3.45), 'psi', { sign: true })).toBe('+0.5 psi');
    expect(formatPressureDifference(kpaDifference(-0.1), 'psi', { sign: true })).toBe('0.0 psi');
  });

  it('never show an unknown as a figure', () => {
    const unknown = Number.NaN as ReturnType<typeof gaugeKpa>;
    expect(() => formatPressure(unknown, 'psi')).toThrow(RangeError);
  });

  it('step like a common gauge', () => {
    expect(defaultStepKpa('psi')).toBe(6.894757293168361);
    expect(defaultStepKpa('kPa')).toBe(10);
    expect(defaultStepKpa('bar')).toBeCloseTo(10, 12);
  });
});

describe('typed pressures', () => {
  it.each([
    ['105', 105],
    ['104.5', 104.5],
    ['104,5', 104.5],
    [' 104.5 psi ', 104.5],
    ['.5', 0.5],
    ['0', 0],
    ['007', 7],
  ])('%j is read', (text, value) => {
    expect(parsePressure(text, 'psi')).toEqual({ ok: true, value: psiToKpa(psi(value)) });
  });

  it.each(['', '   ', '\t'])('%j is empty', (text) => {
    expect(parsePressure(text, 'psi')).toEqual({ ok: false, problem: 'empty' });
  });

  it.each([
    '12..5',
    '1O5',
    '105l',
    '12.',
    '1 05',
    '1e2',
    '0x69',
    '--5',
    '+5',
    '1.2.3',
    '1,200.5',
    '.',
    '-',
    'psi',
    'NaN',
    'Infinity',
    '105 lb',
    '１０５',
    '105\npsi psi',
  ])('%j is not a number', (text) => {
    expect(parsePressure(text, 'psi')).toEqual({ ok: false, problem: 'not-a-number', text });
  });

  it.each(['-1', '204', '9'.repeat(400), '203.2'])('%j psi is out of range', (text) => {
    expect(parsePressure(text, 'psi')).toEqual({
      ok: false,
      problem: 'out-of-range',
      minimum: 0,
      maximum: 1400,
    });
  });

  it('are read in the unit that is written out, whatever the field expects', () => {
    expect(parsePressure('7.2 bar', 'psi')).toEqual({ ok: true, value: 720 });
    expect(parsePressure('720KPA', 'psi')).toEqual({ ok: true, value: 720 });
  });

  it('come back from what is shown, within its rounding, in every unit', () => {
    const pressure = fc.double({ min: 0, max: 1400, noNaN: true });
    const unit = fc.constantFrom(...pressureUnits);
    fc.assert(
      fc.property(pressure, unit, fc.boolean(), fc.boolean(), (kpa, name, withUnit, trim) => {
        const back = parsePressure(formatPressure(gaugeKpa(kpa), name, { withUnit, trim }), name);
        expect(back.ok).toBe(true);
        if (back.ok) expect(Math.abs(back.value - kpa)).toBeLessThanOrEqual(halfShown[name]);
      }),
    );
  });

  it('never throw, whatever is typed', () => {
    fc.assert(
      fc.property(
        fc.string({ unit: 'grapheme' }),
        fc.constantFrom(...pressureUnits),
        (text, unit) => {
          const read = parsePressure(text, unit);
          if (read.ok) expect(read.value >= 0 && read.value <= 1400).toBe(true);
        },
      ),
    );
  });

  it('keep to a range of the caller’s own', () => {
    const range = { minimum: kpaDifference(1), maximum: kpaDifference(70) };
    expect(parsePressureDifference('5', 'kPa', range)).toEqual({ ok: true, value: 5 });
    expect(parsePressureDifference('0', 'psi', range)).toMatchObject({ problem: 'out-of-range' });
  });

  it('read a true minus as it is shown', () => {
    const range = { minimum: kpaDifference(-70), maximum: kpaDifference(70) };
    expect(parsePressureDifference('−4 kPa', 'kPa', range)).toEqual({ ok: true, value: -4 });
  });
});
