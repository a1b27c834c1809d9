/**
 * A random UUID (version 4). `crypto.randomUUID` exists in secure contexts only, and a phone may
 * reach a coach's own server by plain HTTP, so the bytes are drawn by hand where it is missing.
 */
export function newId(source: Pick<Crypto, 'getRandomValues'> & Partial<Crypto> = crypto): string {
  if (source.randomUUID) return source.randomUUID();
  const bytes = source.getRandomValues(new Uint8Array(16));
  bytes[6] = (bytes[6]! & 0x0f) | 0x40; // version 4, RFC 9562
  bytes[8] = (bytes[8]! & 0x3f) | 0x80; // variant
  const hex = Array.from(bytes, (byte) => byte.toString(16).padStart(2, '0')).join('');
  return hex.replace(/^(.{8})(.{4})(.{4})(.{4})(.{12})$/, '$1-$2-$3-$4-$5');
}
