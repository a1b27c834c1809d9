import { expect, test } from 'vitest';
import { psi, psiToKpa } from '~/units';
import { scaleWords, tireLevels } from './tire-scale';

const kpa = (value: number) => psiToKpa(psi(value));

test('a tire at its target stands at the line', () => {
  const { line, level } = tireLevels(kpa(112), kpa(112), 'psi');
  expect(level).toBeCloseTo(line, 9);
});

test('4 psi below the target is a fifth of the vessel, which spans 20 psi', () => {
  const { line, level = 0 } = tireLevels(kpa(108), kpa(112), 'psi');
  expect(line - level).toBeCloseTo(20, 9);
});

test.each([
  [kpa(40), 0],
  [kpa(150), 100],
])('a pressure off the scale stays at its end', (pressure, height) => {
  expect(tireLevels(pressure, kpa(112), 'psi').level).toBe(height);
});

test('a tire that was not read has no level', () => {
  expect(tireLevels(undefined, kpa(112), 'bar').level).toBeUndefined();
});

test.each(['psi', 'kPa', 'bar'] as const)('the scale is stated in %s', (unit) => {
  expect(scaleWords(unit)).toContain(unit);
});
