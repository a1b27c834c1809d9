import { randomUUID } from 'node:crypto';
import {
  type Advice,
  createFill,
  createPracticeCoach,
  type FillEvent,
  type FillSetup,
  type PracticeCoach,
  type PracticeOptions,
} from '~/air';
import { kpaPerPsi } from '~/units';

type WithoutStamp<T> = T extends unknown ? Omit<T, 'at' | 'id'> : never;

/** What one simulated fill left behind. */
export interface SimulatedFill {
  events: FillEvent[];
  /** Seconds since the fill's start. */
  endedAt: number;
  how: 'done' | 'stopped' | 'cannot-reach';
  /** What the tire holds when its warmth has gone, gauge kPa. */
  settledKpa: number;
}

/** Seconds between a call and the hand that follows it: common practice. */
const handsS = 2;
/** A fill that is not done by then is stopped. */
const longestS = 25 * 60;
/** Seconds that a person lets a small bleed run. */
const bleedS = 3;

/**
 * Somebody with a helper who does what the engine says, on a coach run by the engine's own step
 * function: reads the gauge when asked, hears most purges, is two seconds late.
 */
export function simulateFill(setup: FillSetup, air: PracticeOptions): SimulatedFill {
  const coach = createPracticeCoach(air);
  const person = new Person(coach, setup);
  let how: SimulatedFill['how'] | undefined;
  while (coach.at < longestS && !how) {
    person.hear(coach.advance(1).map((notice) => notice.type));
    how = person.follow();
  }
  return {
    events: person.events,
    endedAt: coach.at,
    how: how ?? 'stopped',
    settledKpa: coach.settledKpa(),
  };
}

class Person {
  readonly events: FillEvent[] = [];
  readonly #fill;
  #shown: Advice['call'] | undefined;
  #since = 0;
  #lastReading = Number.NEGATIVE_INFINITY;
  #bleedUntil: number | undefined;

  constructor(
    private readonly coach: PracticeCoach,
    private readonly setup: FillSetup,
  ) {
    this.#fill = createFill(setup);
    this.#tap({ type: 'engine', speed: coach.engine() });
  }

  #tap(event: WithoutStamp<FillEvent>): void {
    const stamped = { ...event, at: this.coach.at, id: randomUUID() } as FillEvent;
    this.events.push(stamped);
    this.#fill.apply(stamped);
  }

  hear(notices: string[]): void {
    if (notices.includes('cut-out')) this.#tap({ type: 'cut-out' });
  }

  /** Does what is called for; answers how the fill ended, once it has. */
  follow(): SimulatedFill['how'] | undefined {
    const advice = this.#fill.advise(this.coach.at);
    this.#show(advice.call);
    this.#helpFromTheSeat(advice);
    if (advice.readIn !== undefined && advice.readIn <= 0) this.#readSupply();
    if (this.coach.at - this.#since < handsS) return undefined;
    return this.#act(advice);
  }

  #show(call: Advice['call']): void {
    if (call === this.#shown) return;
    this.#shown = call;
    this.#since = this.coach.at;
    this.#tap({ type: 'call-shown', call });
  }

  #act(advice: Advice): SimulatedFill['how'] | undefined {
    switch (advice.call) {
      case 'done':
      case 'cannot-reach':
        return advice.call;
      case 'chuck-on':
      case 'chuck-off':
        this.#setChuck(advice.call === 'chuck-on');
        return undefined;
      case 'gauge-tire':
        this.#gaugeTire();
        return undefined;
      case 'bleed':
        this.#bleed();
        return undefined;
      case 'read-supply':
      case 'check':
        this.#readSupply();
        if (advice.call === 'check' && !this.coach.chuckOn()) this.#gaugeTire();
        return undefined;
      default:
        return undefined;
    }
  }

  #setChuck(on: boolean): void {
    if (this.coach.chuckOn() === on) return;
    this.coach.setChuck(on);
    this.#tap({ type: 'chuck', on });
  }

  #helpFromTheSeat(advice: Advice): void {
    if (advice.cab === 'set-fast-idle' || advice.cab === 'start-engine') {
      const speed = advice.cab === 'start-engine' ? 'idle' : 'fast-idle';
      this.coach.setEngine(speed);
      this.#tap({ type: 'engine', speed });
    }
    this.#lower(advice);
  }

  /** Lowers while the call is to lower, and at no other time. */
  #lower(advice: Advice): void {
    const last = this.events.findLast((event) => event.type === 'lowering');
    const on = advice.call === 'lower-supply';
    const by = last?.on ? last.by : (advice.by ?? this.setup.lowerBy?.[0]);
    if (!by || (last?.on ?? false) === on) return;
    this.coach.setLowering(by, on);
    this.#tap({ type: 'lowering', by, on });
  }

  #readSupply(): void {
    // Nobody reads a gauge more often than this.
    if (this.coach.at - this.#lastReading < 4) return;
    this.#lastReading = this.coach.at;
    const kpa = toMark(this.coach.wheelGaugeKpa());
    this.#tap({
      type: 'supply-reading',
      source: 'wheel-gauge',
      kpa,
      stepKpa: kpaPerPsi,
      how: 'offered',
    });
  }

  #gaugeTire(): void {
    if (this.coach.chuckOn()) return;
    this.#tap({
      type: 'tire-reading',
      kpa: toMark(this.coach.tireKpa(), 2),
      stepKpa: kpaPerPsi / 2,
    });
  }

  #bleed(): void {
    this.#bleedUntil ??= this.coach.at + bleedS;
    const on = this.coach.at < this.#bleedUntil;
    this.coach.setBleeding(on);
    this.#tap({ type: 'bleeding', on });
    if (on) return;
    this.#bleedUntil = undefined;
    this.#gaugeTire();
  }
}

/** The nearest mark of a gauge with `marks` to a psi. */
const toMark = (kpa: number, marks = 1) =>
  (Math.round((kpa / kpaPerPsi) * marks) * kpaPerPsi) / marks;
