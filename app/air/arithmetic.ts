/**
 * Exponential, logarithm, powers and seeded draws, built from + − × ÷ and the exactly rounded
 * parts of `Math`. `Math.exp`, `log`, `pow` and `**` differ in the last bit between JavaScript
 * engines, and one differing weight would let two phones give different calls.
 */

/** ln 2 in two parts, so that k·ln 2 loses nothing. */
const LN2_HIGH = 0.6931471803691238;
const LN2_LOW = 1.9082149292705877e-10;
const LN2 = LN2_HIGH + LN2_LOW;
const SQRT2 = Math.sqrt(2);
const TWO_TO_MINUS_32 = 1 / 4294967296;

/** 2^k for whole k; exact, since each factor is a power of two. */
function powerOfTwo(k: number): number {
  let result = 1;
  let base = k < 0 ? 0.5 : 2;
  let left = Math.abs(k);
  while (left > 0) {
    if (left & 1) result *= base;
    base *= base;
    left >>= 1;
  }
  return result;
}

/** e^x; relative error below 1e-15. Under −700 it is 0, over 700 it stops growing. */
export function exp(x: number): number {
  if (!(x > -700)) return 0;
  const clamped = Math.min(x, 700);
  const k = Math.round(clamped / LN2);
  const r = clamped - k * LN2_HIGH - k * LN2_LOW;
  let sum = 1;
  for (let n = 13; n >= 1; n--) sum = 1 + (sum * r) / n;
  return sum * powerOfTwo(k);
}

/** Natural logarithm of a positive number; 0 and below give −745, the log of the least double. */
export function log(x: number): number {
  if (!(x > 0)) return -745;
  let m = x;
  let k = 0;
  while (m > SQRT2) {
    m *= 0.5;
    k++;
  }
  while (m < SQRT2 / 2) {
    m *= 2;
    k--;
  }
  const s = (m - 1) / (m + 1);
  const s2 = s * s;
  let sum = 0;
  for (let n = 21; n >= 1; n -= 2) sum = sum * s2 + 1 / n;
  return 2 * s * sum + k * LN2_HIGH + k * LN2_LOW;
}

/** x^y for positive x. */
export function pow(x: number, y: number): number {
  return exp(y * log(x));
}

/** A seeded stream of draws; its whole state is one 32-bit number, so that a checkpoint is cheap. */
export interface Draws {
  state: number;
}

export function createDraws(seed: number): Draws {
  return { state: Math.trunc(seed) | 0 };
}

/** Uniform in (0, 1), never either end (mulberry32). */
export function uniform(draws: Draws): number {
  draws.state = (draws.state + 0x6d2b79f5) | 0;
  let z = draws.state;
  z = Math.imul(z ^ (z >>> 15), z | 1);
  z ^= z + Math.imul(z ^ (z >>> 7), z | 61);
  return (((z ^ (z >>> 14)) >>> 0) + 0.5) * TWO_TO_MINUS_32;
}

export function uniformBetween(draws: Draws, low: number, high: number): number {
  return low + (high - low) * uniform(draws);
}

const TAIL = 0.02425;

/**
 * Standard normal draw by the inverse distribution function: Acklam's rational approximation,
 * relative error 1.2e-9 (coefficients from memory; a test compares moments and quantiles).
 */
export function normal(draws: Draws): number {
  return normalQuantile(uniform(draws));
}

/** The standard normal's quantile of a probability in (0, 1). */
export function normalQuantile(p: number): number {
  if (p < TAIL) return tailQuantile(p);
  if (p > 1 - TAIL) return -tailQuantile(1 - p);
  const q = p - 0.5;
  const r = q * q;
  return (
    ((((((-39.69683028665376 * r + 220.9460984245205) * r - 275.9285104469687) * r +
      138.357751867269) *
      r -
      30.66479806614716) *
      r +
      2.506628277459239) *
      q) /
    (((((-54.47609879822406 * r + 161.5858368580409) * r - 155.6989798598866) * r +
      66.80131188771972) *
      r -
      13.28068155288572) *
      r +
      1)
  );
}

function tailQuantile(p: number): number {
  const q = Math.sqrt(-2 * log(p));
  return (
    (((((-0.007784894002430293 * q - 0.3223964580411365) * q - 2.400758277161838) * q -
      2.549732539343734) *
      q +
      4.374664141464968) *
      q +
      2.938163982698783) /
    ((((0.007784695709041462 * q + 0.3224671290700398) * q + 2.445134137142996) * q +
      3.754408661907416) *
      q +
      1)
  );
}

/** A draw that is positive: the median times a factor of e^(spread·normal). */
export function lognormal(draws: Draws, median: number, spread: number): number {
  return median * exp(spread * normal(draws));
}

const STANDARD = new Float64Array(1024).map((_, i) => {
  const p = (i + 0.5) * 0.6180339887498949;
  return normalQuantile(Math.min(0.999, Math.max(0.001, p - Math.floor(p))));
});

/** A fixed standard normal value for a place, spread evenly over neighbouring places. */
export function standardDraw(place: number): number {
  return STANDARD[place % STANDARD.length]!;
}
