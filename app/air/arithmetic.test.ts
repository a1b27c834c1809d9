import { describe, expect, it } from 'vitest';
import { createDraws, exp, log, normal, normalQuantile, pow, uniform } from './arithmetic';

describe('own exponential and logarithm', () => {
  it('agree with the platform to 1e-14 over what weights and draws use', () => {
    for (let x = -60; x <= 60; x += 0.37) {
      expect(Math.abs(exp(x) / Math.exp(x) - 1)).toBeLessThan(1e-14);
    }
    for (let x = 1e-9; x < 1e9; x *= 1.7) {
      expect(Math.abs(log(x) - Math.log(x))).toBeLessThan(2e-14 * (1 + Math.abs(Math.log(x))));
      expect(Math.abs(pow(x, 0.7) / x ** 0.7 - 1)).toBeLessThan(1e-13);
    }
  });

  it('stay finite at the ends', () => {
    expect(exp(-1e9)).toBe(0);
    expect(Number.isFinite(exp(1e9))).toBe(true);
    expect(log(0)).toBe(-745);
    expect(log(-1)).toBe(-745);
  });
});

describe('draws', () => {
  it('of one seed are the same, and never 0 or 1', () => {
    const a = createDraws(7);
    const b = createDraws(7);
    for (let i = 0; i < 1000; i++) {
      const u = uniform(a);
      expect(u).toBe(uniform(b));
      expect(u > 0 && u < 1).toBe(true);
    }
  });

  it('are standard normal: known quantiles (from memory) and moments of 20 000 draws', () => {
    expect(normalQuantile(0.5)).toBeCloseTo(0, 9);
    expect(normalQuantile(0.975)).toBeCloseTo(1.959964, 5);
    expect(normalQuantile(0.001)).toBeCloseTo(-3.090232, 5);
    const draws = createDraws(3);
    let sum = 0;
    let squares = 0;
    const n = 20000;
    for (let i = 0; i < n; i++) {
      const z = normal(draws);
      sum += z;
      squares += z * z;
    }
    expect(Math.abs(sum / n)).toBeLessThan(0.03);
    expect(squares / n).toBeCloseTo(1, 1);
  });
});
