import { expect, test } from 'vitest';
import {
  afterReading,
  followForecast,
  type GaugeRow,
  offerRow,
  type RowWish,
  valueBefore,
  wantsTyping,
} from './gauge-row';

const step = 6.894757293168361;
const psi = (value: number) => value * step;
const wish = (middle: number, band = 1, count = 3): RowWish => ({
  forecast: { p10: psi(middle - band / 2), p50: psi(middle), p90: psi(middle + band / 2) },
  gaugeStepKpa: step,
  count,
});
const inPsi = (row: GaugeRow) => row.values.map((kpa) => Math.round(kpa / step));
const still = { now: 100, pressing: false };

test('offers the graduations around a sure forecast', () => {
  expect(inPsi(offerRow(wish(104.2)))).toEqual([103, 104, 105]);
});

test('offers graduations of the gauge even when the forecast lies between two', () => {
  for (const kpa of offerRow(wish(104.5)).values) {
    expect(kpa / step).toBeCloseTo(Math.round(kpa / step), 9);
  }
});

test('spreads the values while the forecast is wide, and says how coarse they are', () => {
  const row = offerRow(wish(103, 18));
  expect(inPsi(row)).toEqual([98, 103, 108]);
  expect(row.stepKpa).toBeCloseTo(psi(5), 9);
});

test('offers two values on a narrow screen', () => {
  expect(inPsi(offerRow(wish(104, 1, 2)))).toEqual([104, 105]);
});

test('never offers a pressure below zero', () => {
  expect(inPsi(offerRow(wish(0)))).toEqual([0, 1, 2]);
});

test('keeps the values while the forecast moves among them', () => {
  const row = offerRow(wish(104));
  expect(followForecast(row, wish(105.4), still)).toBe(row);
});

test('offers anew when the forecast has left the values', () => {
  const row = followForecast(offerRow(wish(104)), wish(105.6), still);
  expect(inPsi(row)).toEqual([105, 106, 107]);
  expect(row.changedAt).toBe(100);
});

test('keeps the values under a thumb, even when the forecast has left them', () => {
  const row = offerRow(wish(104));
  expect(followForecast(row, wish(120), { now: 100, pressing: true })).toBe(row);
});

test('offers anew at the first forecast after a reading, with no warning needed', () => {
  const row = followForecast(afterReading(offerRow(wish(104, 18)), 0), wish(104.4), still);
  expect(inPsi(row)).toEqual([103, 104, 105]);
  expect(valueBefore(row, 1, 100.1)).toBeUndefined();
});

test('a press within 1.5 s of a change is asked about, a later one is not', () => {
  const row = followForecast(offerRow(wish(104)), wish(110), still);
  expect(valueBefore(row, 1, 101.4)).toBeCloseTo(psi(104), 9);
  expect(valueBefore(row, 1, 101.5)).toBeUndefined();
});

test('a value that stayed the same through a change is not asked about', () => {
  const changed = { ...offerRow(wish(104)), changedAt: 100, before: offerRow(wish(104)).values };
  expect(valueBefore(changed, 1, 100.2)).toBeUndefined();
});

test('three middle values in a row ask for typing; any other reading starts the count again', () => {
  const read = (row: GaugeRow, index: number) =>
    followForecast(afterReading(row, index), wish(104), still);
  const twice = read(read(offerRow(wish(104)), 1), 1);
  expect(wantsTyping(twice)).toBe(false);
  expect(wantsTyping(read(twice, 1))).toBe(true);
  expect(wantsTyping(read(read(twice, 0), 1))).toBe(false);
  expect(wantsTyping(read(read(read(twice, 1), -1), 1))).toBe(false);
});
