import { describe, expect, it } from 'vitest';
import { createClock } from './clock';
import type { OutboxRequest } from './outbox-items';
import { createTransport } from './transport';

const request = (body: object): OutboxRequest => ({
  method: 'POST',
  address: '/api/v1/runs/x/events',
  body,
  items: [],
});

function network(answer: () => Response) {
  let ms = 0;
  const clock = createClock({ monotonic: () => ms, wall: () => 1_000_000 + ms });
  const seen: RequestInit[] = [];
  const transport = createTransport(clock, async (_, init) => {
    seen.push(init);
    ms += 40;
    return answer();
  });
  return { clock, seen, transport };
}

const ours = (body: unknown, init: ResponseInit = {}) =>
  Response.json(body, { ...init, headers: { 'X-Server-Time': '5000020', ...init.headers } });

describe('the transport', () => {
  it('sends JSON that outlives the page, and takes the server’s time from the answer', async () => {
    const { clock, seen, transport } = network(() => ours({ lastSeq: 3 }));
    expect(await transport.send(request({ v: 1 }))).toEqual({ status: 200, body: { lastSeq: 3 } });
    expect(seen[0]).toMatchObject({
      method: 'POST',
      body: '{"v":1}',
      keepalive: true,
      headers: { 'Content-Type': 'application/json' },
    });
    // 20 ms after the middle of the round trip.
    expect(clock.serverNow()).toBe(5_000_040);
  });

  it('asks for no keepalive above what browsers allow', async () => {
    const { seen, transport } = network(() => ours({}));
    await transport.send(request({ text: 'x'.repeat(60_000) }));
    expect(seen[0]?.keepalive).toBe(false);
  });

  it('hands refusals on, with the wait that the server asks for', async () => {
    const { transport } = network(() =>
      ours({ code: 'slow' }, { status: 429, headers: { 'Retry-After': '4' } }),
    );
    expect(await transport.send(request({}))).toEqual({
      status: 429,
      body: { code: 'slow' },
      retryAfterMs: 4000,
    });
  });

  it.each([
    ['a campground’s sign-in page', () => new Response('<html>Welcome</html>', { status: 200 })],
    ['a proxy’s refusal', () => new Response('Forbidden', { status: 403 })],
  ])('takes %s for no answer', async (_, answer) => {
    const { clock, transport } = network(answer);
    await expect(transport.send(request({}))).rejects.toThrow();
    expect(clock.offsetMs()).toBeNull();
  });
});
