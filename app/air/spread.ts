/** Weighted quantiles and probabilities over the members. */
import type { Spread } from './contract';

const order: number[] = [];

/** The 10th, 50th and 90th percentile of values with weights that sum to 1. */
export function spreadOf(values: Float64Array, weights: Float64Array, n = values.length): Spread {
  order.length = 0;
  for (let i = 0; i < n; i++) order.push(i);
  order.sort((a, b) => values[a]! - values[b]! || a - b);
  const result = { p10: 0, p50: 0, p90: 0 };
  let sum = 0;
  let stage = 0;
  for (const i of order) {
    sum += weights[i]!;
    while (stage < 3 && (sum >= [0.1, 0.5, 0.9][stage]! || i === order[n - 1])) {
      const value = tidy(values[i]!);
      if (stage === 0) result.p10 = value;
      else if (stage === 1) result.p50 = value;
      else result.p90 = value;
      stage++;
    }
  }
  return result;
}

/** A thousandth of a kPa or of a second is more than anybody reads. */
export function tidy(x: number): number {
  return Math.round(x * 1000) / 1000;
}

/** Weight of the members whose value is at least this. */
export function chanceAtLeast(values: Float64Array, weights: Float64Array, least: number): number {
  let sum = 0;
  for (let i = 0; i < weights.length; i++) if (values[i]! >= least) sum += weights[i]!;
  return Math.min(1, sum);
}

/** Quantiles of values that count alike. */
export function evenSpread(values: Float64Array): Spread {
  return spreadOf(values, new Float64Array(values.length).fill(1 / values.length));
}
