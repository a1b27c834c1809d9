import type { Problem } from './outbox-items';

/** An answer of the server. What never came from it (no network, a portal's page) is no answer. */
export interface Answer {
  readonly status: number;
  /** The parsed JSON. */
  readonly body: unknown;
  /** From `Retry-After`. */
  readonly retryAfterMs?: number;
}

export type Verdict =
  | { readonly kind: 'acknowledged' }
  | { readonly kind: 'retry'; readonly afterMs: number }
  | { readonly kind: 'signed-out' }
  /** Only those at the named places, or all when none is named. */
  | {
      readonly kind: 'refused';
      readonly problem: Problem;
      readonly places: ReadonlyMap<number, Problem>;
    };

/** Statuses that are worth another try as they are: timeout, too early, too many. */
const passing = new Set([408, 425, 429]);

/** What is to be done with what was sent; the status decides. */
export function judge({ status, body, retryAfterMs = 0 }: Answer): Verdict {
  if (status >= 200 && status < 300) return { kind: 'acknowledged' };
  if (status === 401) return { kind: 'signed-out' };
  if (status >= 500 || status < 400 || passing.has(status)) {
    return { kind: 'retry', afterMs: retryAfterMs };
  }
  return refusal(status, body);
}

function refusal(status: number, body: unknown): Verdict {
  const told = (body ?? {}) as { code?: unknown; detail?: unknown; errors?: unknown };
  const problem: Problem = {
    status,
    code: typeof told.code === 'string' ? told.code : 'refused',
    detail: typeof told.detail === 'string' ? told.detail : 'The server does not take it.',
  };
  const errors = Array.isArray(told.errors) ? (told.errors as Record<string, unknown>[]) : [];
  const places = new Map<number, Problem>();
  for (const error of errors) {
    if (typeof error.index !== 'number' || places.has(error.index)) continue;
    places.set(error.index, { ...problem, ...namedBy(error) });
  }
  const first = errors[0];
  const whole = first && places.size === 0 ? namedBy(first) : {};
  return { kind: 'refused', problem: { ...problem, ...whole }, places };
}

const namedBy = ({ field, value, expected }: Record<string, unknown>) => ({
  field: String(field),
  value,
  expected: String(expected),
});

/** Longest wait between two attempts, ms. */
const longestWait = 30_000;
const shortestWait = 500;

/**
 * Full jitter: anywhere between nothing and a limit that doubles, so that phones which lost the
 * same server don't return at the same moment.
 * @param attempt 1 for the first failure; @param random 0 to 1
 */
export function waitBefore(attempt: number, random: number, afterMs = 0): number {
  const limit = Math.min(longestWait, shortestWait * 2 ** Math.min(attempt, 10));
  return afterMs + random * limit;
}
