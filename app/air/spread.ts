/** Quantiles over members that count alike. */
import type { Spread } from './contract';

/** The 10th, 50th and 90th percentile; sorts the values in place. */
export function evenSpread(values: Float64Array): Spread {
  values.sort();
  const at = (share: number) => tidy(values[Math.floor(share * (values.length - 1) + 0.5)]!);
  return { p10: at(0.1), p50: at(0.5), p90: at(0.9) };
}

/** A thousandth of a kPa or of a second is more than anybody reads. */
export function tidy(x: number): number {
  return Math.round(x * 1000) / 1000;
}
