import { createHash, createHmac, hkdfSync } from 'node:crypto';
import { env } from '~/env.server';

type Purpose = 'sign-in code' | 'sign-in cookie' | 'sign-in strategy' | 'client address';

const kept = new Map<Purpose, string>();

/**
 * 64 hex characters for one purpose, drawn from the configured secret: what leaks of one key says
 * nothing about another (HKDF, RFC 5869).
 */
export function keyFor(purpose: Purpose): string {
  const known = kept.get(purpose);
  if (known) return known;
  const drawn = hkdfSync('sha256', env.SESSION_SECRET, 'valveside', purpose, 32);
  const key = Buffer.from(drawn).toString('hex');
  kept.set(purpose, key);
  return key;
}

const hmac = (purpose: Purpose, text: string) =>
  createHmac('sha256', keyFor(purpose)).update(text).digest('hex');

/** Of a code, bound to its challenge: six digits alone would be found by trying all of them. */
export const codeHmac = (challengeId: string, code: string) =>
  hmac('sign-in code', `${challengeId}:${code}`);

/** Of a client's address, so that the table of challenges holds none. */
export const clientHmac = (address: string) => hmac('client address', address);

/** Of a session's token. It has 256 random bits, so a plain hash is enough. */
export const tokenHash = (token: string) => createHash('sha256').update(token).digest('hex');
