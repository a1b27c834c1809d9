import type { PressureUnit } from '~/units';
import { endFill, takeBack, tap } from './commands';
import { type LiveSource, lastCallShown } from './live-driver';
import { endOf, fillEventsOf } from './log';
import type { Phone } from './phone';
import type { RunState } from './store';
import type { Ending } from './wire-events';

export interface StoreSourceOptions {
  tireName: string;
  unit: PressureUnit;
  /** Somebody who only taps has asked to end the fill. */
  onMayNotEnd: () => void;
}

/** The live screen's source for a real fill: the phone's own store, and the outbox behind it. */
export function storeSource(
  phone: Phone,
  runId: string,
  { tireName, unit, onMayNotEnd }: StoreSourceOptions,
): LiveSource {
  const run = (): RunState => {
    const known = phone.store.getState().runs[runId];
    if (!known) throw new Error(`fill ${runId} is not on this phone`);
    return known;
  };
  const elapsed = () => phone.times.elapsedMs(run()) / 1000;
  return {
    setup: run().setup,
    tireName,
    unit,
    events: () => fillEventsOf(run().log),
    subscribe: (listener) =>
      phone.store.subscribe((state, before) => {
        if (state.runs[runId] !== before.runs[runId]) listener();
      }),
    now: elapsed,
    wallClock: (at) => new Date(phone.clock.wall() + (at - elapsed()) * 1000),
    tap: (event, at) => tap(runId, event, at, phone),
    takeBack: (id) => void takeBack(runId, id, phone),
    end: () => {
      if (run().mayEnd) endFill(runId, endingOf(run()), phone);
      else onMayNotEnd();
    },
    ended: () => endOf(run().log) !== undefined,
  };
}

/** How a fill ends that is ended now: as the screen last said, or else it was stopped. */
function endingOf(run: RunState): Ending {
  const call = lastCallShown(fillEventsOf(run.log));
  return call === 'done' || call === 'cannot-reach' ? call : 'stopped';
}
