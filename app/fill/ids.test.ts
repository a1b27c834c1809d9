import { describe, expect, it } from 'vitest';
import { newId } from './ids';

/** RFC 9562: version 4, variant 10. */
const version4 = /^[0-9a-f]{8}-[0-9a-f]{4}-4[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/;

describe('newId', () => {
  it('takes the browser’s own UUID where there is one', () => {
    const own = '3f0c8a52-6b1e-4d0f-9a7c-2e5d8b914c66' as const;
    const source = { randomUUID: () => own, getRandomValues: crypto.getRandomValues };
    expect(newId(source)).toBe(own);
  });

  it('draws a version 4 UUID by hand outside a secure context', () => {
    const source = { getRandomValues: crypto.getRandomValues.bind(crypto) };
    const ids = Array.from({ length: 1000 }, () => newId(source));
    for (const id of ids) expect(id).toMatch(version4);
    expect(new Set(ids).size).toBe(1000);
  });

  it('sets version and variant whatever bytes come', () => {
    const filled = (byte: number) => ({
      getRandomValues: ((bytes: Uint8Array) => bytes.fill(byte)) as Crypto['getRandomValues'],
    });
    expect(newId(filled(0))).toBe('00000000-0000-4000-8000-000000000000');
    expect(newId(filled(255))).toBe('ffffffff-ffff-4fff-bfff-ffffffffffff');
  });
});
