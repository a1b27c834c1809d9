import { expect, test } from 'vitest';
import { parsePressure } from '~/units';
import { problemWords } from './entry-words';
import { isFar } from './far-reading';

function refusal(text: string): string {
  const parsed = parsePressure(text, 'psi');
  if (parsed.ok) throw new Error(`${text} was read as ${parsed.value}`);
  return problemWords(parsed, 'psi');
}

test.each([
  ['12..5', '“12..5” is not a number. Type one like 104.5.'],
  ['1O5', '“1O5” is not a number. Type one like 104.5.'],
  ['', 'Type what the gauge shows.'],
  ['1041', 'Type a pressure from 0 to 203.1 psi.'],
])('“%s” is refused with what is expected', (text, words) => {
  expect(refusal(text)).toBe(words);
});

const forecast = { p10: 720, p50: 725, p90: 730 };

test('a reading near a sure forecast is taken as it is', () => {
  expect(isFar(725 + 40, forecast)).toBe(false);
});

test('a reading far from a sure forecast is asked about', () => {
  expect(isFar(725 + 42, forecast)).toBe(true);
  expect(isFar(725 - 42, forecast)).toBe(true);
});

test('the same reading is nothing odd while the forecast is wide', () => {
  expect(isFar(725 + 42, { p10: 660, p50: 725, p90: 790 })).toBe(false);
});
