import { expect, test } from 'vitest';
import type { Advice } from '~/air';
import { clockText, countdownText, followCountdown } from './countdown';

const spread = (p50: number, half: number) => ({ p10: p50 - half, p50, p90: p50 + half });
const advice = (call: Advice['call'], changeIn?: Advice['changeIn']): Advice => ({
  call,
  reason: 'air-goes-in',
  changeIn,
  supplyKpa: spread(750, 5),
  tireKpa: spread(700, 2),
  loaded: 1,
  flowsIn: 1,
});

test('runs down evenly while the forecast wobbles', () => {
  const first = followCountdown(undefined, advice('keep-on', spread(42, 4)), 10);
  const second = followCountdown(first, advice('keep-on', spread(40.4, 4)), 11);
  expect(second?.endsAt).toBe(first?.endsAt);
});

test('follows a forecast that has moved away', () => {
  const first = followCountdown(undefined, advice('keep-on', spread(42, 4)), 10);
  expect(followCountdown(first, advice('keep-on', spread(20, 4)), 11)?.endsAt).toBe(31);
});

test('starts anew with another call', () => {
  const first = followCountdown(undefined, advice('wait', spread(20, 4)), 10);
  expect(followCountdown(first, advice('keep-on', spread(20.5, 4)), 11)?.endsAt).toBe(31.5);
});

test('an unknown change has no countdown', () => {
  expect(followCountdown(undefined, advice('wait'), 0)).toBeUndefined();
});

test.each([
  [42, false, { figure: '0:42' }],
  [9, false, { figure: '0:09' }],
  [0.3, false, { figure: 'soon' }],
  [-5, false, { figure: 'soon' }],
  [47, true, { before: 'about', figure: '0:50' }],
  [58, true, { before: 'about', figure: '1', after: 'min' }],
  [60, false, { before: 'about', figure: '1', after: 'min' }],
  [170, false, { before: 'about', figure: '3', after: 'min' }],
] as const)('%s s, vague %s, reads as it should', (left, vague, text) => {
  expect(countdownText({ call: 'wait', endsAt: 100 + left, vague }, 100)).toEqual(text);
});

test('a clock time is rounded down, so that "off by" never comes too late', () => {
  expect(clockText(new Date(2026, 5, 1, 10, 42, 34))).toBe('10:42:30');
  expect(clockText(new Date(2026, 5, 1, 9, 2, 4))).toBe('9:02:00');
});
