import { describe, expect, it } from 'vitest';
import { formatCountdown, formatDuration, formatRoughDuration, seconds } from './index';

describe('times', () => {
  it.each([
    [0, '0:00'],
    [41.6, '0:42'],
    [59.6, '1:00'],
    [725, '12:05'],
    [3725, '1:02:05'],
  ])('that have passed: %f s is %s', (value, shown) => {
    expect(formatDuration(seconds(value))).toBe(shown);
  });

  it('that have passed are not below zero', () => {
    expect(() => formatDuration(seconds(-1))).toThrow('duration in s: -1 is below 0');
  });

  it.each([
    [41.2, false, '0:42'],
    [0.1, false, '0:01'],
    [0, false, '0:00'],
    [-3, false, '0:00'],
    [59, false, '0:59'],
    [59.5, false, 'about 1 min'],
    [185, false, 'about 3 min'],
    [41.2, true, 'about 40 s'],
    [2, true, 'about 10 s'],
  ])('still to come: %f s (vague: %s) is %s', (value, vague, shown) => {
    expect(formatCountdown(seconds(value), { vague })).toBe(shown);
  });

  it.each([
    [24, 'about 20 s'],
    [55, 'about 1 min'],
    [5390, 'about 90 min'],
    [7000, 'about 2 h'],
  ])('in words: %i s is %s', (value, shown) => {
    expect(formatRoughDuration(seconds(value))).toBe(shown);
  });
});
