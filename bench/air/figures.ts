import { toPsi } from './flow';
import type { Coverage, FillOutcome } from './outcome';

/** The value below which a share of them lies; NaN of none. */
export function quantile(values: readonly number[], share: number): number {
  if (values.length === 0) return Number.NaN;
  const sorted = [...values].sort((a, b) => a - b);
  const at = (sorted.length - 1) * share;
  const low = sorted[Math.floor(at)]!;
  const high = sorted[Math.ceil(at)]!;
  return low === high ? low : low + (high - low) * (at - Math.floor(at));
}

function mean(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}

function share<T>(items: readonly T[], test: (item: T) => boolean): number {
  return items.filter(test).length / items.length;
}

/** One actor's figures over a set of fills: the rows of the table in design/engine.md. */
export interface Figures {
  fills: number;
  ratioMedian: number;
  ratioP90: number;
  hardMedian: number;
  hardP90: number;
  putOn: number;
  bled: number;
  errorPsiP95: number;
  lost: number;
  overLimit: number;
  taps: number;
  failed: number;
  wronglyUnreachable: number;
  rightlyUnreachable: number;
  perfectMedianS: number;
  secondsMedian: number;
  supplyBand: number;
  tireBand: number;
}

/** Air lost that counts, psi (design/engine.md). */
const LOST_PSI = 0.1;

export function figuresOf(fills: readonly FillOutcome[]): Figures {
  const reachable = fills.filter((fill) => fill.reachable);
  const beyond = fills.filter((fill) => !fill.reachable);
  const ratios = reachable.map(ratio);
  const hard = reachable.filter((fill) => fill.hard).map(ratio);
  return {
    fills: fills.length,
    ratioMedian: quantile(ratios, 0.5),
    ratioP90: quantile(ratios, 0.9),
    hardMedian: quantile(hard, 0.5),
    hardP90: quantile(hard, 0.9),
    putOn: mean(reachable.map((fill) => fill.putOn)),
    bled: share(reachable, (fill) => fill.bled),
    errorPsiP95: quantile(
      reachable.filter((fill) => fill.done).map((f) => toPsi(f.errorKpa)),
      0.95,
    ),
    lost: share(fills, (fill) => toPsi(fill.lostKpa) > LOST_PSI),
    overLimit: share(fills, (fill) => fill.overLimit),
    taps: quantile(
      reachable.map((fill) => fill.taps),
      0.5,
    ),
    failed: share(reachable, (fill) => !fill.done || !fill.proven),
    wronglyUnreachable: share(reachable, (fill) => fill.saidUnreachable),
    rightlyUnreachable: share(beyond, (fill) => fill.saidUnreachable),
    perfectMedianS: quantile(
      reachable.map((fill) => fill.perfectSeconds),
      0.5,
    ),
    secondsMedian: quantile(
      reachable.map((fill) => fill.seconds),
      0.5,
    ),
    supplyBand: covered(reachable.map((fill) => fill.supplyBand)),
    tireBand: covered(reachable.map((fill) => fill.tireBand)),
  };
}

/** Times are ratios to the perfect player's; a fill that was not done counts as never ending. */
function ratio(fill: FillOutcome): number {
  return fill.done ? fill.seconds / fill.perfectSeconds : Number.POSITIVE_INFINITY;
}

function covered(bands: readonly Coverage[]): number {
  const asked = bands.reduce((sum, band) => sum + band.asked, 0);
  return bands.reduce((sum, band) => sum + band.inside, 0) / asked;
}
