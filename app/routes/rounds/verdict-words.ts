import { type ColdVerdict, positionName, type SortedTire } from '~/loads';
import {
  formatPressure,
  formatPressureDifference,
  type GaugeKpa,
  type KpaDifference,
  kpaDifference,
  type PressureUnit,
} from '~/units';

/** A word or two for a table or below a drawn tire. */
export function verdictWord(verdict: ColdVerdict): string {
  switch (verdict.kind) {
    case 'not-read':
      return 'not read';
    case 'needs-air':
      return 'needs air';
    case 'in-tolerance':
      return 'holds';
    case 'over':
      return verdict.aboveLimit ? 'above its limit' : 'over';
    case 'warm':
      return verdict.belowTarget ? 'warm, needs air' : 'warm';
    case 'too-low':
    case 'mate-too-low':
      return 'do not fill';
  }
}

/** Whether somebody has to do something about it. */
export const wantsAction = (verdict: ColdVerdict): boolean =>
  verdict.kind === 'warm'
    ? verdict.belowTarget
    : verdict.kind !== 'in-tolerance' && verdict.kind !== 'not-read';

/** Whether what is missing below the target's line is to be seen: a warm tire in tolerance hides it. */
export const lacksAir = (verdict: ColdVerdict): boolean =>
  wantsAction(verdict) && verdict.kind !== 'over';

/** "4 psi", without zeros behind the point. */
export const amount = (kpa: KpaDifference, unit: PressureUnit) =>
  formatPressureDifference(kpa, unit, { trim: true });

export const shownPressure = (kpa: number, unit: PressureUnit) =>
  formatPressure(kpa as GaugeKpa, unit, { trim: true });

/** What to do about a tire and why, in full sentences. */
export function verdictAdvice(
  { verdict }: Pick<SortedTire, 'verdict'>,
  targetKpa: number,
  unit: PressureUnit,
): string {
  const target = shownPressure(targetKpa, unit);
  switch (verdict.kind) {
    case 'not-read':
      return 'Not read yet.';
    case 'needs-air':
      return `Needs ${amount(verdict.byKpa, unit)}. Fill it to ${target}.`;
    case 'in-tolerance':
      return '';
    case 'over':
      return overWords(verdict, target, unit);
    case 'warm':
      return warmWords(verdict, target, unit);
    case 'too-low':
      return `At or below 80 % of its target: ${shownPressure(verdict.floorKpa, unit)}. It may have been run flat, so no fill is timed for it. Have it taken off and looked at by a technician.`;
    case 'mate-too-low':
      return `${positionName(verdict.mate)} beside it is too low, so this one carried both loads. No fill is timed for it. Have it taken off and looked at by a technician.`;
  }
}

function overWords(
  { byKpa, aboveLimit }: Extract<ColdVerdict, { kind: 'over' }>,
  target: string,
  unit: PressureUnit,
): string {
  const above = aboveLimit ? ' It is above what the tire and wheel allow.' : '';
  const over = kpaDifference(Math.max(0, byKpa));
  return `${amount(over, unit)} over.${above} Let it down to ${target} while it is cold.`;
}

function warmWords(
  { belowTarget, byKpa }: Extract<ColdVerdict, { kind: 'warm' }>,
  target: string,
  unit: PressureUnit,
): string {
  if (!belowTarget) return 'Warm, so it reads high. Never bleed it now. Check it again cold.';
  return `Warm and still ${amount(byKpa, unit)} below its cold target. Fill it to ${target}. Check it again cold.`;
}
