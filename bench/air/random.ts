/** Seeded randomness. The state is one whole number, so that a world can be copied in mid-run. */
export interface Dice {
  state: number;
}

const UINT32 = 4294967296;

/** A new stream for a place in the bench: the same parts give the same stream. */
export function diceFor(...parts: number[]): Dice {
  let hash = 0x811c9dc5;
  for (const part of parts) {
    hash = Math.imul(hash ^ (part | 0), 0x01000193);
    hash = Math.imul(hash ^ (hash >>> 15), 0x85ebca6b);
    hash ^= hash >>> 13;
  }
  return { state: hash >>> 0 };
}

/** Uniform in [0, 1): mulberry32. */
export function roll(dice: Dice): number {
  dice.state = (dice.state + 0x6d2b79f5) >>> 0;
  let z = dice.state;
  z = Math.imul(z ^ (z >>> 15), z | 1);
  z ^= z + Math.imul(z ^ (z >>> 7), z | 61);
  return ((z ^ (z >>> 14)) >>> 0) / UINT32;
}

export function between(dice: Dice, low: number, high: number): number {
  return low + (high - low) * roll(dice);
}

export function chance(dice: Dice, probability: number): boolean {
  return roll(dice) < probability;
}

/** Normal draw (Box and Muller, one of the pair). */
export function normal(dice: Dice, mean: number, sd: number): number {
  const u = Math.max(roll(dice), 1e-12);
  return mean + sd * Math.sqrt(-2 * Math.log(u)) * Math.cos(2 * Math.PI * roll(dice));
}

/** Lognormal draw by its median and the spread of its logarithm. */
export function around(dice: Dice, median: number, sigma: number): number {
  return median * Math.exp(normal(dice, 0, sigma));
}

export function logBetween(dice: Dice, low: number, high: number): number {
  return low * (high / low) ** roll(dice);
}

export function pick<T>(dice: Dice, choices: readonly [T, number][]): T {
  let left = roll(dice) * choices.reduce((sum, [, weight]) => sum + weight, 0);
  for (const [choice, weight] of choices) {
    left -= weight;
    if (left < 0) return choice;
  }
  return choices[choices.length - 1]![0];
}
