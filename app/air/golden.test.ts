import { createHash } from 'node:crypto';
import { expect, it } from 'vitest';
import { goldenAdvice } from './golden';
import { GOLDEN_SHA256 } from './golden-hash';

it('the golden log gives the committed advice, byte for byte', () => {
  const hash = createHash('sha256').update(goldenAdvice()).digest('hex');
  expect(hash, `the golden log now hashes to ${hash}`).toBe(GOLDEN_SHA256);
}, 60_000);
