import { createServer, get, type IncomingMessage } from 'node:http';
import type { AddressInfo } from 'node:net';
import { expect, test } from 'vitest';
import { limitKey, peerAddress, pickAddress } from './client-address.server';

test('without a trusted proxy only the peer counts', () => {
  expect(pickAddress('192.0.2.1', '203.0.113.5', 0)).toBe('192.0.2.1');
});

test('behind proxies the outermost one that is trusted says who asked', () => {
  const forwarded = '10.9.9.9, 203.0.113.5, 198.51.100.2';
  expect(pickAddress('192.0.2.1', forwarded, 1)).toBe('198.51.100.2');
  expect(pickAddress('192.0.2.1', forwarded, 2)).toBe('203.0.113.5');
});

test('what a trusted proxy did not say is the peer', () => {
  expect(pickAddress('192.0.2.1', null, 1)).toBe('192.0.2.1');
  expect(pickAddress('192.0.2.1', '203.0.113.5', 2)).toBe('192.0.2.1');
});

test.each([
  ['192.0.2.1', '192.0.2.1'],
  ['::ffff:192.0.2.1', '192.0.2.1'],
  ['2001:db8:1:2:3:4:5:6', '2001:db8:1:2::/64'],
  ['2001:0DB8:0001:0002::9', '2001:db8:1:2::/64'],
  ['2001:db8::5', '2001:db8:0:0::/64'],
  ['::1', '0:0:0:0::/64'],
  ['', 'unknown'],
])('%s is counted as %s', (address, key) => {
  expect(limitKey(address)).toBe(key);
});

test('the peer’s address reaches whatever handles the request', async () => {
  const seen: string[] = [];
  const server = createServer(async (_, response) => {
    await new Promise((resolve) => setImmediate(resolve));
    seen.push(peerAddress());
    response.end();
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const { port } = server.address() as AddressInfo;
  for (const localAddress of ['127.0.0.1', '127.0.0.2']) {
    const answer = await new Promise<IncomingMessage>((resolve, reject) => {
      get({ host: '127.0.0.1', port, localAddress }, resolve).on('error', reject);
    });
    answer.resume();
  }
  server.close();
  expect(seen).toEqual(['127.0.0.1', '127.0.0.2']);
});
