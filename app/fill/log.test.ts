import { describe, expect, it } from 'vitest';
import { endOf, fillEventsOf, type LogEntry, lastSeqOf, mergeLog, numberLog } from './log';
import type { WireEvent } from './wire-events';

const stamp = { deviceSeq: 1, deviceTime: '2026-05-04T09:30:00.000Z', offsetMs: 0, suspect: false };
const entry = (id: string, atMs: number, seq: number | null, own: object = {}): LogEntry => ({
  event: { type: 'cut-out', ...own, id, atMs, ...stamp } as WireEvent,
  deviceId: 'phone',
  side: 'wheel',
  seq,
});
const end = (id: string, atMs: number, seq: number | null, how = 'done') =>
  entry(id, atMs, seq, { type: 'ended', how });

describe('mergeLog', () => {
  it('takes an event once, sorts by time and then id, and lets the numbered copy win', () => {
    const own = [entry('b', 2000, null), entry('a', 2000, null)];
    const told = [entry('c', 500, 1), entry('a', 2000, 2)];
    const merged = mergeLog(mergeLog([], own), told);
    expect(merged.map(({ event, seq }) => [event.id, seq])).toEqual([
      ['c', 1],
      ['a', 2],
      ['b', null],
    ]);
    expect(mergeLog(mergeLog([], told), own)).toEqual(merged);
  });

  it('answers the same log when nothing is new', () => {
    const log = mergeLog([], [entry('a', 1, 1)]);
    expect(mergeLog(log, [entry('a', 1, 1), entry('a', 1, null)])).toBe(log);
  });
});

describe('endOf', () => {
  it('is the end with the lowest number', () => {
    expect(endOf([end('late', 100, 9), end('first', 900, 4), end('mine', 1, null)])).toMatchObject({
      id: 'first',
      atMs: 900,
    });
  });

  it('is this phone’s own while the server knows of none', () => {
    expect(endOf([end('mine', 100, null, 'stopped')])?.how).toBe('stopped');
    expect(endOf([entry('a', 1, 1)])).toBeUndefined();
  });
});

describe('fillEventsOf', () => {
  it('gives the engine seconds and the event’s own fields, without ends', () => {
    const log = [
      entry('a', 1234, 1, { type: 'tire-reading', kpa: 700, stepKpa: 7 }),
      end('e', 2000, 2),
    ];
    expect(fillEventsOf(log)).toEqual([
      { type: 'tire-reading', kpa: 700, stepKpa: 7, id: 'a', at: 1.234 },
    ]);
  });

  it('leaves out what happened after the end that counts, and keeps what happened with it', () => {
    const log = [entry('a', 2000, 1), entry('b', 2001, 2), end('e', 2000, 3), end('f', 9000, 4)];
    expect(fillEventsOf(log).map(({ id }) => id)).toEqual(['a']);
  });

  it('is the same array for the same log', () => {
    const log = [entry('a', 1, 1)];
    expect(fillEventsOf(log)).toBe(fillEventsOf(log));
  });
});

describe('numbers', () => {
  it('are written beside what was stored, and no number is changed', () => {
    const log = numberLog(
      [entry('a', 1, null), entry('b', 2, 7)],
      [
        { id: 'a', seq: 3 },
        { id: 'b', seq: 9 },
      ],
    );
    expect(log.map(({ seq }) => seq)).toEqual([3, 7]);
  });

  it('tell after which one to ask: the last before a gap', () => {
    expect(lastSeqOf([])).toBe(0);
    expect(lastSeqOf([entry('a', 1, 2), entry('b', 2, 1), entry('c', 3, 4)])).toBe(2);
    expect(lastSeqOf([entry('a', 1, null), entry('b', 2, 2)])).toBe(0);
  });
});
