import { expect, test } from 'vitest';
import { cautionsAfter } from '~/components/caution-words';
import { afterwardsKeys } from '~/fill/wire';
import { afterwardsWords } from './afterwards-words';

test('every key of the list has its words, and no words are left over', () => {
  expect(cautionsAfter).toHaveLength(afterwardsKeys.length);
  expect(afterwardsWords).toEqual({
    'chuck-off': 'Chuck off',
    'caps-on': 'Caps on',
    'hose-stowed': 'Hose off and stowed',
    'fitting-capped': 'Fitting capped',
    'supply-at-cut-out': 'Supply back at cut-out',
    'low-air-out': 'Low-air warning out',
    'chocks-away': 'Chocks away',
  });
});
