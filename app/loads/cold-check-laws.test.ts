import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { gaugeKpa, kpaDifference } from '~/units';
import {
  type ColdCheckTire,
  dualMateOf,
  oppositeOf,
  runFlatShare,
  type SortedTire,
  sortColdCheck,
  wheelPositions,
} from './index';

const kpa = (min: number, max: number) => fc.double({ min, max, noNaN: true });

const tireAt = (position: ColdCheckTire['position']): fc.Arbitrary<ColdCheckTire> =>
  fc
    .record({
      kpa: fc.option(kpa(0, 1400)),
      targetKpa: kpa(300, 900),
      toleranceKpa: kpa(1, 30),
      room: fc.option(kpa(0, 300)),
      warm: fc.boolean(),
    })
    .map(({ room, ...found }) => ({
      position,
      kpa: found.kpa === null ? null : gaugeKpa(found.kpa),
      targetKpa: gaugeKpa(found.targetKpa),
      toleranceKpa: kpaDifference(found.toleranceKpa),
      limitKpa: room === null ? null : gaugeKpa(found.targetKpa + room),
      warm: found.warm,
    }));

const coach = fc
  .subarray([...wheelPositions], { minLength: 1 })
  .chain((positions) => fc.tuple(...positions.map(tireAt)));

const byPosition = (tires: readonly SortedTire[]) =>
  new Map(tires.map((sorted) => [sorted.position, sorted]));

describe('sorting after the cold check', () => {
  it('never bleeds a warm tire and never times a fill for an unsound one', () => {
    fc.assert(
      fc.property(coach, (tires) => {
        const sorted = byPosition(sortColdCheck(tires).tires);
        for (const tire of tires) {
          const { verdict, fillable } = sorted.get(tire.position)!;
          if (tire.warm) expect(verdict.kind).not.toBe('over');
          const mate = tires.find(({ position }) => position === dualMateOf(tire.position));
          const unsound = [tire, mate].some(
            (one) => one && one.kpa !== null && one.kpa <= one.targetKpa * runFlatShare,
          );
          if (unsound) expect(fillable).toBe(false);
          if (unsound) expect(['too-low', 'mate-too-low']).toContain(verdict.kind);
          if (fillable) expect(tire.kpa).toBeLessThan(tire.targetKpa - tire.toleranceKpa + 0.01);
        }
      }),
    );
  });

  it('never fills above the target, which is never above the limit', () => {
    fc.assert(
      fc.property(coach, (tires) => {
        for (const [index, { verdict }] of sortColdCheck(tires).tires.entries()) {
          const { kpa: found, targetKpa } = tires[index]!;
          if (verdict.kind === 'needs-air')
            expect(found! + verdict.byKpa).toBeCloseTo(targetKpa, 6);
          if (verdict.kind === 'over') expect(found! - verdict.byKpa).toBeCloseTo(targetKpa, 6);
        }
      }),
    );
  });

  it('does not depend on the order in which tires were read', () => {
    fc.assert(
      fc.property(coach, (tires) => {
        const there = sortColdCheck(tires);
        const back = sortColdCheck(tires.toReversed());
        expect(back.tires.toReversed()).toEqual(there.tires);
        expect(back.findings).toEqual(there.findings);
      }),
    );
  });

  it('says the same of a coach seen in a mirror', () => {
    fc.assert(
      fc.property(coach, (tires) => {
        const mirrored = tires.map((tire) => ({ ...tire, position: oppositeOf(tire.position) }));
        const kindsOf = (list: readonly ColdCheckTire[]) =>
          sortColdCheck(list).tires.map(({ verdict, fillable }) => [verdict.kind, fillable]);
        expect(kindsOf(mirrored)).toEqual(kindsOf(tires));
        expect(sortColdCheck(mirrored).findings).toHaveLength(sortColdCheck(tires).findings.length);
      }),
    );
  });

  it('asks for more air the less was found', () => {
    fc.assert(
      fc.property(tireAt('steer-left'), kpa(0, 1400), kpa(0, 1400), (tire, one, other) => {
        const missing = (found: number) => {
          const cold = { ...tire, kpa: gaugeKpa(found), warm: false };
          const { verdict } = sortColdCheck([cold]).tires[0]!;
          if (verdict.kind === 'needs-air') return verdict.byKpa;
          return verdict.kind === 'too-low' ? Number.POSITIVE_INFINITY : 0;
        };
        const [low, high] = [Math.min(one, other), Math.max(one, other)];
        expect(missing(low)).toBeGreaterThanOrEqual(missing(high));
      }),
    );
  });
});
