import { around, between, type Dice } from './random';

/** How a run departs from the usual: what the flags of the bench choose. */
export interface Habits {
  /** One person, without a helper in the seat. */
  alone: boolean;
  /** The helper leaves and comes back in the middle. */
  comeAndGo: boolean;
  dashOnly: boolean;
  /** No purge and no loading is ever heard. */
  noPurge: boolean;
  /** A reading every so many seconds, instead of when asked. */
  every: number | null;
}

export const USUAL: Habits = {
  alone: false,
  comeAndGo: false,
  dashOnly: false,
  noPurge: false,
  every: null,
};

/** The departures that are printed side by side. */
export const VARIANTS: [string, Habits][] = [
  ['usual', USUAL],
  ['dash gauge only', { ...USUAL, dashOnly: true }],
  ['every 6 s', { ...USUAL, every: 6 }],
  ['every 12 s', { ...USUAL, every: 12 }],
  ['every 24 s', { ...USUAL, every: 24 }],
  ['no purge heard', { ...USUAL, noPurge: true }],
  ['alone', { ...USUAL, alone: true }],
  ['helper comes and goes', { ...USUAL, comeAndGo: true }],
];

/** Seconds that things take; each draw is one act. About two from call to air (design/engine.md). */
export const TAKES = {
  notice: (dice: Dice) => Math.min(4, around(dice, 0.9, 0.3)),
  chuckOn: (dice: Dice, valve: boolean) =>
    valve ? between(dice, 0.7, 1.4) : between(dice, 1.2, 2.4),
  chuckOff: (dice: Dice, valve: boolean) =>
    valve ? between(dice, 0.6, 1.2) : between(dice, 0.8, 1.5),
  readGauge: (dice: Dice) => between(dice, 1.5, 3.5),
  readDash: (dice: Dice) => between(dice, 2, 4),
  gaugeTire: (dice: Dice, valve: boolean) => between(dice, 4, 7) + (valve ? 2 : 0),
  startLowering: (dice: Dice, by: 'pedal' | 'drain') =>
    by === 'pedal' ? between(dice, 0.5, 1.5) : between(dice, 2.5, 4.5),
  stopLowering: (dice: Dice) => between(dice, 0.3, 0.8),
  setSpeed: (dice: Dice) => between(dice, 1.5, 3),
  lookAway: (dice: Dice) => between(dice, 4, 14),
};

/** Mean seconds between two looks away. */
export const LOOKS_AWAY_EVERY_S = 200;
/** A person who is not asked reads a gauge about once a minute (design/engine.md). */
export const UNASKED_EVERY_S = 60;
/** Share of puttings-on that leave the chuck badly seated; of those, the share that open nothing. */
export const BAD_SEAT = 0.04;
export const BLOCKED_SHARE = 0.7;
/** Share of typed numbers that are ten psi off. */
export const MISTYPED = 0.012;
/** Share of purges that are heard, and false hisses per second at rest and on the pedal. */
export const HEARS_PURGE = 0.85;
export const FALSE_HISS_PER_S = { rest: 1 / 600, pedal: 1 / 120 };
/** Share of loadings that somebody notices. */
export const NOTICES_LOADING = 0.25;
/** Share of people who notice by themselves that the engine fell to idle. */
export const NOTICES_IDLE = 0.4;
/** A badly seated chuck is noticed without a call about once in so many seconds. */
export const NOTICES_BAD_SEAT_S = 45;
