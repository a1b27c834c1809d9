import { expect, test } from 'vitest';
import { REASONS } from '~/air';
import { nextOf, reasonWords, whyOf } from './reason-words';

const figures = { target: '104.5 psi', tire: '101 psi', reach: '98 psi', valve: false };
/** `check` and `cannot-reach`, as REASONS groups them. */
const wantNext = [
  ...REASONS.slice(REASONS.indexOf('supply-not-moving')),
  'governor-too-low',
] as const;

test.each(REASONS)(
  '%s has a line of at most twenty words, without an exclamation mark',
  (reason) => {
    const why = whyOf(reason, figures);
    expect(why.length).toBeGreaterThan(8);
    expect(why.split(' ').length).toBeLessThanOrEqual(20);
    expect(why).not.toContain('!');
  },
);

test.each(wantNext)('%s says what to do next', (reason) => {
  expect(nextOf(reason, false)).toMatch(/\.$/);
});

test('a title is one to three words', () => {
  for (const { title } of Object.values(reasonWords)) {
    expect(title?.split(' ').length ?? 1).toBeLessThanOrEqual(3);
  }
});

test('a shut-off valve is opened and closed, not put on and taken off', () => {
  expect(whyOf('supply-below-tire', { ...figures, valve: true })).toBe(
    'Open now would let air out.',
  );
  expect(nextOf('low-air', true)).toBe('Close the valve. Stop lowering. Let the supply build up.');
});

test('cannot-reach names the pressure that this supply gives', () => {
  expect(whyOf('governor-too-low', figures)).toContain('98 psi');
  expect(whyOf('governor-too-low', { ...figures, reach: undefined })).toContain('104.5 psi');
});
