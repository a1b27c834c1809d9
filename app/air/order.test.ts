import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import golden from './golden-log.json';
import type { FillEvent, FillSetup } from './index';
import { createFill } from './index';

const SETUP = golden.setup as FillSetup;
const EVENTS = (golden.events as FillEvent[]).filter((event) => event.at < 70);
const RUNS = { numRuns: 6 };

function answer(events: readonly FillEvent[], at: number, askedBefore: readonly number[] = []) {
  const fill = createFill(SETUP);
  for (const event of events) fill.apply(event);
  for (const time of askedBefore) fill.advise(time);
  return JSON.stringify(fill.advise(at));
}

/** Each property replays whole fills. */
const PATIENT = { timeout: 90_000 };

describe('the answer', PATIENT, () => {
  it('does not depend on the order in which events arrive, nor on copies', () => {
    const expected = answer(EVENTS, 71.3);
    const shuffled = fc.shuffledSubarray(EVENTS, {
      minLength: EVENTS.length,
      maxLength: EVENTS.length,
    });
    fc.assert(
      fc.property(shuffled, fc.integer({ min: 0, max: 9 }), (list, copies) => {
        expect(answer([...list, ...list.slice(0, copies)], 71.3)).toBe(expected);
      }),
      RUNS,
    );
  });

  it('does not depend on when, or how often, advice was asked before', () => {
    const expected = answer(EVENTS, 71.3);
    const times = fc.array(fc.double({ min: 0, max: 140, noNaN: true }), { maxLength: 8 });
    fc.assert(
      fc.property(times, (asked) => {
        expect(answer(EVENTS, 71.3, asked)).toBe(expected);
      }),
      RUNS,
    );
  });

  it('is the same when events arrive between askings', () => {
    const expected = answer(EVENTS, 71.3);
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 0, max: 75 }), { maxLength: 12 }), (asked) => {
        const fill = createFill(SETUP);
        const order = [...EVENTS].reverse();
        order.forEach((event, k) => {
          fill.apply(event);
          if (asked[k] !== undefined) fill.advise(asked[k]);
        });
        expect(JSON.stringify(fill.advise(71.3))).toBe(expected);
      }),
      RUNS,
    );
  });

  it('before an event does not change when the event arrives late, an undo included', () => {
    const late: FillEvent[] = [
      { type: 'cut-out', at: 55, id: 'late' },
      { type: 'chuck', on: true, at: 50, id: 'late' },
      { type: 'tire-reading', kpa: 710, at: 60.25, id: 'late' },
      { type: 'taken-back', of: EVENTS[3]!.id!, at: 52, id: 'late' },
    ];
    for (const event of late) {
      const fill = createFill(SETUP);
      for (const known of EVENTS) fill.apply(known);
      const before = JSON.stringify(fill.advise(event.at - 0.1));
      fill.advise(69);
      fill.apply(event);
      expect(JSON.stringify(fill.advise(event.at - 0.1))).toBe(before);
    }
  });

  it('after an undo is the answer without the event', () => {
    const wrong: FillEvent = { type: 'tire-reading', kpa: 1200, at: 40, id: 'wrong' };
    const undo: FillEvent = { type: 'taken-back', of: 'wrong', at: 45, id: 'undo' };
    expect(answer([...EVENTS, wrong, undo], 71.3)).toBe(answer(EVENTS, 71.3));
    expect(answer([...EVENTS, undo, wrong], 71.3)).toBe(answer(EVENTS, 71.3));
  });

  it('is the same for the same seed, and may differ for another', () => {
    const other = createFill({ ...SETUP, seed: 99 });
    for (const event of EVENTS) other.apply(event);
    expect(answer(EVENTS, 71.3)).toBe(answer(EVENTS, 71.3));
    expect(JSON.stringify(other.advise(71.3))).not.toBe(answer(EVENTS, 71.3));
  });

  it('does not depend on the set-up object being changed afterwards', () => {
    const setup = structuredClone(SETUP);
    const fill = createFill(setup);
    setup.tire.targetKpa = 300;
    for (const event of EVENTS) fill.apply(event);
    expect(JSON.stringify(fill.advise(71.3))).toBe(answer(EVENTS, 71.3));
  });
});
