import { createHash } from 'node:crypto';
import { expect, it } from 'vitest';
import { goldenAdvice } from './golden';

/**
 * When this fails and the change is meant: raise ENGINE_VERSION in index.ts, since the same log
 * now gives another answer, and put the printed hash here.
 */
const GOLDEN_SHA256 = '9621ef9aa9657437fff416b63ea35517fc19627bbc21174e70d7eec43eb9bccd';

it('the golden log gives the committed advice, byte for byte', () => {
  const hash = createHash('sha256').update(goldenAdvice()).digest('hex');
  expect(hash, `the golden log now hashes to ${hash}`).toBe(GOLDEN_SHA256);
}, 60_000);
