import { expect, test } from 'vitest';
import { agoWords, deviceWords } from './device-words';

// The shape of these lines is RFC 9110's, 10.1.5; the names are made up but for the parts that every
// browser carries.
test.each([
  ['Mozilla/5.0 (X11; Linux x86_64; rv:9.0) Gecko/20100101 Roamer/130.0', 'Roamer · Linux x86_64'],
  [
    'Mozilla/5.0 (Linux; Android 14; K) AppleWebKit/537.36 (KHTML, like Gecko) Roamer/130.0 Mobile Safari/537.36',
    'Roamer · Android 14',
  ],
  [
    'Mozilla/5.0 (Slate; CPU OS 17_5) AppleWebKit/605.1.15 (KHTML, like Gecko) Version/17.5 Mobile/15E148 Safari/604.1',
    'Safari · Slate',
  ],
  ['Roamer', 'A browser that does not say its name'],
  ['', 'A browser that does not say its name'],
])('%s reads as %s', (userAgent, words) => {
  expect(deviceWords(userAgent)).toBe(words);
});

test.each([
  [-60_000, 'just now'],
  [9 * 60_000, 'just now'],
  [10 * 60_000, '10 minutes ago'],
  [60 * 60_000, '1 hour ago'],
  [23 * 3_600_000, '23 hours ago'],
  [24 * 3_600_000, '1 day ago'],
  [72 * 3_600_000, '3 days ago'],
])('%d ms is %s', (milliseconds, words) => {
  const now = new Date(Date.UTC(2026, 0, 10));
  expect(agoWords(new Date(now.getTime() - milliseconds), now)).toBe(words);
});
