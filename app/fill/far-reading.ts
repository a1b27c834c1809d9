import type { Spread } from '~/air';

/** A reading that lies at least this far from the forecast is asked about: 6 psi, our choice. */
const leastFarKpa = 41;
/** And this many half-widths of the forecast's 80 % band. */
const halfWidths = 2.5;

/** True when a reading is far enough from the forecast to be asked about once. */
export function isFar(kpa: number, forecast: Spread): boolean {
  const half = (forecast.p90 - forecast.p10) / 2;
  return Math.abs(kpa - forecast.p50) > Math.max(leastFarKpa, halfWidths * half);
}
