import { expect, it } from 'vitest';
import { createDraws } from './arithmetic';
import { createMembers, FITTING, step } from './coach';
import { createFill } from './index';
import { createPracticeCoach } from './practice';
import { drawLasting, drawWheel, setSupply } from './priors';

const controls = { pedal: false, drain: false, bleeding: false, atmosphereKpa: 101.325 };

it('a step of a millisecond, in which tanks even out, makes no rate that no air has', () => {
  const m = createMembers(1);
  const draws = createDraws(3);
  drawLasting(m, 0, draws);
  drawWheel(m, 0, draws, 140, false);
  m.fitting[0] = FITTING.accessory;
  setSupply(m, 0, 800);
  m.accessoryAbs[0] = 790;
  step(m, 0, 1, 0.001, controls);
  expect(m.drift[0]).toBe(0);
  m.accessoryAbs[0] = 700;
  step(m, 0, 1, 0.06, controls);
  expect(Math.abs(m.drift[0] ?? Number.NaN)).toBeLessThanOrEqual(100);
});

it('belief stays within what a coach can hold, on an accessory tank with odd event times', () => {
  const tire = { startKpa: 700, volumeL: 140 };
  const coach = createPracticeCoach({ seed: 5, tire, fitting: 'accessory', supplyKpa: 740 });
  const fill = createFill({
    tire: { ...tire, targetKpa: 745, toleranceKpa: 7 },
    lowerBy: ['drain'],
  });
  fill.apply({ type: 'engine', speed: 'fast-idle', at: 0 });
  for (let n = 0; n < 40; n++) {
    coach.advance(4.001);
    const at = Math.round(coach.at * 1000) / 1000;
    fill.apply({ type: 'supply-reading', source: 'wheel-gauge', kpa: coach.wheelGaugeKpa(), at });
    if (n % 10 === 3 || n % 10 === 6) {
      coach.setLowering('drain', n % 10 === 3);
      fill.apply({ type: 'lowering', by: 'drain', on: n % 10 === 3, at: at + 0.001 });
    }
    const { supplyKpa, tireKpa } = fill.advise(at + 2);
    for (const kpa of [supplyKpa.p10, supplyKpa.p90, tireKpa.p10, tireKpa.p90]) {
      expect(kpa).toBeGreaterThan(-50);
      expect(kpa).toBeLessThan(1400);
    }
  }
});
