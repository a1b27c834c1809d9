import { describe, expect, it } from 'vitest';
import { gaugeKpa, kpaDifference, kpaPerPsi, psi, psiToKpa } from '~/units';
import { type ColdCheckTire, lowestLimit, sortColdCheck, type WheelPosition } from './index';

const psiKpa = (value: number) => psiToKpa(psi(value));

interface InPsi {
  found: number | null;
  target?: number;
  limit?: number | null;
  warm?: boolean;
}

function tire(
  position: WheelPosition,
  { found, target = 100, limit = 120, warm }: InPsi,
): ColdCheckTire {
  return {
    position,
    kpa: found === null ? null : psiKpa(found),
    targetKpa: psiKpa(target),
    toleranceKpa: kpaDifference(kpaPerPsi),
    limitKpa: limit === null ? null : psiKpa(limit),
    warm: warm ?? false,
  };
}

const sortOne = (found: InPsi) => sortColdCheck([tire('steer-left', found)]).tires[0]!;
const duals = (outer: InPsi, inner: InPsi) =>
  sortColdCheck([tire('drive-left-outer', outer), tire('drive-left-inner', inner)]);
const kinds = (check: ReturnType<typeof sortColdCheck>) =>
  check.tires.map(({ verdict }) => verdict.kind);

describe('a tire after the cold check', () => {
  it('that has not been read is said to be so', () => {
    expect(sortOne({ found: null })).toMatchObject({
      verdict: { kind: 'not-read' },
      fillable: false,
    });
  });

  it('below target wants what is missing', () => {
    const sorted = sortOne({ found: 95 });
    expect(sorted).toMatchObject({ verdict: { kind: 'needs-air' }, fillable: true });
    expect(sorted.verdict).toHaveProperty('byKpa', expect.closeTo(5 * kpaPerPsi, 6));
  });

  it.each([99, 100, 101])('at %i psi of 100, within a tolerance of 1, is left alone', (found) => {
    expect(sortOne({ found })).toMatchObject({
      verdict: { kind: 'in-tolerance' },
      fillable: false,
    });
  });

  it('above target is bled cold by what is too much', () => {
    const sorted = sortOne({ found: 104 });
    expect(sorted).toMatchObject({ verdict: { kind: 'over', aboveLimit: false }, fillable: false });
    expect(sorted.verdict).toHaveProperty('byKpa', expect.closeTo(4 * kpaPerPsi, 6));
  });

  it('above what sidewall and wheel allow is bled, though it lies within tolerance', () => {
    const verdict = { kind: 'over', aboveLimit: true };
    expect(sortOne({ found: 120.5, target: 120, limit: 120 })).toMatchObject({ verdict });
  });

  it.each([98, 101, 140])('that is warm at %i psi is never bled', (found) => {
    expect(sortOne({ found, warm: true }).verdict.kind).toBe('warm');
  });

  it('that is warm and still below its cold target is filled to the target', () => {
    const sorted = sortOne({ found: 95, warm: true });
    expect(sorted).toMatchObject({ verdict: { kind: 'warm', belowTarget: true }, fillable: true });
    expect(sorted.verdict).toHaveProperty('byKpa', expect.closeTo(5 * kpaPerPsi, 6));
    const above = { verdict: { kind: 'warm', belowTarget: false, byKpa: 0 }, fillable: false };
    expect(sortOne({ found: 104, warm: true })).toMatchObject(above);
  });
});

describe('a tire that may have been run flat', () => {
  it.each([70, 75, 80, 85, 90, 95, 100, 105, 110, 115, 120])(
    'is one at exactly 80 %% of %i psi, and not one that is a tenth above',
    (target) => {
      // 29 CFR 1910.177(f)(2)(i), taken over as trade practice (memory): 80 % or less.
      const sorted = sortOne({ found: target * 0.8, target });
      expect(sorted).toMatchObject({ verdict: { kind: 'too-low' }, fillable: false });
      expect(sortOne({ found: target * 0.8 + 0.1, target }).verdict.kind).toBe('needs-air');
    },
  );

  it('is not filled when warm either, for cold it is lower still', () => {
    expect(sortOne({ found: 80, warm: true }).verdict.kind).toBe('too-low');
  });

  it('takes its dual with it, whatever that one reads', () => {
    for (const found of [null, 90, 100, 110])
      expect(duals({ found: 70 }, { found })).toMatchObject({
        tires: [
          { verdict: { kind: 'too-low' }, fillable: false },
          { verdict: { kind: 'mate-too-low', mate: 'drive-left-outer' }, fillable: false },
        ],
      });
    expect(kinds(duals({ found: 70 }, { found: 60 }))).toEqual(['too-low', 'too-low']);
  });

  it('leaves the other side alone', () => {
    const check = sortColdCheck([
      tire('drive-left-outer', { found: 60 }),
      tire('drive-right-outer', { found: 95 }),
      tire('steer-left', { found: 95 }),
    ]);
    expect(kinds(check)).toEqual(['too-low', 'needs-air', 'needs-air']);
  });
});

