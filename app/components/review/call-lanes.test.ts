import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Call } from '~/air';
import { type PlacedLabel, placeLabels, type WantedLabel } from './call-lanes';

const room = { count: 4, from: 0, to: 340 };
const calls: Call[] = [
  'read-supply',
  'wait',
  'chuck-on',
  'keep-on',
  'chuck-off',
  'gauge-tire',
  'done',
];

const someLabels = fc
  .array(
    fc.record({
      call: fc.constantFrom(...calls),
      x: fc.integer({ min: 40, max: 320 }),
      width: fc.integer({ min: 20, max: 110 }),
    }),
    { maxLength: 40 },
  )
  .map((labels) => labels.sort((a, b) => a.x - b.x));

const spanOf = (wanted: WantedLabel[], { index, left }: PlacedLabel) => ({
  left,
  right: left + wanted[index]!.width,
});

describe('the words of the calls below the time axis', () => {
  it('never stand on one another', () => {
    fc.assert(
      fc.property(someLabels, (wanted) => {
        const placed = placeLabels(wanted, room);
        for (const a of placed) {
          for (const b of placed) {
            if (a.index >= b.index || a.lane !== b.lane) continue;
            const [left, right] = [spanOf(wanted, a), spanOf(wanted, b)];
            expect(left.right <= right.left || right.right <= left.left).toBe(true);
          }
        }
      }),
    );
  });

  it('never stand on the line that leads from other words to the axis', () => {
    fc.assert(
      fc.property(someLabels, (wanted) => {
        const placed = placeLabels(wanted, room);
        for (const near of placed) {
          for (const far of placed.filter(({ lane }) => lane > near.lane)) {
            const { left, right } = spanOf(wanted, near);
            const { x } = wanted[far.index]!;
            expect(x < left || x > right).toBe(true);
          }
        }
      }),
    );
  });

  it('stay inside of the picture', () => {
    fc.assert(
      fc.property(someLabels, (wanted) => {
        for (const label of placeLabels(wanted, room)) {
          const { left, right } = spanOf(wanted, label);
          expect(left >= room.from && right <= room.to).toBe(true);
        }
      }),
    );
  });

  it('are all there when they have room', () => {
    const wanted = [20, 120, 220].map((x): WantedLabel => ({ call: 'wait', x, width: 60 }));
    expect(placeLabels(wanted, room)).toHaveLength(3);
  });

  it('step down where several calls follow soon on one another', () => {
    const wanted = [100, 112, 124].map((x): WantedLabel => ({ call: 'wait', x, width: 90 }));
    expect(placeLabels(wanted, room).map(({ lane }) => lane)).toEqual([2, 1, 0]);
  });

  it('keep on and off when there is no room for all', () => {
    const crowd = Array.from({ length: 30 }, (_, place): WantedLabel => {
      const call = place === 15 ? 'chuck-off' : 'read-supply';
      return { call, x: 100 + place, width: 80 };
    });
    const placed = placeLabels(crowd, room);
    expect(placed.length).toBeLessThan(30);
    expect(placed.map(({ index }) => crowd[index]!.call)).toContain('chuck-off');
  });
});
