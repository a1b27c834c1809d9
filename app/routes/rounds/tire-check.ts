import { type ColdCheck, sortColdCheck, type WheelPosition } from '~/loads';
import { gaugeKpa, kpaDifference } from '~/units';

/** A tire with what was read of it, as plain numbers in gauge kPa. */
export interface CheckedTire {
  position: WheelPosition;
  kpa: number | null;
  warm: boolean;
  targetKpa: number;
  limitKpa: number;
}

/** Sorts tires as they come from the server or the phone. */
export const checkOf = (tires: readonly CheckedTire[], toleranceKpa: number): ColdCheck =>
  sortColdCheck(
    tires.map(({ position, kpa, warm, targetKpa, limitKpa }) => ({
      position,
      kpa: kpa === null ? null : gaugeKpa(kpa),
      warm,
      targetKpa: gaugeKpa(targetKpa),
      toleranceKpa: kpaDifference(toleranceKpa),
      limitKpa: gaugeKpa(limitKpa),
    })),
  );
