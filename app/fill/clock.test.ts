import { describe, expect, it } from 'vitest';
import { createClock } from './clock';

/** A phone whose wall clock is `wrongBy` ahead of the server, and a network between the two. */
function world({ wrongBy = 0 } = {}) {
  const epoch = 1_800_000_000_000;
  let real = 0;
  let asleep = 0;
  let set = 0;
  const ticks = { monotonic: () => 500 + real - asleep, wall: () => epoch + real + wrongBy + set };
  const clock = createClock(ticks);
  return {
    clock,
    server: () => epoch + real,
    pass: (ms: number) => {
      real += ms;
    },
    /** The monotonic clock stands still meanwhile. */
    sleep: (ms: number) => {
      real += ms;
      asleep += ms;
    },
    setWall: (byMs: number) => {
      set += byMs;
    },
    /** A request that takes `out` ms there and `back` ms home. */
    ask: (out: number, back: number) => {
      const sentAt = clock.monotonic();
      real += out;
      const serverTime = epoch + real;
      real += back;
      clock.sample({ sentAt, receivedAt: clock.monotonic(), serverTime });
    },
  };
}

describe('the phone’s clock', () => {
  it('is the wall clock, and suspect, until the server has answered', () => {
    const { clock, server } = world({ wrongBy: 3_600_000 });
    expect(clock.serverNow() - server()).toBe(3_600_000);
    expect(clock.offsetMs()).toBeNull();
    expect(clock.suspect()).toBe(true);
  });

  it('knows the server’s time to half a round trip, though the wall clock is an hour off', () => {
    const { clock, server, ask } = world({ wrongBy: 3_600_000 });
    ask(20, 180);
    expect(Math.abs(clock.serverNow() - server())).toBeLessThanOrEqual(100);
    expect(clock.offsetMs()).toBeCloseTo(-3_600_000, -3);
    expect(clock.suspect()).toBe(false);
  });

  it('keeps the sample with the smallest round trip', () => {
    const { clock, server, ask } = world();
    ask(900, 100);
    ask(20, 30);
    const good = clock.serverNow() - server();
    expect(Math.abs(good)).toBeLessThanOrEqual(5);
    ask(800, 10);
    expect(clock.serverNow() - server()).toBeCloseTo(good, 6);
  });

  it('takes a worse sample once the best one is so old that drift counts for more', () => {
    const { clock, ask, server, pass } = world();
    ask(5, 15);
    expect(clock.serverNow() - server()).toBe(-5);
    pass(3_600_000);
    ask(100, 100);
    expect(clock.serverNow() - server()).toBe(0);
  });

  it('counts the time asleep when it wakes', () => {
    const { clock, server, ask, pass, sleep } = world();
    ask(10, 10);
    const before = clock.monotonic();
    pass(1000);
    sleep(60_000);
    clock.wake();
    expect(clock.monotonic() - before).toBe(61_000);
    expect(clock.serverNow()).toBe(server());
    expect(clock.suspect()).toBe(true);
    ask(10, 10);
    expect(clock.suspect()).toBe(false);
    expect(clock.monotonic() - before).toBe(61_020);
  });

  it('takes a wall clock put forward for no sleep, once the server has answered', () => {
    const { clock, server, ask, pass, setWall } = world();
    ask(10, 10);
    const before = clock.monotonic();
    setWall(3_600_000);
    pass(1000);
    clock.wake();
    expect(clock.suspect()).toBe(true);
    ask(10, 10);
    expect(clock.monotonic() - before).toBe(1020);
    expect(clock.serverNow()).toBe(server());
    expect(clock.offsetMs()).toBe(-3_600_000);
    expect(clock.suspect()).toBe(false);
  });

  it('goes on unmoved when the wall clock is put back', () => {
    const { clock, server, ask, pass, setWall } = world();
    ask(10, 10);
    const before = clock.monotonic();
    setWall(-3_600_000);
    pass(1000);
    clock.wake();
    expect(clock.monotonic() - before).toBe(1000);
    expect(clock.serverNow()).toBe(server());
    expect(clock.suspect()).toBe(true);
  });

  it('marks a jump of the offset by more than two seconds until a second sample agrees', () => {
    const { clock, ask } = world();
    ask(10, 10);
    const now = clock.monotonic();
    const jump = clock.serverNow() + 5000;
    clock.sample({ sentAt: now, receivedAt: now, serverTime: jump });
    expect(clock.suspect()).toBe(true);
    clock.sample({ sentAt: now, receivedAt: now, serverTime: jump });
    expect(clock.suspect()).toBe(false);
  });

  it('lets a small shift on waking pass', () => {
    const { clock, ask, sleep } = world();
    ask(10, 10);
    sleep(1500);
    clock.wake();
    expect(clock.suspect()).toBe(false);
  });
});
