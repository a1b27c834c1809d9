import type { PhoneClock } from './clock';
import type { RunState } from './store';
import { longestRunMs } from './wire-fields';

/** Time since a run's start, by this phone. */
export interface RunTimes {
  /** The run starts now. */
  readonly begin: (runId: string) => void;
  /** Milliseconds since the run's start, not rounded, 0 to 24 h. */
  readonly elapsedMs: (run: RunState) => number;
}

/**
 * A run that began on this page is timed by the monotonic clock alone. After a reload, one that
 * began on this phone goes on from its last own event by the wall clock that stood beside it; for
 * another phone's run the server's clock is the only common one.
 */
export function createRunTimes(clock: PhoneClock, deviceId: string): RunTimes {
  /** Of each run, `clock.monotonic()` at its start. */
  const zeros = new Map<string, number>();

  function zeroOf(run: RunState): number {
    const known = zeros.get(run.id);
    if (known !== undefined) return known;
    const last = run.log.findLast((entry) => entry.deviceId === deviceId)?.event;
    if (!last) return clock.monotonic() - (clock.serverNow() - Date.parse(run.startedAt));
    const since = clock.wall() - Date.parse(last.deviceTime);
    const zero = clock.monotonic() - last.atMs - Math.max(0, since);
    zeros.set(run.id, zero);
    return zero;
  }

  return {
    begin: (runId) => void zeros.set(runId, clock.monotonic()),
    elapsedMs: (run) => Math.min(longestRunMs, Math.max(0, clock.monotonic() - zeroOf(run))),
  };
}
