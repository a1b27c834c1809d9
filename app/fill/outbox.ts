import {
  type Command,
  independentRequests,
  nextRequest,
  type OutboxItem,
  type OutboxRequest,
  type Problem,
  type RefusedItem,
} from './outbox-items';
import type { OutboxStorage } from './outbox-storage';
import { type Answer, judge, type Verdict, waitBefore } from './outbox-verdict';
import type { OutboxState } from './store';

export interface OutboxParts {
  readonly storage: OutboxStorage;
  /** Rejects when no answer of the server came. */
  readonly send: (request: OutboxRequest) => Promise<Answer>;
  /** Calls `then` after `ms`; returns how to call it off. */
  readonly after: (ms: number, then: () => void) => () => void;
  /** 0 to 1, for the jitter. */
  readonly random: () => number;
  readonly onAcknowledged: (request: OutboxRequest, body: unknown) => void;
  readonly onChange: (state: OutboxState) => void;
}

export interface Outbox {
  /** Takes in what an earlier page left, then sends. Before anything is added. */
  readonly load: () => Promise<void>;
  /** Queues in the order given and starts sending. */
  readonly add: (commands: readonly Command[]) => void;
  /** Tries at once, whatever wait is on: on opening, `online`, and when the page is visible. */
  readonly flush: () => void;
  /** Somebody has signed in again. */
  readonly resume: () => void;
  /** Sends all that can be understood out of turn, without waiting: the page is going. */
  readonly flushBeforeLeaving: () => void;
  /** Puts what was refused back into its place in the queue. */
  readonly retryRefused: () => void;
  readonly state: () => OutboxState;
}

/**
 * One queue for everything that is recorded. Sends in the order of recording, one request at a
 * time; what is not acknowledged is kept, here or in the list of what was refused.
 */
export function createOutbox(parts: OutboxParts): Outbox {
  let queue: readonly OutboxItem[] = [];
  let refused: readonly RefusedItem[] = [];
  let order = 0;
  let attempts = 0;
  let sending = false;
  let paused = false;
  let cancelWait: (() => void) | undefined;

  const state = (): OutboxState => ({
    pending: queue.length,
    refused,
    paused,
    retrying: cancelWait !== undefined,
  });
  const changed = () => parts.onChange(state());

  function refuse(items: readonly OutboxItem[], problemOf: (item: OutboxItem) => Problem) {
    const set = new Set(items.map(({ id }) => id));
    const more = items.map((item) => ({ item, problem: problemOf(item) }));
    refused = [...refused, ...more].sort((a, b) => a.item.order - b.item.order);
    queue = queue.filter(({ id }) => !set.has(id));
    void parts.storage.put(more.map(({ item, problem }) => ({ item, problem })));
    refuseDependents();
  }

  /** What builds on something refused can't be understood either: it waits with it. */
  function refuseDependents() {
    const without = new Set(refused.map(({ item }) => item.id));
    const dependent = queue.filter(({ needs }) => needs !== null && without.has(needs));
    if (dependent.length > 0) refuse(dependent, () => waitsForRefused);
  }

  function settle(request: OutboxRequest, verdict: Verdict, body: unknown) {
    if (verdict.kind === 'acknowledged') {
      const ids = new Set(request.items.map(({ id }) => id));
      queue = queue.filter(({ id }) => !ids.has(id));
      void parts.storage.remove([...ids]);
      parts.onAcknowledged(request, body);
    } else if (verdict.kind === 'signed-out') {
      paused = true;
    } else if (verdict.kind === 'refused') {
      const { places, problem } = verdict;
      const named = request.items.filter((_, index) => places.has(index));
      const problems = new Map(request.items.map(({ id }, index) => [id, places.get(index)]));
      refuse(named.length > 0 ? named : request.items, ({ id }) => problems.get(id) ?? problem);
    }
    if (verdict.kind === 'retry') wait(verdict.afterMs);
    else attempts = 0;
  }

  function wait(afterMs: number) {
    attempts += 1;
    cancelWait = parts.after(waitBefore(attempts, parts.random(), afterMs), () => {
      cancelWait = undefined;
      void work();
    });
  }

  async function work() {
    if (sending) return;
    sending = true;
    while (!paused && !cancelWait) {
      const request = nextRequest(queue);
      if (!request) break;
      const answer = await parts.send(request).catch(() => undefined);
      settle(request, answer ? judge(answer) : { kind: 'retry', afterMs: 0 }, answer?.body);
      changed();
    }
    sending = false;
  }

  function flush() {
    cancelWait?.();
    cancelWait = undefined;
    void work();
  }

  return {
    state,
    flush,
    load: async () => {
      const kept = await parts.storage.load();
      order = Math.max(0, ...kept.map(({ item }) => item.order));
      queue = kept.flatMap(({ item, problem }) => (problem ? [] : [item]));
      refused = kept.flatMap(({ item, problem }) => (problem ? [{ item, problem }] : []));
      changed();
      flush();
    },
    add: (commands) => {
      const items = commands.map((command) => {
        order += 1;
        return { ...command, order };
      });
      queue = [...queue, ...items];
      void parts.storage.put(items.map((item) => ({ item })));
      refuseDependents();
      changed();
      void work();
    },
    resume: () => {
      paused = false;
      changed();
      flush();
    },
    flushBeforeLeaving: () => {
      if (paused) return;
      // Nothing is taken off the queue by these answers: what comes back is sent again, and
      // sending twice stores once.
      for (const request of independentRequests(queue)) parts.send(request).catch(() => undefined);
    },
    retryRefused: () => {
      const items = refused.map(({ item }) => item);
      refused = [];
      queue = [...queue, ...items].sort((a, b) => a.order - b.order);
      void parts.storage.put(items.map((item) => ({ item })));
      changed();
      flush();
    },
  };
}

const waitsForRefused: Problem = {
  status: 0,
  code: 'waits-for-refused',
  detail: 'It belongs to something that was refused.',
};
