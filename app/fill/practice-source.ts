import {
  createPracticeCoach,
  type FillEvent,
  type FillSetup,
  type PracticeCoach,
  type PracticeOptions,
} from '~/air';
import type { PressureUnit } from '~/units';
import type { LiveSource, NewFillEvent } from './live-driver';
import { factsOf } from './log-facts';

export interface PracticeStart {
  coach: PracticeOptions;
  setup: FillSetup;
  tireName: string;
  unit: PressureUnit;
}

/** What the simulated gauges, engine and ears say. Pressures are gauge kPa. */
export interface PracticeReadOuts {
  hoseKpa: number;
  dashKpa: number;
  /** With the path closed; undefined while air can move. */
  tireKpa: number | undefined;
  engine: 'off' | 'idle' | 'fast-idle';
  lowering: boolean;
  /** What was heard within the last seconds. */
  heard: 'purge' | 'low-air' | undefined;
}

export interface PracticeResult {
  /** The tire when its warmth has gone, gauge kPa. */
  settledKpa: number;
  withinTolerance: boolean;
  /** What went back into the coach while the supply was below the tire, kPa. */
  lostKpa: number;
  seconds: number;
  timesOn: number;
}

export interface PracticeSource extends LiveSource {
  readOuts: () => PracticeReadOuts;
  /** Simulated seconds for each second on the clock: 1, 2 or 4. */
  setSpeed: (speed: number) => void;
  result: () => PracticeResult;
}

/** How long a purge stays in the ear, simulated seconds. */
const heardSeconds = 8;
/** The longest stretch that is made up for after the page slept, simulated seconds. */
const longestCatchUp = 5;

/**
 * A fill on a simulated coach: time runs with `clock` (seconds) at a speed, and the coach does
 * what the log says. Nothing is kept beyond the page.
 */
export function createPracticeSource(
  { coach: options, setup, tireName, unit }: PracticeStart,
  clock: () => number,
  startedAt: Date,
): PracticeSource {
  const coach = createPracticeCoach(options);
  const listeners = new Set<() => void>();
  let events: readonly FillEvent[] = [];
  let ended = false;
  let speed = 1;
  let lastClock = clock();
  let lostKpa = 0;
  let heard: { what: 'purge' | 'low-air'; at: number } | undefined;

  function run(): number {
    const now = clock();
    const seconds = ended ? 0 : Math.min((now - lastClock) * speed, longestCatchUp);
    lastClock = now;
    if (seconds <= 0) return coach.at;
    const before = coach.settledKpa();
    for (const notice of coach.advance(seconds)) {
      if (notice.type === 'cut-out') heard = { what: 'purge', at: notice.at };
      if (notice.type === 'low-air-on') heard = { what: 'low-air', at: notice.at };
    }
    if (coach.chuckOn()) lostKpa += Math.max(0, before - coach.settledKpa());
    return coach.at;
  }

  function add(event: FillEvent): void {
    events = [...events, event];
    obey(coach, events, setup);
    for (const listener of listeners) listener();
  }

  return {
    setup,
    tireName,
    unit,
    events: () => events,
    subscribe(listener) {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    now: run,
    wallClock: (at) => new Date(startedAt.getTime() + at * 1000),
    tap(event: NewFillEvent, at) {
      run();
      const id = `p${events.length + 1}`;
      add({ ...event, at, id });
      return id;
    },
    takeBack(id) {
      add({ type: 'taken-back', of: id, at: run(), id: `p${events.length + 1}` });
    },
    end() {
      run();
      ended = true;
      for (const listener of listeners) listener();
    },
    ended: () => ended,
    setSpeed(next) {
      run();
      speed = next;
    },
    readOuts() {
      const at = run();
      return readOutsOf(
        coach,
        events,
        setup,
        heard && at - heard.at < heardSeconds ? heard.what : undefined,
      );
    },
    result: () => resultOf(coach, events, setup, lostKpa),
  };
}

/** Puts the coach into the state that the log tells of: so a tap that is taken back is undone. */
function obey(coach: PracticeCoach, events: readonly FillEvent[], setup: FillSetup): void {
  const facts = factsOf(events, setup);
  const last = events.at(-1);
  coach.setChuck(facts.chuckOn);
  coach.setBleeding(facts.bleeding);
  for (const by of ['pedal', 'drain'] as const) coach.setLowering(by, facts.lowering === by);
  // Only when it is said anew: the pedal may have dropped the idle since.
  if (last?.type === 'engine') coach.setEngine(last.speed);
}

function readOutsOf(
  coach: PracticeCoach,
  events: readonly FillEvent[],
  setup: FillSetup,
  heard: PracticeReadOuts['heard'],
): PracticeReadOuts {
  return {
    hoseKpa: coach.wheelGaugeKpa(),
    dashKpa: coach.dashGaugeKpa(),
    tireKpa: coach.chuckOn() ? undefined : coach.tireKpa(),
    engine: coach.engine(),
    lowering: factsOf(events, setup).lowering !== undefined,
    heard,
  };
}

function resultOf(
  coach: PracticeCoach,
  events: readonly FillEvent[],
  { tire }: FillSetup,
  lostKpa: number,
): PracticeResult {
  const settledKpa = coach.settledKpa();
  const off = Math.abs(settledKpa - tire.targetKpa);
  const gone = new Set(events.flatMap((event) => (event.type === 'taken-back' ? [event.of] : [])));
  const ons = events.filter(
    (event) => event.type === 'chuck' && event.on && !gone.has(event.id ?? ''),
  );
  return {
    settledKpa,
    withinTolerance: off <= tire.toleranceKpa,
    lostKpa,
    seconds: coach.at,
    timesOn: ons.length,
  };
}
