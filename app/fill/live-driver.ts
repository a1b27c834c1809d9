import type { Advice, Fill, FillEvent, FillSetup } from '~/air';
import type { PressureUnit } from '~/units';

type WithoutStamp<T> = T extends unknown ? Omit<T, 'at' | 'id'> : never;

/** An event as a screen makes it: the source adds the time, the id and who sent it. */
export type NewFillEvent = WithoutStamp<FillEvent>;

/**
 * What the live screen needs to run one fill, whoever keeps the log: the phone's store behind a
 * real fill, or the simulated coach behind a practice. Times are seconds since the fill's start.
 * The functions stand alone: they are passed on without their object.
 */
export interface LiveSource {
  /** Frozen when the fill began. Another set-up is another source. */
  readonly setup: FillSetup;
  /** As the person knows it: "Steer left". */
  readonly tireName: string;
  readonly unit: PressureUnit;
  /** Everything known so far, in any order. The same array until something changes. */
  readonly events: () => readonly FillEvent[];
  /** Calls the listener after every change of `events()` or `ended()`; returns how to stop. */
  readonly subscribe: (listener: () => void) => () => void;
  /** Seconds since the fill's start, now. */
  readonly now: () => number;
  /** The clock on the wall at a time of the fill, for "Off by 10:42:30". */
  readonly wallClock: (at: number) => Date;
  /** Records an event that happened at `at` (press-down, not release); returns its id. */
  readonly tap: (event: NewFillEvent, at: number) => string;
  /** Takes back the event with that id, now. */
  readonly takeBack: (id: string) => void;
  /** The person is finished with this tire. */
  readonly end: () => void;
  /** True once an end is known, from this phone or another. */
  readonly ended: () => boolean;
}

/** One fill as a pure reading of its log: applies what is new, then advises. */
export class LiveReader {
  readonly #fill: Fill;
  readonly #applied = new Set<string>();

  constructor(fill: Fill) {
    this.#fill = fill;
  }

  /** Applies events not seen before. An event without id is told apart by its content. */
  read(events: readonly FillEvent[]): void {
    for (const event of events) {
      const key = event.id ?? JSON.stringify(event);
      if (this.#applied.has(key)) continue;
      this.#applied.add(key);
      this.#fill.apply(event);
    }
  }

  advise(at: number): Advice {
    return this.#fill.advise(at);
  }
}

/** The last call that a screen recorded, so that a reload doesn't record it a second time. */
export function lastCallShown(events: readonly FillEvent[]): Advice['call'] | undefined {
  let last: (FillEvent & { type: 'call-shown' }) | undefined;
  for (const event of events) {
    if (event.type === 'call-shown' && (!last || event.at >= last.at)) last = event;
  }
  return last?.call;
}
