import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { createDraws } from './arithmetic';
import { createMembers, type Members, PATH, sourceAbs, step } from './coach';
import { drawLasting, drawSupply, drawWheel } from './priors';

/** Any coach of the prior, with its chuck on a tire of any pressure. */
function anyCoach(seed: number, tireAbs: number): Members {
  const m = createMembers(1);
  const draws = createDraws(seed);
  drawLasting(m, 0, draws);
  drawSupply(m, 0, draws, 101.325);
  drawWheel(m, 0, draws, 150, false);
  m.tireAbs[0] = tireAbs;
  m.path[0] = PATH.seated;
  return m;
}

const coaches = fc.record({
  seed: fc.integer({ min: 1, max: 1e9 }),
  tireAbs: fc.double({ min: 110, max: 1100, noNaN: true }),
  h: fc.constantFrom(0.1, 0.5, 1, 2, 4),
});
const STILL = { pedal: false, drain: false, bleeding: false, atmosphereKpa: 101.325 };

describe('laws of the step function', () => {
  it('air never flows uphill, nor past equal pressure', () => {
    fc.assert(
      fc.property(coaches, ({ seed, tireAbs, h }) => {
        const m = anyCoach(seed, tireAbs);
        m.leak[0] = 0;
        m.loaded[0] = 0;
        m.speed[0] = 0;
        m.heating[0] = 0;
        for (let k = 0; k < 40; k++) {
          const above = sourceAbs(m, 0) - m.tireAbs[0]!;
          step(m, 0, 1, h, STILL);
          expect(m.flow[0]! * above).toBeGreaterThanOrEqual(-1e-9);
          expect((sourceAbs(m, 0) - m.tireAbs[0]!) * above).toBeGreaterThanOrEqual(-1e-6);
        }
      }),
    );
  });

  it('mass is conserved between tanks and tire', () => {
    fc.assert(
      fc.property(coaches, ({ seed, tireAbs, h }) => {
        const m = anyCoach(seed, tireAbs);
        m.leak[0] = 0;
        m.loaded[0] = 0;
        m.cutInKpa[0] = -1e9;
        const mass = () =>
          m.supplyAbs[0]! * m.supplyL[0]! +
          m.serviceAbs[0]! * m.serviceL[0]! +
          m.accessoryAbs[0]! * m.accessoryL[0]! +
          m.tireAbs[0]! * m.tireL[0]!;
        const before = mass();
        for (let k = 0; k < 40; k++) step(m, 0, 1, h, STILL);
        expect(Math.abs(mass() / before - 1)).toBeLessThan(1e-9);
      }),
    );
  });

  it('pressures stay finite and above nothing, whatever people do', () => {
    const acts = fc.array(fc.tuple(fc.boolean(), fc.boolean(), fc.boolean()), { maxLength: 30 });
    fc.assert(
      fc.property(coaches, acts, ({ seed, tireAbs, h }, list) => {
        const m = anyCoach(seed, tireAbs);
        for (const [pedal, drain, bleeding] of list) {
          for (let k = 0; k < 10; k++) step(m, 0, 1, h, { ...STILL, pedal, drain, bleeding });
          for (const value of [m.supplyAbs[0]!, m.serviceAbs[0]!, m.tireAbs[0]!]) {
            expect(value).toBeGreaterThan(50);
            expect(value).toBeLessThan(2500);
          }
        }
      }),
    );
  });
});
