/**
 * Why the engine says what it says: stable codes, each once. The words live with the screen.
 * Codes that belong to `check` stand together at the end.
 */
export const REASONS = [
  // read-supply
  'supply-unknown',
  'supply-unsure',
  // wait
  'supply-below-tire',
  'supply-about-to-fall',
  'wait-for-cut-in',
  'engine-off',
  'let-it-settle',
  'not-at-the-wheel',
  'after-low-air',
  // lower-supply, stop-lowering
  'lower-to-cut-in',
  'cut-in-likely',
  'low-enough',
  'supply-too-low',
  'chuck-is-on',
  // chuck-on, keep-on
  'supply-above-tire',
  'air-goes-in',
  // chuck-off
  'target-reached',
  'gauge-to-be-sure',
  'supply-at-tire',
  'near-limit',
  'cycle-again',
  // gauge-tire
  'prove-it',
  'reading-odd',
  'see-what-went-in',
  // bleed
  'over-target',
  // done
  'in-tolerance',
  'warm-over-target',
  // cannot-reach
  'governor-too-low',
  // check
  'supply-not-moving',
  'compressor-not-loading',
  'not-building',
  'gauges-disagree',
  'tire-not-rising',
  'chuck-still-on',
  'low-air',
] as const;

export type Reason = (typeof REASONS)[number];
