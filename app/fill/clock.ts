/** Where a phone reads time. `monotonic` never jumps, but stands still on some phones asleep. */
export interface Ticks {
  /** Milliseconds since some moment of its own. */
  readonly monotonic: () => number;
  /** Milliseconds since the epoch, as the phone's settings have it. */
  readonly wall: () => number;
}

/** When a request left, when its answer came (both monotonic), and the server's time in it. */
interface ClockSample {
  readonly sentAt: number;
  readonly receivedAt: number;
  /** Milliseconds since the epoch. */
  readonly serverTime: number;
}

export interface PhoneClock {
  /** Monotonic milliseconds with the time asleep counted in. */
  readonly monotonic: () => number;
  readonly wall: () => number;
  /** Best guess of the server's clock, milliseconds since the epoch. */
  readonly serverNow: () => number;
  /** Milliseconds from this phone's wall clock to the server's; null until a sample has come. */
  readonly offsetMs: () => number | null;
  /** The offset is unknown, or it has jumped and no second sample has confirmed the new one. */
  readonly suspect: () => boolean;
  readonly sample: (sample: ClockSample) => void;
  /** To be called when the page wakes: takes in the time that the monotonic clock slept. */
  readonly wake: () => void;
}

/** A jump by more than this is no drift, ms. */
const jumpMs = 2000;

/** Two clocks part by less than this, ms per ms (200 ppm; quartz keeps within 100). */
const drift = 0.0002;

/**
 * Keeps the offset to the server by the sample with the smallest round trip, since half of a round
 * trip is the most by which a sample can be wrong; an old sample counts as worse by the drift.
 */
export function createClock(ticks: Ticks): PhoneClock {
  let sleptMs = 0;
  /** Time that `wake` took for sleep and no sample has confirmed. */
  let guessedMs = 0;
  let jumped = false;
  /** Server's time less `monotonic()`, and the sample that it came from. */
  let best: { offset: number; tripMs: number; at: number } | undefined;
  const monotonic = () => ticks.monotonic() + sleptMs;
  let wallLessMonotonic = ticks.wall() - monotonic();

  function takeBackGuess() {
    sleptMs -= guessedMs;
    wallLessMonotonic += guessedMs;
    guessedMs = 0;
  }

  function sample({ sentAt, receivedAt, serverTime }: ClockSample) {
    const tripMs = receivedAt - sentAt;
    const near = jumpMs + tripMs / 2;
    let offset = serverTime - (sentAt + receivedAt) / 2;
    if (best && guessedMs > 0 && Math.abs(offset + guessedMs - best.offset) <= near) {
      // The server knows of no sleep: somebody has put the wall clock forward.
      offset += guessedMs;
      takeBackGuess();
    }
    jumped = best !== undefined && Math.abs(offset - best.offset) > near;
    const aged = best ? best.tripMs + (receivedAt - best.at) * drift : 0;
    if (!best || jumped || tripMs <= aged) best = { offset, tripMs, at: receivedAt };
    guessedMs = 0;
  }

  function wake() {
    const change = ticks.wall() - monotonic() - wallLessMonotonic;
    if (Math.abs(change) <= jumpMs) return;
    jumped = true;
    // Behind: somebody has put the wall clock back, and the monotonic clock is right.
    if (change > 0) {
      sleptMs += change;
      guessedMs = change;
    }
    wallLessMonotonic = ticks.wall() - monotonic();
    if (best) best = { ...best, tripMs: Number.POSITIVE_INFINITY };
  }

  return {
    monotonic,
    wall: ticks.wall,
    serverNow: () => monotonic() + (best ? best.offset : wallLessMonotonic),
    offsetMs: () => (best ? Math.round(monotonic() + best.offset - ticks.wall()) : null),
    suspect: () => best === undefined || jumped,
    sample,
    wake,
  };
}
