/** Pounds per square inch in kPa (NIST SP 811). */
export const KPA_PER_PSI = 6.894757293168361;

export const psi = (value: number): number => value * KPA_PER_PSI;
export const toPsi = (kpa: number): number => kpa / KPA_PER_PSI;

/** Halvings of the bracket for the pressure at the gauge: 1/2^14 of the drop is far below a gauge. */
const HALVINGS = 14;

/**
 * Air through one component, ISO 6358: in kPa·L/s at ambient temperature, pressures absolute in
 * kPa, C in dm³/(s·bar). Volume flow at the reference atmosphere (ANR, 100 kPa) is C·p1 with p1 in
 * bar, and a dm³ of it is 100 kPa·L: the two hundreds cancel.
 */
export function flowThrough(upKpaAbs: number, downKpaAbs: number, c: number, b: number): number {
  if (downKpaAbs >= upKpaAbs) return 0;
  const ratio = downKpaAbs / upKpaAbs;
  if (ratio <= b) return c * upKpaAbs;
  const excess = (ratio - b) / (1 - b);
  return c * upKpaAbs * Math.sqrt(1 - excess * excess);
}

/** Pressure between two components in series, found where both pass the same flow. */
export function pressureBetween(
  upKpaAbs: number,
  firstC: number,
  downKpaAbs: number,
  secondC: number,
  b: number,
): number {
  let low = downKpaAbs;
  let high = upKpaAbs;
  for (let i = 0; i < HALVINGS; i++) {
    const middle = (low + high) / 2;
    const arrives = flowThrough(upKpaAbs, middle, firstC, b);
    if (arrives > flowThrough(middle, downKpaAbs, secondC, b)) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

/** Two conductances in series, near enough for parts that are never watched between. */
export function inSeries(firstC: number, secondC: number): number {
  return (firstC * secondC) / Math.sqrt(firstC * firstC + secondC * secondC);
}
