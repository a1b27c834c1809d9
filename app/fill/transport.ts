import type { PhoneClock } from './clock';
import type { OutboxRequest } from './outbox-items';
import type { Answer } from './outbox-verdict';

/** Milliseconds since the epoch, on every answer of the API. */
const serverTimeHeader = 'X-Server-Time';

/** A request without an answer after this long is given up and tried again, ms. */
const patienceMs = 15_000;

/** What browsers let a leaving page still send, all together, bytes. */
const keepaliveBytes = 60_000;

/** The part of `fetch` that is needed, so that a test can stand in for the network. */
export type Fetch = (url: string, init: RequestInit) => Promise<Response>;

export interface Transport {
  readonly send: (request: OutboxRequest) => Promise<Answer>;
  readonly get: (address: string) => Promise<Answer>;
}

/** Sends JSON, and takes a sample of the server's clock from every answer. */
export function createTransport(clock: PhoneClock, fetch: Fetch): Transport {
  async function exchange(address: string, init: RequestInit): Promise<Answer> {
    const sentAt = clock.monotonic();
    const answer = await fetch(address, { ...init, signal: AbortSignal.timeout(patienceMs) });
    const receivedAt = clock.monotonic();
    const serverTime = Number(answer.headers.get(serverTimeHeader));
    // A campground's sign-in page answers everything with 200: only our server counts.
    if (!serverTime) throw new Error('this answer is not from the server');
    clock.sample({ sentAt, receivedAt, serverTime });
    const retryAfter = Number(answer.headers.get('Retry-After'));
    return {
      status: answer.status,
      body: await answer.json(),
      ...(retryAfter > 0 ? { retryAfterMs: retryAfter * 1000 } : {}),
    };
  }
  return {
    get: (address) => exchange(address, { method: 'GET', cache: 'no-store' }),
    send: ({ method, address, body }) => {
      const text = JSON.stringify(body);
      return exchange(address, {
        method,
        headers: { 'Content-Type': 'application/json' },
        body: text,
        // So that it arrives although the person goes to another page meanwhile.
        keepalive: text.length < keepaliveBytes,
      });
    },
  };
}
