import type { PressureUnit } from '~/units';

/** How far a small vessel reaches below and above its target, in the person's unit. */
const vesselReach: Record<PressureUnit, { below: number; above: number }> = {
  psi: { below: 14, above: 6 },
  kPa: { below: 100, above: 40 },
  bar: { below: 1, above: 0.4 },
};

const kpaPer: Record<PressureUnit, number> = { psi: 6.894757293168361, kPa: 1, bar: 100 };

export interface TireLevels {
  /** Height of the target's line, percent of the vessel. */
  line: number;
  /** Height of the tire's level, percent; undefined while its pressure is not known. */
  level: number | undefined;
}

/** Where level and line of a tire's vessel stand. A pressure off the scale stays at its end. */
export function tireLevels(
  pressureKpa: number | undefined,
  targetKpa: number,
  unit: PressureUnit,
): TireLevels {
  const { below, above } = vesselReach[unit];
  const line = (below / (below + above)) * 100;
  if (pressureKpa === undefined) return { line, level: undefined };
  const over = (pressureKpa - targetKpa) / kpaPer[unit];
  const level = ((over + below) / (below + above)) * 100;
  return { line, level: Math.min(100, Math.max(0, level)) };
}

/** The scale in words, for below the drawing. */
export function scaleWords(unit: PressureUnit): string {
  const { below, above } = vesselReach[unit];
  return `The line is the target. Each vessel spans ${below} ${unit} below it to ${above} ${unit} above.`;
}
