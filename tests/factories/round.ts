import { randomUUID } from 'node:crypto';
import { afterwardsKeys } from '~/fill/wire';
import { axleOf, type WheelPosition } from '~/loads';
import { ColdReading } from '~/models/cold-reading.server';
import { Round } from '~/models/round.server';
import { loadAxleTargets } from '~/queries/axle-targets.server';
import { kpaPerPsi } from '~/units';
import { tiresOf } from './coach';

export interface NewRoundFacts {
  startedBy?: string;
  startedAt?: Date;
  place?: string;
  altitudeM?: number;
  ambientC?: number;
  withHelper?: boolean;
  cautions?: boolean;
  closed?: boolean;
  /** What the gauge showed, psi. */
  readings?: Partial<Record<WheelPosition, number>>;
  /** Those of them that were warm. */
  warm?: readonly WheelPosition[];
}

const minuteMs = 60_000;

/** A round as it was left: its cold readings a minute apart, closed with its list unless open. */
export async function createRound(coachId: string, facts: NewRoundFacts = {}) {
  const startedAt = facts.startedAt ?? new Date(Date.now() - 30 * minuteMs);
  const at = (minutes: number) => new Date(startedAt.getTime() + minutes * minuteMs);
  const closed = facts.closed ?? false;
  const round = await Round.create({
    id: randomUUID(),
    coachId,
    startedBy: facts.startedBy ?? null,
    deviceId: randomUUID(),
    place: facts.place ?? 'Larch Hollow, pitch 14',
    altitudeM: facts.altitudeM ?? 310,
    ambientC: facts.ambientC ?? 12,
    timeZone: 'America/Denver',
    withHelper: facts.withHelper ?? true,
    startedAt,
    cautionsAt: (facts.cautions ?? true) ? at(1) : null,
    closedAt: closed ? at(29) : null,
    afterwards: closed ? [...afterwardsKeys] : [],
  });
  await addReadings(round, facts, at);
  return round;
}

async function addReadings(round: Round, facts: NewRoundFacts, at: (minutes: number) => Date) {
  const tires = await tiresOf(round.coachId);
  const targets = await loadAxleTargets(round.coachId);
  const readings = Object.entries(facts.readings ?? {}) as [WheelPosition, number][];
  await ColdReading.bulkCreate(
    readings.map(([position, psi], index) => ({
      id: randomUUID(),
      roundId: round.id,
      tireId: tires[position],
      position,
      pressureKpa: psi * kpaPerPsi,
      targetKpa: targets.find(({ axle }) => axle === axleOf(position))!.targetKpa,
      warm: facts.warm?.includes(position) ?? false,
      readAt: at(2 + index),
    })),
  );
}
