import { largestBatch } from './wire';
import type { WireEvent } from './wire-events';
import { wireVersion } from './wire-fields';

/** What a command records, for words on the screen. */
export type Subject = 'round' | 'cautions' | 'reading' | 'run' | 'event' | 'closing';

interface Queued {
  /** Unique in the outbox: the id of what is recorded. */
  readonly id: string;
  /** The path that it is sent to. */
  readonly address: string;
  /** Id of the command that has to be acknowledged before this one can be understood. */
  readonly needs: string | null;
}

export interface PutCommand extends Queued {
  readonly subject: Exclude<Subject, 'event'>;
  readonly body: object;
}

/** Goes with its neighbours of the same run in one batch. */
export interface EventCommand extends Queued {
  readonly subject: 'event';
  readonly deviceId: string;
  readonly body: WireEvent;
}

export type Command = PutCommand | EventCommand;

/** A command in the outbox. Lower numbers were recorded earlier and are sent first. */
export type OutboxItem = Command & { readonly order: number };

/** Why the server will not take an item, in words for the person. */
export interface Problem {
  readonly status: number;
  readonly code: string;
  readonly detail: string;
  /** What of it, where the server named it. */
  readonly field?: string;
  readonly value?: unknown;
  readonly expected?: string;
}

export interface RefusedItem {
  readonly item: OutboxItem;
  readonly problem: Problem;
}

export interface OutboxRequest {
  readonly method: 'PUT' | 'POST';
  readonly address: string;
  readonly body: object;
  /** What it carries; in a batch the place in the list is the index that a refusal names. */
  readonly items: readonly OutboxItem[];
}

/** The longest run of items from the front that one request can carry. */
export function nextRequest(queue: readonly OutboxItem[]): OutboxRequest | undefined {
  const first = queue[0];
  if (!first) return undefined;
  if (first.subject !== 'event') {
    return { method: 'PUT', address: first.address, body: first.body, items: [first] };
  }
  const items: (OutboxItem & EventCommand)[] = [];
  for (const item of queue) {
    if (item.subject !== 'event' || item.address !== first.address) break;
    if (item.deviceId !== first.deviceId || items.length === largestBatch) break;
    items.push(item);
  }
  return {
    method: 'POST',
    address: first.address,
    body: { v: wireVersion, deviceId: first.deviceId, events: items.map(({ body }) => body) },
    items,
  };
}

/** Requests that don't wait for each other: for the moment in which the page goes. */
export function independentRequests(queue: readonly OutboxItem[]): OutboxRequest[] {
  const waiting = new Set(queue.map(({ id }) => id));
  let free = queue.filter(({ needs }) => needs === null || !waiting.has(needs));
  const requests: OutboxRequest[] = [];
  for (let next = nextRequest(free); next; next = nextRequest(free)) {
    requests.push(next);
    free = free.slice(next.items.length);
  }
  return requests;
}
