import { createClock, type PhoneClock, type Ticks } from './clock';
import { type Device, openDevice } from './device';
import { createOutbox, type Outbox } from './outbox';
import type { OutboxRequest } from './outbox-items';
import { memoryStorage, type OutboxStorage } from './outbox-storage';
import { createRunTimes, type RunTimes } from './run-times';
import { createPhoneStore, numberEvents, type PhoneStore } from './store';
import { createTransport, type Fetch, type Transport } from './transport';
import type { AppendAnswer } from './wire';

/** Everything that one phone keeps and does: what a page works with, and a test builds anew. */
export interface Phone {
  readonly device: Device;
  readonly clock: PhoneClock;
  readonly times: RunTimes;
  readonly store: PhoneStore;
  readonly outbox: Outbox;
  readonly transport: Transport;
}

export interface PhoneParts {
  readonly ticks: Ticks;
  readonly device: Device;
  readonly fetch: Fetch;
  readonly storage: OutboxStorage;
  readonly after: (ms: number, then: () => void) => () => void;
  readonly random: () => number;
}

export function createPhone(parts: PhoneParts): Phone {
  const clock = createClock(parts.ticks);
  const store = createPhoneStore();
  const transport = createTransport(clock, parts.fetch);
  const outbox = createOutbox({
    storage: parts.storage,
    send: transport.send,
    after: parts.after,
    random: parts.random,
    onAcknowledged: (request, body) => takeAnswer(store, request, body),
    onChange: (state) => store.setState({ outbox: state }),
  });
  const times = createRunTimes(clock, parts.device.id);
  return { device: parts.device, clock, times, store, outbox, transport };
}

function takeAnswer(store: PhoneStore, request: OutboxRequest, body: unknown) {
  const first = request.items[0];
  if (first?.subject !== 'event' || first.needs === null) return;
  numberEvents(store, first.needs, (body as AppendAnswer).stored);
}

let kept: Phone | undefined;

/** The phone of this page. Only in a browser: nothing of it may be shared on a server. */
export function thisPhone(): Phone {
  if (typeof window === 'undefined') throw new Error('there is no phone on the server');
  kept ??= openPhone();
  return kept;
}

function openPhone(): Phone {
  const phone = createPhone({
    ticks: { monotonic: () => performance.now(), wall: () => Date.now() },
    device: openDevice(keptByBrowser()),
    fetch: (url, init) => fetch(url, init),
    storage: memoryStorage(),
    after: (ms, then) => {
      const timer = setTimeout(then, ms);
      return () => clearTimeout(timer);
    },
    random: Math.random,
  });
  listen(phone, window);
  return phone;
}

function keptByBrowser(): Storage | undefined {
  try {
    return window.localStorage;
  } catch {
    return undefined;
  }
}

/** Ties a phone to its page: waking, signal, leaving. */
export function listen(phone: Phone, page: Window): void {
  const wake = () => {
    if (page.document.visibilityState !== 'visible') return;
    phone.clock.wake();
    phone.outbox.flush();
  };
  page.document.addEventListener('visibilitychange', wake);
  page.addEventListener('pageshow', wake);
  page.addEventListener('online', () => phone.outbox.flush());
  page.addEventListener('pagehide', () => phone.outbox.flushBeforeLeaving());
  page.addEventListener('beforeunload', (event) => {
    const { pending, refused } = phone.outbox.state();
    if (pending + refused.length > 0) event.preventDefault();
  });
}
