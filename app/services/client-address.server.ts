import { AsyncLocalStorage } from 'node:async_hooks';
import { subscribe } from 'node:diagnostics_channel';
import type { IncomingMessage } from 'node:http';
import { isIPv6 } from 'node:net';
import { env } from '~/env.server';

// The server that comes with React Router hands on no peer address. Node says on this channel that
// a request starts, in the same turn in which it is then handled.
const kept = globalThis as typeof globalThis & { valvesidePeers?: AsyncLocalStorage<string> };
if (!kept.valvesidePeers) {
  const peers = new AsyncLocalStorage<string>();
  kept.valvesidePeers = peers;
  subscribe('http.server.request.start', (message) => {
    const { request } = message as { request: IncomingMessage };
    peers.enterWith(request.socket.remoteAddress ?? '');
  });
}

/** The address at the other end of the connection that is being answered; empty when not known. */
export const peerAddress = (): string => kept.valvesidePeers?.getStore() ?? '';

/** Where the request came from, as one key for limits: an IPv4 address or an IPv6 /64. */
export function clientAddress(request: Request): string {
  const forwarded = request.headers.get('X-Forwarded-For');
  return limitKey(pickAddress(peerAddress(), forwarded, env.TRUSTED_PROXIES));
}

/**
 * The address that the outermost trusted proxy saw. Everything left of it is what a client wrote
 * itself. With no trusted proxy the header is not looked at.
 */
export function pickAddress(peer: string, forwarded: string | null, proxies: number): string {
  if (proxies === 0) return peer;
  const seen = (forwarded ?? '').split(',').map((part) => part.trim());
  return seen.at(-proxies) || peer;
}

/** One subscriber has a whole IPv6 /64, so that is what is counted. */
export function limitKey(address: string): string {
  const bare = address.replace(/^::ffff:(?=\d+\.)/i, '');
  if (!isIPv6(bare)) return bare || 'unknown';
  const [head = '', tail] = bare.toLowerCase().split('::');
  const left = head === '' ? [] : head.split(':');
  const right = tail ? tail.split(':') : [];
  const gap = tail === undefined ? 0 : 8 - left.length - right.length;
  const groups = [...left, ...Array<string>(Math.max(0, gap)).fill('0'), ...right];
  const network = groups.slice(0, 4).map((group) => group.replace(/^0+(?=.)/, ''));
  return `${network.join(':')}::/64`;
}
