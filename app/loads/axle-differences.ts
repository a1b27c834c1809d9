import { type GaugeKpa, type KpaDifference, kpaPerPsi, pressureBetween } from '~/units';
import {
  type Axle,
  axleOf,
  dualMateOf,
  oppositeOf,
  type WheelPosition,
  wheelPositions,
} from './positions';

interface ReadTire {
  position: WheelPosition;
  kpa: GaugeKpa | null;
  warm: boolean;
}

/** Tires of one axle that differ by more than they should, the higher one first. */
export interface AxleFinding {
  kind: 'duals-differ' | 'sides-differ';
  axle: Axle;
  higher: WheelPosition;
  lower: WheelPosition;
  byKpa: KpaDifference;
}

/** 5 psi: the higher one of a dual carries more than its share. Common practice. */
const dualsDifferKpa = 5 * kpaPerPsi;
/** 5 psi, the same for the two ends of an axle, which share one target. Common practice. */
const sidesDifferKpa = 5 * kpaPerPsi;
/** One hundredth of a kPa, so that exactly 5 psi is not "more than 5 psi" by rounding. */
const sameKpa = 0.01;

/**
 * Finds duals that differ by more than 5 psi, and tires in the same place left and right that do.
 * A warm tire is not compared with a cold one, and one that has not been read with none.
 */
export function findAxleDifferences(tires: readonly ReadTire[]): AxleFinding[] {
  const byPosition = new Map(tires.map((tire) => [tire.position, tire]));
  return wheelPositions.flatMap((position) => {
    const tire = byPosition.get(position);
    const mate = dualMateOf(position);
    const opposite = oppositeOf(position);
    return [
      ...compare('duals-differ', tire, mate === null ? undefined : byPosition.get(mate)),
      ...compare('sides-differ', tire, byPosition.get(opposite)),
    ];
  });
}

const allowed = { 'duals-differ': dualsDifferKpa, 'sides-differ': sidesDifferKpa };

/** At most one finding, and only from the higher tire's side: each pair is seen from both. */
function compare(
  kind: AxleFinding['kind'],
  tire: ReadTire | undefined,
  other: ReadTire | undefined,
): AxleFinding[] {
  if (!tire || !other || tire.kpa === null || other.kpa === null) return [];
  if (tire.warm !== other.warm) return [];
  const byKpa = pressureBetween(tire.kpa, other.kpa);
  if (byKpa <= allowed[kind] + sameKpa) return [];
  const [higher, lower] = [tire.position, other.position];
  return [{ kind, axle: axleOf(higher), higher, lower, byKpa }];
}
