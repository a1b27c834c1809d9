import { beforeEach, describe, expect, it } from 'vitest';
import type { LogEntry } from './log';
import {
  changeRound,
  createPhoneStore,
  fillsOfRound,
  type PhoneStore,
  putRound,
  putRun,
  type RoundState,
  type RunState,
} from './store';
import type { WireEvent } from './wire-events';

let store: PhoneStore;
beforeEach(() => {
  store = createPhoneStore();
});

const reading = (id: string, readAt: string) => ({ id, tireId: 't', kpa: 1, warm: false, readAt });
const round = (change: Partial<RoundState> = {}): RoundState => ({
  id: 'r',
  coachId: 'c',
  startedAt: '2026-05-04T09:00:00.000Z',
  place: '',
  altitudeM: 0,
  ambientC: 0,
  timeZone: 'UTC',
  withHelper: true,
  cautionsAt: null,
  closedAt: null,
  afterwards: [],
  readings: [],
  ...change,
});
const entry = (id: string, atMs: number, seq: number | null): LogEntry => ({
  event: { type: 'cut-out', id, atMs } as WireEvent,
  deviceId: 'd',
  side: 'wheel',
  seq,
});
const run = (id: string, startedAt: string, log: LogEntry[] = []) =>
  ({ id, roundId: 'r', startedAt, log }) as unknown as RunState;

describe('a round that the server tells of', () => {
  it('keeps what only this phone knows yet', () => {
    const own = { cautionsAt: 'mine', readings: [reading('b', '2026-05-04T09:02:00.000Z')] };
    putRound(store, round(own));
    putRound(store, round({ readings: [reading('a', '2026-05-04T09:01:00.000Z')], place: 'Here' }));
    const known = store.getState().rounds.r;
    expect(known).toMatchObject({ cautionsAt: 'mine', place: 'Here' });
    expect(known?.readings.map(({ id }) => id)).toEqual(['a', 'b']);
  });

  it('takes over what the server knows first', () => {
    putRound(store, round({ closedAt: 'mine', afterwards: ['chuck-off'] }));
    putRound(store, round({ closedAt: 'theirs', afterwards: ['caps-on'], cautionsAt: 'read' }));
    expect(store.getState().rounds.r).toMatchObject({
      closedAt: 'theirs',
      afterwards: ['caps-on'],
      cautionsAt: 'read',
    });
  });
});

describe('a fill that the server tells of', () => {
  it('is sorted by time, whatever the order of its numbers', () => {
    putRun(store, run('f', 'x', [entry('late', 900, 1), entry('early', 100, 2)]));
    expect(store.getState().runs.f?.log.map(({ event }) => event.id)).toEqual(['early', 'late']);
  });

  it('loses no tap of this phone, and changes nothing when nothing is new', () => {
    putRun(store, run('f', 'x', [entry('mine', 100, null)]));
    putRun(store, run('f', 'x', [entry('theirs', 50, 1)]));
    const before = store.getState();
    expect(before.runs.f?.log.map(({ event }) => event.id)).toEqual(['theirs', 'mine']);
    putRun(store, run('f', 'x', [entry('theirs', 50, 1)]));
    expect(store.getState()).toBe(before);
  });
});

describe('the store', () => {
  it('lists the fills of a round by their start', () => {
    putRun(store, run('second', '2026-05-04T09:20:00.000Z'));
    putRun(store, run('first', '2026-05-04T09:10:00.000Z'));
    expect(fillsOfRound(store.getState(), 'r').map(({ id }) => id)).toEqual(['first', 'second']);
    expect(fillsOfRound(store.getState(), 'other')).toEqual([]);
  });

  it('says when a round is not on this phone', () => {
    expect(() => changeRound(store, 'nowhere', (known) => known)).toThrow(/nowhere/);
  });
});