describe('duals', () => {
  it('are filled only when both have been read', () => {
    const check = duals({ found: 95 }, { found: null });
    expect(check.tires.map(({ fillable }) => fillable)).toEqual([false, false]);
    expect(check.complete).toBe(false);
    const read = duals({ found: 95 }, { found: 97 });
    expect(read.tires.map(({ fillable }) => fillable)).toEqual([true, true]);
    expect(read.complete).toBe(true);
  });

  it('that differ by more than 5 psi are found, the higher one first', () => {
    const [finding, ...others] = duals({ found: 94 }, { found: 100 }).findings;
    expect(finding).toMatchObject({
      kind: 'duals-differ',
      axle: 'drive',
      higher: 'drive-left-inner',
      lower: 'drive-left-outer',
    });
    expect(finding?.byKpa).toBeCloseTo(6 * kpaPerPsi, 6);
    expect(others).toEqual([]);
  });

  it.each([95, 97, 100, 103, 105])('that differ by exactly 5 psi (%i) are not', (found) => {
    expect(duals({ found, target: 105 }, { found: found - 5, target: 105 }).findings).toEqual([]);
  });
});

describe('the two sides of an axle', () => {
  const sides = (left: InPsi, right: InPsi) =>
    sortColdCheck([tire('steer-left', left), tire('steer-right', right)]).findings;

  it('that differ by more than 5 psi are found', () => {
    expect(sides({ found: 106 }, { found: 99 })).toMatchObject([
      { kind: 'sides-differ', axle: 'steer', higher: 'steer-left', lower: 'steer-right' },
    ]);
  });

  it('are not compared when only one is warm, or one has not been read', () => {
    expect(sides({ found: 110, warm: true }, { found: 99 })).toEqual([]);
    expect(sides({ found: 110 }, { found: null })).toEqual([]);
  });
});

describe('the limit', () => {
  it('is the lower of sidewall and wheel, as far as they are known', () => {
    expect(lowestLimit(gaugeKpa(830), gaugeKpa(900))).toBe(830);
    expect(lowestLimit(gaugeKpa(900), gaugeKpa(830))).toBe(830);
    expect(lowestLimit(null, gaugeKpa(830))).toBe(830);
    expect(lowestLimit(gaugeKpa(830), null)).toBe(830);
    expect(lowestLimit(null, null)).toBeNull();
  });
});

describe('what cannot be', () => {
  const refusal = (change: Partial<ColdCheckTire>) => () =>
    sortColdCheck([{ ...tire('steer-left', { found: 95 }), ...change }]);

  it.each([
    [
      { targetKpa: gaugeKpa(900), limitKpa: gaugeKpa(830) },
      'targetKpa of steer-left: 900 is not at or below the limit of 830 kPa',
    ],
    [{ kpa: gaugeKpa(1401) }, 'kpa of steer-left: 1401 is not between 0 and 1400 kPa'],
    [{ kpa: gaugeKpa(-1) }, 'kpa of steer-left: -1 is not between 0 and 1400 kPa'],
    [{ targetKpa: gaugeKpa(0) }, 'targetKpa of steer-left: 0 is not above 0 and up to 1400 kPa'],
    [{ toleranceKpa: kpaDifference(0) }, 'toleranceKpa of steer-left: 0 is not above 0 kPa'],
  ])('is refused by field and value: %j', (change, message) => {
    expect(refusal(change)).toThrow(new RangeError(message));
  });

  it('includes a position given twice', () => {
    const twice = [tire('tag-left', { found: 90 }), tire('tag-left', { found: 95 })];
    expect(() => sortColdCheck(twice)).toThrow('position: tag-left is given twice');
  });
});
