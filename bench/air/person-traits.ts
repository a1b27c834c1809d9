/**
 * People without the product: one at the wheel who watches a tee gauge without a break and guesses
 * hold times, one in the seat with the pedal. Figures are set so that both land near the published
 * rows (design/engine.md); the traits say how people differ, not how they ought to work.
 */
export interface PersonTraits {
  /** First guess of how fast a tire gains, psi/s, and how far people are apart in it. */
  guessPsiPerS: number;
  guessSigma: number;
  /** Share of the time that the last hold asks for. */
  boldness: number;
  /** Carries the rate from tire to tire and scales it with the headroom. */
  learns: boolean;
  /** Gauge over tire before putting on: rising, and with the supply at rest. */
  risingPsi: number;
  restingPsi: number;
  /** Takes off when the gauge comes this near to where the tire is believed to be. */
  nearPsi: number;
  longestHoldS: number;
  /** Longest first hold of a tire, whose core nobody knows yet. */
  longestFirstS: number;
}

export const PLAIN: PersonTraits = {
  guessPsiPerS: 0.12,
  guessSigma: 0.4,
  boldness: 0.92,
  learns: false,
  risingPsi: 5,
  restingPsi: 9,
  nearPsi: 1.5,
  longestHoldS: 60,
  longestFirstS: 25,
};

export const EXPERT: PersonTraits = {
  guessPsiPerS: 0.12,
  guessSigma: 0.3,
  boldness: 0.95,
  learns: true,
  risingPsi: 1,
  restingPsi: 4,
  nearPsi: -0.5,
  longestHoldS: 240,
  longestFirstS: 50,
};
