import { axleOf, leakPerMonth, positionsOf, type WheelPosition } from '~/loads';
import { type Celsius, type GaugeKpa, type Metres, standardAtmosphere } from '~/units';
import { loadAxleTargets } from './axle-targets.server';
import type { CoachHead } from './coach.server';
import { loadFittedTires } from './fitted-tires.server';
import { loadTireReadings, type TireReading } from './tire-readings.server';

/** A tire as the coach's page shows it. Gauge kPa; null where nothing is known. */
export interface TireState {
  tireId: string;
  position: WheelPosition;
  size: string;
  targetKpa: number;
  limitKpa: number;
  /** As it was last left. */
  kpa: number | null;
  warm: boolean;
  /** When it was last read in a cold check. */
  checkedAt: Date | null;
  /** The last cold check less what it had been left at before. */
  sinceLastKpa: number | null;
  /** Loss a month, above zero. */
  lossPerMonthKpa: number | null;
}

/** Readings older than this say nothing about a tire's leak today. A year and a month, days. */
const lookBackDays = 395;
const dayMs = 24 * 60 * 60 * 1000;

/**
 * The state of every tire that is fitted, front first.
 * @param coach one that the person may see
 */
export async function loadTireStates(
  coach: Pick<CoachHead, 'id' | 'layout'>,
  now: Date,
): Promise<TireState[]> {
  const since = new Date(now.getTime() - lookBackDays * dayMs);
  const [tires, targets, readings] = await Promise.all([
    loadFittedTires(coach.id),
    loadAxleTargets(coach.id),
    loadTireReadings(coach.id, since),
  ]);
  return positionsOf(coach.layout).flatMap((position) => {
    const tire = tires.find((each) => each.position === position);
    const target = targets.find((each) => each.axle === axleOf(position));
    if (!tire || !target) return [];
    const own = readings.filter((reading) => reading.tireId === tire.tireId);
    return {
      tireId: tire.tireId,
      position,
      size: tire.size,
      targetKpa: target.targetKpa,
      limitKpa: Math.min(tire.sidewallLimitKpa, tire.wheelLimitKpa),
      ...stateOf(own),
    };
  });
}

function stateOf(readings: readonly TireReading[]) {
  const last = readings.at(-1);
  const checked = readings.findLastIndex((reading) => !reading.afterFill);
  const check = readings[checked];
  const before = readings[checked - 1];
  return {
    kpa: last?.kpa ?? null,
    warm: last?.warm ?? false,
    checkedAt: check?.at ?? null,
    sinceLastKpa: check && before && !check.warm ? check.kpa - before.kpa : null,
    lossPerMonthKpa: leakPerMonth(readings.map(forTrend)),
  };
}

const forTrend = ({ at, kpa, ambientC, altitudeM, afterFill, warm }: TireReading) => ({
  at,
  kpa: kpa as GaugeKpa,
  temperature: ambientC as Celsius,
  atmosphere: standardAtmosphere(altitudeM as Metres),
  adjusted: afterFill,
  warm,
});
