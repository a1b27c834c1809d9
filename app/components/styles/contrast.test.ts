import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';

const css = readFileSync(new URL('./tokens.css', import.meta.url), 'utf8');
const themes = ['day', 'dusk'] as const;
type Theme = (typeof themes)[number];

/** The colour of a token, #rrggbb, from `light-dark(day, dusk)`. */
function token(name: string, theme: Theme): string {
  const found = new RegExp(`--${name}: light-dark\\((#[0-9a-f]{6}), (#[0-9a-f]{6})\\)`).exec(css);
  if (!found) throw new Error(`no token --${name}`);
  return found[theme === 'day' ? 1 : 2] as string;
}

/** Relative luminance and contrast ratio: WCAG 2.2, "contrast ratio" (formula from memory). */
function luminance(colour: string): number {
  const [r, g, b] = [1, 3, 5].map((start) => {
    const share = Number.parseInt(colour.slice(start, start + 2), 16) / 255;
    return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
  }) as [number, number, number];
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

function contrast(one: string, two: string): number {
  const [low, high] = [luminance(one), luminance(two)].sort((a, b) => a - b) as [number, number];
  return (high + 0.05) / (low + 0.05);
}

test('the formula gives 21 for black on white and 1 for a colour on itself', () => {
  expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 9);
  expect(contrast('#c24a00', '#c24a00')).toBe(1);
});

const textPairs = [
  ['ink', 'paper'],
  ['quiet', 'paper'],
  ['ink', 'key'],
  ['paper', 'ink'],
  ['on-in', 'in'],
] as const;

for (const theme of themes) {
  test.each(textPairs)(`${theme}: %s on %s is 7 : 1 or better`, (text, ground) => {
    expect(contrast(token(text, theme), token(ground, theme))).toBeGreaterThanOrEqual(7);
  });

  test.each([
    ['air', 'head'],
    ['out', 'paper'],
    ['head', 'paper'],
    ['ink', 'paper'],
  ] as const)(`${theme}: %s and %s, neighbours in the vessel, differ by 3 : 1`, (one, two) => {
    expect(contrast(token(one, theme), token(two, theme))).toBeGreaterThanOrEqual(3);
  });
}

test.each([
  ['ink', 'paper'],
  ['on-in', 'in'],
] as const)('day: the call and its number, %s on %s, is 15 : 1 or better', (text, ground) => {
  expect(contrast(token(text, 'day'), token(ground, 'day'))).toBeGreaterThanOrEqual(15);
});
