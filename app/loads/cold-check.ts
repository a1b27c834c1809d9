import {
  type GaugeKpa,
  gaugeKpa,
  type KpaDifference,
  kpaDifference,
  pressureBetween,
} from '~/units';
import { type AxleFinding, findAxleDifferences } from './axle-differences';
import { dualMateOf, type WheelPosition } from './positions';

/** One tire as the cold check found it. */
export interface ColdCheckTire {
  position: WheelPosition;
  /** Gauge kPa, 0 to 1400; null while it has not been read. */
  kpa: GaugeKpa | null;
  /** The axle's target, which is the recommended pressure. */
  targetKpa: GaugeKpa;
  /** Above 0. */
  toleranceKpa: KpaDifference;
  /** The lower of sidewall and wheel, see `lowestLimit`; null when neither is known. */
  limitKpa: GaugeKpa | null;
  /** Driven, or warmed otherwise, within the last three hours. */
  warm: boolean;
}

/**
 * What one tire needs.
 * - `needs-air`: below target by `byKpa`.
 * - `over`: bleed it cold, by `byKpa`, down to the target. `aboveLimit`: above sidewall or wheel.
 * - `warm`: reads high, so it is never bled. Where `belowTarget`, fill it to the target and check
 *   it again cold.
 * - `too-low`: at or below 80 % of recommended, may have been run flat. Not filled; taken off and
 *   looked at by a technician.
 * - `mate-too-low`: carried the load of a dual that was too low. The same.
 */
export type ColdVerdict =
  | { kind: 'not-read' }
  | { kind: 'needs-air'; byKpa: KpaDifference }
  | { kind: 'in-tolerance' }
  | { kind: 'over'; byKpa: KpaDifference; aboveLimit: boolean }
  | { kind: 'warm'; belowTarget: boolean; byKpa: KpaDifference }
  | { kind: 'too-low'; floorKpa: GaugeKpa }
  | { kind: 'mate-too-low'; mate: WheelPosition };

export interface SortedTire {
  position: WheelPosition;
  kpa: GaugeKpa | null;
  verdict: ColdVerdict;
  /** A fill may be timed for it: it wants air, is sound, and so is its dual, which has been read. */
  fillable: boolean;
}

export interface ColdCheck {
  /** In the order given. */
  tires: SortedTire[];
  findings: AxleFinding[];
  /** Every tire has been read. */
  complete: boolean;
}

/**
 * At or below this share of the recommended pressure a tire may have been run flat.
 * 29 CFR 1910.177(f)(2)(i), taken over as trade practice (memory).
 */
export const runFlatShare = 0.8;

/** One hundredth of a kPa: 80 psi of 100 psi is 80 %, though floating point says a bit more. */
const sameKpa = 0.01;

const readable = { least: 0, most: 1400 };

/** The lower of the pressures that sidewall and wheel allow; null when neither is known. */
export function lowestLimit(
  sidewallKpa: GaugeKpa | null,
  wheelKpa: GaugeKpa | null,
): GaugeKpa | null {
  if (sidewallKpa === null) return wheelKpa;
  if (wheelKpa === null) return sidewallKpa;
  return gaugeKpa(Math.min(sidewallKpa, wheelKpa));
}

/**
 * Sorts the tires of a coach after a cold check. Gives codes and amounts; the words live with the
 * screen. A target is never moved for the day's temperature.
 * @param tires every tire of the coach, each position once; a dual whose mate is missing from the
 * list is judged alone
 * @throws RangeError naming field and value: a pressure outside 0 to 1400 kPa, a tolerance not
 * above 0, a target not above 0 or above the limit, a position given twice.
 */
export function sortColdCheck(tires: readonly ColdCheckTire[]): ColdCheck {
  for (const tire of tires) refuseImpossible(tire);
  const byPosition = new Map(tires.map((tire) => [tire.position, tire]));
  if (byPosition.size !== tires.length) throw new RangeError(nameTwice(tires));
  return {
    tires: tires.map((tire) => sortTire(tire, mateAmong(byPosition, tire.position))),
    findings: findAxleDifferences(tires),
    complete: tires.every((tire) => tire.kpa !== null),
  };
}

const mateAmong = (
  tires: ReadonlyMap<WheelPosition, ColdCheckTire>,
  position: WheelPosition,
): ColdCheckTire | undefined => {
  const mate = dualMateOf(position);
  return mate === null ? undefined : tires.get(mate);
};

function sortTire(tire: ColdCheckTire, mate: ColdCheckTire | undefined): SortedTire {
  const verdict = judge(tire, mate);
  const wantsAir = verdict.kind === 'needs-air' || (verdict.kind === 'warm' && verdict.belowTarget);
  return {
    position: tire.position,
    kpa: tire.kpa,
    verdict,
    fillable: wantsAir && mate?.kpa !== null,
  };
}

function judge(tire: ColdCheckTire, mate: ColdCheckTire | undefined): ColdVerdict {
  if (isTooLow(tire)) return { kind: 'too-low', floorKpa: floorOf(tire) };
  if (mate && isTooLow(mate)) return { kind: 'mate-too-low', mate: mate.position };
  const { kpa, targetKpa, toleranceKpa, limitKpa, warm } = tire;
  if (kpa === null) return { kind: 'not-read' };
  const missing = pressureBetween(targetKpa, kpa);
  const belowTarget = missing > toleranceKpa + sameKpa;
  if (warm) return { kind: 'warm', belowTarget, byKpa: belowTarget ? missing : kpaDifference(0) };
  if (belowTarget) return { kind: 'needs-air', byKpa: missing };
  const aboveLimit = limitKpa !== null && kpa > limitKpa + sameKpa;
  // A tolerance doesn't stretch what sidewall and wheel allow.
  if (aboveLimit || -missing > toleranceKpa + sameKpa)
    return { kind: 'over', byKpa: kpaDifference(-missing), aboveLimit };
  return { kind: 'in-tolerance' };
}

const floorOf = ({ targetKpa }: ColdCheckTire): GaugeKpa => gaugeKpa(targetKpa * runFlatShare);

// A warm tire reads high: when even that is too low, cold it is lower still.
const isTooLow = (tire: ColdCheckTire): boolean =>
  tire.kpa !== null && tire.kpa <= floorOf(tire) + sameKpa;

function refuseImpossible({ position, kpa, targetKpa, toleranceKpa, limitKpa }: ColdCheckTire) {
  const refuse = (field: string, value: number, want: string) => {
    throw new RangeError(`${field} of ${position}: ${value} is not ${want}`);
  };
  const { least, most } = readable;
  if (kpa !== null && !(kpa >= least && kpa <= most))
    refuse('kpa', kpa, `between ${least} and ${most} kPa`);
  if (!(targetKpa > 0 && targetKpa <= most))
    refuse('targetKpa', targetKpa, `above 0 and up to ${most} kPa`);
  if (!(toleranceKpa > 0)) refuse('toleranceKpa', toleranceKpa, 'above 0 kPa');
  if (limitKpa !== null && !(targetKpa <= limitKpa + sameKpa))
    refuse('targetKpa', targetKpa, `at or below the limit of ${limitKpa} kPa`);
}

function nameTwice(tires: readonly ColdCheckTire[]): string {
  const positions = tires.map((tire) => tire.position);
  const twice = positions.find((position, index) => positions.indexOf(position) !== index);
  return `position: ${twice} is given twice`;
}
