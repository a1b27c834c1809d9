import type { GaugeTraits } from './coach';
import { type Dice, normal } from './random';
import { pressureAbs } from './vessel';
import { activeTire, tireKpa, type World } from './world';

/** What a gauge shows to a person: its own error, then the nearest mark. */
export function readGauge(gauge: GaugeTraits, trueKpa: number, dice: Dice): number {
  const shown = trueKpa + gauge.biasKpa + normal(dice, 0, gauge.noiseKpa);
  return Math.max(0, Math.round(shown / gauge.stepKpa) * gauge.stepKpa);
}

/** The gauge in the hose: supply while the path is closed, else between supply and tire. */
export function readTee(world: World, dice: Dice): number {
  return readGauge(world.coach.tee, world.teeKpaAbs - world.coach.atmosphereKpa, dice);
}

/** The gauge on the dash reads the service tanks. */
export function readDash(world: World, dice: Dice): number {
  const kpa = pressureAbs(world.service) - world.coach.atmosphereKpa;
  return readGauge(world.coach.dash, kpa, dice);
}

export function readTire(world: World, dice: Dice): number {
  return readGauge(world.coach.tireGauge, tireKpa(world), dice);
}

/** A reading on the very mark of the tolerance counts, whatever the last bit of its kPa says. */
const LAST_BIT_KPA = 1e-6;

export function withinTolerance(readingKpa: number, world: World): boolean {
  const { targetKpa, toleranceKpa } = activeTire(world);
  return Math.abs(readingKpa - targetKpa) <= toleranceKpa + LAST_BIT_KPA;
}
