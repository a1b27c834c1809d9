import type { OutboxItem, Problem } from './outbox-items';

/** An item as it is kept, with the problem when the server has refused it. */
interface KeptItem {
  readonly item: OutboxItem;
  readonly problem?: Problem;
}

/** Where the outbox keeps what is not acknowledged. */
export interface OutboxStorage {
  /** All of it, by order. */
  readonly load: () => Promise<KeptItem[]>;
  /** Writes items, over an earlier copy of the same id. */
  readonly put: (items: readonly KeptItem[]) => Promise<void>;
  readonly remove: (ids: readonly string[]) => Promise<void>;
}

/** Lives as long as the page. */
export function memoryStorage(): OutboxStorage {
  const kept = new Map<string, KeptItem>();
  return {
    load: async () => [...kept.values()].sort((a, b) => a.item.order - b.item.order),
    put: async (items) => {
      for (const one of items) kept.set(one.item.id, one);
    },
    remove: async (ids) => {
      for (const id of ids) kept.delete(id);
    },
  };
}
