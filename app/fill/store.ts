import { createStore, type StoreApi } from 'zustand/vanilla';
import type { FillSetup } from '~/air';
import type { WheelPosition } from '~/loads';
import { mergeLog, numberLog, type RunLog } from './log';
import type { RefusedItem } from './outbox-items';
import type { AfterwardsKey } from './wire';

/** One cold reading. Several of a tire may exist; the one read last counts. */
export interface ReadingState {
  readonly id: string;
  readonly tireId: string;
  readonly kpa: number;
  readonly warm: boolean;
  /** ISO 8601. */
  readonly readAt: string;
}

export interface RoundState {
  readonly id: string;
  readonly coachId: string;
  readonly startedAt: string;
  readonly place: string;
  readonly altitudeM: number;
  readonly ambientC: number;
  readonly timeZone: string;
  readonly withHelper: boolean;
  readonly cautionsAt: string | null;
  readonly closedAt: string | null;
  readonly afterwards: readonly AfterwardsKey[];
  readonly readings: readonly ReadingState[];
}

/** A fill: what it started from, and its log. */
export interface RunState {
  readonly id: string;
  readonly kind: 'fill';
  readonly roundId: string;
  readonly coachId: string;
  readonly tireId: string;
  readonly position: WheelPosition;
  readonly startedAt: string;
  readonly setup: FillSetup;
  readonly engineVersion: string;
  readonly deviceId: string;
  /** Whoever holds this phone may end it; a helper only taps. */
  readonly mayEnd: boolean;
  readonly log: RunLog;
}

/** What is on its way, what was refused, and why nothing moves. */
export interface OutboxState {
  readonly pending: number;
  readonly refused: readonly RefusedItem[];
  /** Nobody is signed in: everything waits. */
  readonly paused: boolean;
  /** The last attempt failed and another one is due. */
  readonly retrying: boolean;
}

export interface PhoneState {
  readonly rounds: Readonly<Record<string, RoundState>>;
  readonly runs: Readonly<Record<string, RunState>>;
  readonly outbox: OutboxState;
}

export type PhoneStore = StoreApi<PhoneState>;

export const emptyPhone: PhoneState = {
  rounds: {},
  runs: {},
  outbox: { pending: 0, refused: [], paused: false, retrying: false },
};

export const createPhoneStore = (): PhoneStore => createStore<PhoneState>(() => emptyPhone);

/**
 * Puts a round in. A round that is known is merged: its readings by id, and what this phone knows
 * of cautions and closing stays, since it may not have been sent yet.
 */
export function putRound(store: PhoneStore, round: RoundState): void {
  const known = store.getState().rounds[round.id];
  const merged = known ? mergeRound(known, round) : round;
  store.setState(({ rounds }) => ({ rounds: { ...rounds, [round.id]: merged } }));
}

function mergeRound(known: RoundState, told: RoundState): RoundState {
  const readings = new Map([...told.readings, ...known.readings].map((item) => [item.id, item]));
  return {
    ...told,
    cautionsAt: told.cautionsAt ?? known.cautionsAt,
    closedAt: told.closedAt ?? known.closedAt,
    afterwards: told.closedAt ? told.afterwards : known.afterwards,
    readings: [...readings.values()].sort((a, b) => (a.readAt < b.readAt ? -1 : 1)),
  };
}

export function changeRound(
  store: PhoneStore,
  roundId: string,
  change: (round: RoundState) => RoundState,
): void {
  const known = store.getState().rounds[roundId];
  if (!known) throw new Error(`round ${roundId} is not on this phone`);
  store.setState(({ rounds }) => ({ rounds: { ...rounds, [roundId]: change(known) } }));
}

/** Puts a fill in; the log of one that is known is merged by event id. */
export function putRun(store: PhoneStore, run: RunState): void {
  const known = store.getState().runs[run.id];
  const merged = { ...(known ?? run), log: mergeLog(known?.log ?? [], run.log) };
  if (merged.log === known?.log) return;
  store.setState(({ runs }) => ({ runs: { ...runs, [run.id]: merged } }));
}

/** Adds events to a fill's log, its own or those of another phone. */
export function addToLog(store: PhoneStore, runId: string, entries: RunLog): void {
  changeLog(store, runId, (log) => mergeLog(log, entries));
}

/** Writes down the numbers that the server gave. */
export function numberEvents(
  store: PhoneStore,
  runId: string,
  stored: readonly { id: string; seq: number }[],
): void {
  changeLog(store, runId, (log) => numberLog(log, stored));
}

function changeLog(store: PhoneStore, runId: string, change: (log: RunLog) => RunLog): void {
  const run = store.getState().runs[runId];
  if (!run) return;
  const log = change(run.log);
  if (log === run.log) return;
  store.setState(({ runs }) => ({ runs: { ...runs, [runId]: { ...run, log } } }));
}

/** The newest reading of each tire of a round. */
export function newestReadings(round: RoundState): ReadonlyMap<string, ReadingState> {
  return new Map(round.readings.map((reading) => [reading.tireId, reading]));
}

/** The fills of a round by their start. */
export function fillsOfRound(state: PhoneState, roundId: string): RunState[] {
  return Object.values(state.runs)
    .filter((run) => run.roundId === roundId)
    .sort((a, b) => (a.startedAt < b.startedAt ? -1 : 1));
}
