/** The log of a fill in one order that does not depend on arrival: by at, type, id or content. */
import type { FillEvent } from './contract';
import { checkEvent } from './validate';

/** Stable text of an event: keys in order, so that equal events compare equal. */
function contentOf(event: FillEvent): string {
  const entries = Object.entries(event).filter(([, value]) => value !== undefined);
  entries.sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0));
  return JSON.stringify(entries);
}

interface Entry {
  event: FillEvent;
  /** The id where there is one, else the content: what an event is the same by. */
  identity: string;
  content: string;
}

function compare(a: Entry, b: Entry): number {
  if (a.event.at !== b.event.at) return a.event.at - b.event.at;
  if (a.event.type !== b.event.type) return a.event.type < b.event.type ? -1 : 1;
  if (a.identity !== b.identity) return a.identity < b.identity ? -1 : 1;
  return a.content < b.content ? -1 : a.content > b.content ? 1 : 0;
}

export interface EventLog {
  /** Adds an event; the same id counts once (of two bodies the first in order counts). */
  add(event: FillEvent): void;
  /**
   * What had happened by `at`, in order. What was taken back by then is left out; an undo changes
   * nothing before its own time.
   */
  until(at: number): readonly FillEvent[];
  /** The time of the last event, 0 for an empty log. */
  lastAt(): number;
}

export function createEventLog(): EventLog {
  const known = new Map<string, Entry>();
  let sorted: Entry[] = [];
  let asked: { at: number; events: readonly FillEvent[] } | undefined;

  return {
    add(event) {
      checkEvent(event);
      const copy = { ...event };
      const content = contentOf(copy);
      const entry = { event: copy, identity: copy.id ?? content, content };
      const key = copy.id === undefined ? `content ${content}` : `id ${copy.id}`;
      const before = known.get(key);
      if (before && compare(before, entry) <= 0) return;
      known.set(key, entry);
      sorted = [...known.values()].sort(compare);
      asked = undefined;
    },
    lastAt() {
      return sorted[sorted.length - 1]?.event.at ?? 0;
    },
    until(at) {
      if (asked?.at === at) return asked.events;
      const taken = new Set<string>();
      const events: FillEvent[] = [];
      for (const { event } of sorted) {
        if (event.at <= at && event.type === 'taken-back') taken.add(event.of);
      }
      for (const { event } of sorted) {
        if (event.at > at) break;
        if (event.type === 'taken-back' || (event.id !== undefined && taken.has(event.id)))
          continue;
        events.push(event);
      }
      asked = { at, events };
      return events;
    },
  };
}
