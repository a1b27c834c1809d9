import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { spreadHeights } from './end-labels';

describe('the names at the ends of the curves', () => {
  it('stay where they are when they are apart', () => {
    expect(spreadHeights([150, 20, 80], { step: 20, top: 0, bottom: 200 })).toEqual([150, 20, 80]);
  });

  it('move apart where two curves end together, in their order', () => {
    expect(spreadHeights([100, 102], { step: 20, top: 0, bottom: 200 })).toEqual([100, 120]);
    expect(spreadHeights([198, 199], { step: 20, top: 0, bottom: 200 })).toEqual([180, 200]);
  });

  it('are never nearer than a step while there is room', () => {
    const wanted = fc.array(fc.integer({ min: 0, max: 200 }), { maxLength: 8 });
    fc.assert(
      fc.property(wanted, (heights) => {
        const spread = spreadHeights(heights, { step: 20, top: 0, bottom: 200 }).sort(
          (a, b) => a - b,
        );
        spread.forEach((height, index) => {
          expect(height >= 0 && height <= 200).toBe(true);
          if (index > 0) expect(height - spread[index - 1]!).toBeGreaterThanOrEqual(20);
        });
      }),
    );
  });
});
