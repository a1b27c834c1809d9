import { createHash } from 'node:crypto';
import { expect, it } from 'vitest';
import { goldenAdvice } from './golden';

/**
 * When this fails and the change is meant: raise ENGINE_VERSION in index.ts, since the same log
 * now gives another answer, and put the printed hash here.
 */
const GOLDEN_SHA256 = 'f61c3860837b6452b2c4d28ebdc328d349f22c225637c0493bfb3ba4cb7011ee';

it('the golden log gives the committed advice, byte for byte', () => {
  const hash = createHash('sha256').update(goldenAdvice()).digest('hex');
  expect(hash, `the golden log now hashes to ${hash}`).toBe(GOLDEN_SHA256);
}, 60_000);
