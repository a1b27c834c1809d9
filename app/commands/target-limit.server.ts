import { type FieldProblem, Refusal } from '~/services/refusal.server';
import { formatPressure, type GaugeKpa, type PressureUnit } from '~/units';

/** What a tire on its wheel may hold, gauge kPa. */
export interface Limits {
  sidewallLimitKpa: number;
  wheelLimitKpa: number;
}

/** The lowest of several limits, gauge kPa, and whether a tire or a wheel sets it. */
export function lowestOf(limits: readonly Limits[]): { kpa: number; of: 'tire' | 'wheel' } {
  const sidewall = Math.min(...limits.map((limit) => limit.sidewallLimitKpa));
  const wheel = Math.min(...limits.map((limit) => limit.wheelLimitKpa));
  return sidewall <= wheel ? { kpa: sidewall, of: 'tire' } : { kpa: wheel, of: 'wheel' };
}

/** A pressure as it stands in a refusal. */
export const shownPressure = (kpa: number, unit: PressureUnit) =>
  formatPressure(kpa as GaugeKpa, unit, { trim: true });

/**
 * Whether a target is above the lowest limit of the tires that it is for. Never above the sidewall
 * maximum or the wheel's rating (coach and vehicle manuals). Two that read the same in the person's
 * unit count as the same.
 */
export const isAboveLimit = (targetKpa: number, limits: readonly Limits[], unit: PressureUnit) => {
  const { kpa } = lowestOf(limits);
  return targetKpa > kpa && shownPressure(targetKpa, unit) !== shownPressure(kpa, unit);
};

/** A target no higher than the lowest limit: what differs by rounding alone is brought down. */
export const withinLimit = (targetKpa: number, limits: readonly Limits[]) =>
  Math.min(targetKpa, lowestOf(limits).kpa);

/** What is wrong with a target, in the person's unit; null when it is not above its limit. */
export function targetProblem(
  field: string,
  targetKpa: number,
  limits: readonly Limits[],
  unit: PressureUnit,
): FieldProblem | null {
  if (!isAboveLimit(targetKpa, limits, unit)) return null;
  const lowest = lowestOf(limits);
  const [target, limit] = [shownPressure(targetKpa, unit), shownPressure(lowest.kpa, unit)];
  return {
    field,
    value: target,
    expected: `${target} is above what the ${lowest.of} allows, ${limit}. Type ${limit} or less.`,
  };
}

/** Refuses with every problem at once; does nothing when there is none. */
export function refuseProblems(problems: readonly (FieldProblem | null)[], code: string): void {
  const found = problems.filter((problem) => problem !== null);
  if (found.length > 0) {
    throw new Refusal('bad-input', code, 'Some of it cannot be used. See the fields.', found);
  }
}
