import { describe, expect, it } from 'vitest';
import type { StoredEvent } from '~/fill/wire';
import type { WireEvent } from '~/fill/wire-events';
import { sayWhatCounts } from './entry-use';

const stored = (seq: number, atMs: number, event: object): StoredEvent => ({
  seq,
  side: 'wheel',
  deviceId: 'phone',
  event: { id: `e${seq}`, atMs, ...event } as WireEvent,
});
const fates = (events: StoredEvent[]) =>
  Object.fromEntries(sayWhatCounts(events).map(({ seq, use }) => [seq, use]));

describe('what counts of a log', () => {
  it('is everything while the fill is open', () => {
    expect(fates([stored(1, 0, { type: 'cut-out' }), stored(2, 9, { type: 'cut-in' })])).toEqual({
      1: 'used',
      2: 'used',
    });
  });

  it('is not what was taken back', () => {
    const undo = { type: 'taken-back', of: 'e1' };
    expect(fates([stored(1, 0, { type: 'cut-out' }), stored(2, 5, undo)])).toEqual({
      1: 'taken-back',
      2: 'used',
    });
  });

  it('goes by the end with the lowest number, even when another end is earlier', () => {
    const log = [
      stored(1, 5000, { type: 'ended', how: 'done' }),
      stored(2, 4000, { type: 'ended', how: 'stopped' }),
      stored(3, 4500, { type: 'cut-out' }),
      stored(4, 6000, { type: 'cut-out' }),
    ];
    expect(fates(log)).toEqual({ 1: 'used', 2: 'already-ended', 3: 'used', 4: 'after-end' });
  });

  it('is not touched by an undo from after the end', () => {
    const log = [
      stored(1, 1000, { type: 'cut-out' }),
      stored(2, 5000, { type: 'ended', how: 'done' }),
      stored(3, 6000, { type: 'taken-back', of: 'e1' }),
    ];
    expect(fates(log)).toEqual({ 1: 'used', 2: 'used', 3: 'after-end' });
  });

  it('stands in the order of time, not of arrival', () => {
    const log = [stored(1, 900, { type: 'cut-out' }), stored(2, 100, { type: 'cut-in' })];
    expect(sayWhatCounts(log).map(({ seq }) => seq)).toEqual([2, 1]);
  });
});
