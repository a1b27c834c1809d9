import { createRequire } from 'node:module';
import { describe, expect, it } from 'vitest';
import {
  ANR,
  CRITICAL_RATIO,
  createMembers,
  FITTING,
  flowShare,
  type Members,
  PATH,
  step,
} from './coach';
import { createPracticeCoach } from './index';
import { KPA_PER_PSI, setSupply } from './priors';

// Required and not imported: its types are TypeScript source, held to this project's strictness.
const { Solver } = createRequire(import.meta.url)('odex') as {
  Solver: new (
    dimension: number,
  ) => {
    absoluteTolerance: number;
    relativeTolerance: number;
    solve(
      slopes: (x: number, y: number[]) => number[],
      x: number,
      y0: number[],
      xEnd: number,
    ): { y: number[] };
  };
};

const STILL = { pedal: false, drain: false, bleeding: false, atmosphereKpa: 101.325 };

/** One tire on a supply that does not fall: V = 150 L, C = 1 dm³/(s·bar), b = 0.3, 120 psi gauge. */
function constantSupply(startPsi: number): Members {
  const m = createMembers(1);
  m.fitting[0] = FITTING.service;
  m.supplyL[0] = 1;
  m.serviceL[0] = 1e12;
  m.cutOutKpa[0] = 1e6;
  m.coolingS[0] = 60;
  m.pathC[0] = 1;
  m.hoseC[0] = 1;
  m.tireL[0] = 150;
  m.path[0] = PATH.seated;
  m.tireAbs[0] = startPsi * KPA_PER_PSI + 101.325;
  setSupply(m, 0, 120 * KPA_PER_PSI + 101.325);
  return m;
}

function secondsTo(m: Members, targetAbs: number, h: number): number {
  let t = 0;
  while (t < 1000) {
    const before = m.tireAbs[0]!;
    step(m, 0, 1, h, STILL);
    const after = m.tireAbs[0]!;
    if (after >= targetAbs) return t + (h * (targetAbs - before)) / (after - before);
    t += h;
  }
  return Number.NaN;
}

const HUNDRED_PSI = 100 * KPA_PER_PSI + 101.325;

describe('isothermal fill from a constant supply', () => {
  // Closed form, ISO 6358-1 with the gas law (computed): for V = 150 L, C = 1 dm³/(s·bar), b = 0.3,
  // 293.15 K, R = 287.05, supply 120 psi gauge at 101.325 kPa: 80 → 100 psi in 30.93930 s,
  // 0 → 100 psi in 124.25997 s of which 28.71580 choked.
  it('takes 80 → 100 psi in 30.93930 s and 0 → 100 psi in 124.25997 s', () => {
    expect(secondsTo(constantSupply(80), HUNDRED_PSI, 0.001)).toBeCloseTo(30.9393, 2);
    expect(secondsTo(constantSupply(0), HUNDRED_PSI, 0.001)).toBeCloseTo(124.25997, 2);
  });

  it('is choked for the first 28.71580 s', () => {
    const m = constantSupply(0);
    const critical = CRITICAL_RATIO * m.serviceAbs[0]!;
    expect(secondsTo(m, critical, 0.001)).toBeCloseTo(28.7158, 2);
  });

  it('on the grid of the filter, half a second, errs by less than a percent', () => {
    expect(secondsTo(constantSupply(80), HUNDRED_PSI, 0.5) / 30.9393).toBeCloseTo(1, 2);
  });

  it('agrees with odex, a published ODE solver, on the way', () => {
    const supply = constantSupply(0).serviceAbs[0]!;
    const rate = (tire: number) => {
      const r = tire / supply;
      const x = (r - 0.3) / 0.7;
      return ((supply * ANR) / 150) * (r <= 0.3 ? 1 : Math.sqrt(Math.max(0, 1 - x * x)));
    };
    for (const seconds of [10, 40, 90]) {
      const solver = new Solver(1);
      solver.absoluteTolerance = 1e-9;
      solver.relativeTolerance = 1e-9;
      const slopes = (_x: number, y: number[]) => [rate(y[0]!)];
      const expected = solver.solve(slopes, 0, [101.325], seconds).y[0]!;
      const m = constantSupply(0);
      for (let k = 0; k < seconds * 200; k++) step(m, 0, 1, 0.005, STILL);
      expect(m.tireAbs[0]! / expected).toBeCloseTo(1, 3);
    }
  });
});

describe('flow', () => {
  it('is choked below the critical ratio and ends at equal pressure (ISO 6358-1)', () => {
    expect(flowShare(0.1)).toBe(1);
    expect(flowShare(CRITICAL_RATIO)).toBe(1);
    expect(flowShare(1)).toBe(0);
    expect(flowShare(0.65)).toBeCloseTo(Math.sqrt(1 - 0.5 ** 2), 12);
  });

  it('choked through an ideal nozzle is 0.68473 · p0·A/√(R·T0), compressible-flow text, γ = 1.4', () => {
    const gamma = 1.4;
    const constant = Math.sqrt(gamma) * (2 / (gamma + 1)) ** ((gamma + 1) / (2 * (gamma - 1)));
    expect(constant).toBeCloseTo(0.68473, 5);
    // The C of an ideal nozzle of 1 mm², in dm³/(s·bar) of ISO 8778 air, gives the same mass flow.
    const area = 1e-6;
    const p0 = 9e5;
    const massFlow = (constant * p0 * area) / Math.sqrt(287.05 * 293.15);
    const c = massFlow / (p0 / 1e5) / 1.185 / 1e-3;
    const m = constantSupply(0);
    setSupply(m, 0, 900);
    m.pathC[0] = c;
    step(m, 0, 1, 0.01, STILL);
    const modelled = (m.flow[0]! * 1e-3 * 1e3) / (287.05 * 293.15);
    expect(modelled / massFlow).toBeCloseTo(1, 6);
  });
});

describe('build-up of the simulated coach', () => {
  // 49 CFR 571.121 S5.1.1: 85 to 100 psi within (actual reservoir capacity × 25) / required
  // capacity, in seconds, at the engine's highest recommended speed.
  it('passes FMVSS 121 with tanks of the required capacity, and takes longer with a weak compressor', () => {
    const seconds = (fastFlow: number) => {
      const coach = createPracticeCoach({
        seed: 1,
        tire: { startKpa: 700, volumeL: 150 },
        supplyKpa: 85 * KPA_PER_PSI,
        engine: 'fast-idle',
        loaded: true,
        supplyL: 25,
        serviceL: 75,
        fastFlow,
        leakPsiPerMinute: 0,
      });
      while (coach.supplyKpa() < 100 * KPA_PER_PSI && coach.at < 300) coach.advance(0.1);
      return coach.at;
    };
    expect(seconds(5.5)).toBeLessThan(25);
    expect(seconds(3)).toBeGreaterThan(25);
    // By the gas law: volume · 15 psi / (delivery · 100 kPa), delivery near its rated value.
    expect(seconds(5.5)).toBeCloseTo((100 * 15 * KPA_PER_PSI) / (5.5 * 100), 0);
  });
});
