import { randomUUID } from 'node:crypto';
import { ENGINE_VERSION, type FillEvent, type FillSetup } from '~/air';
import { rigKeyOf } from '~/fill/rig-key';
import { Run } from '~/models/run.server';
import { RunEvent } from '~/models/run-event.server';
import type { FittedTire } from '~/queries/fitted-tires.server';
import { type GaugeKpa, gaugeKpa, kpaPerPsi } from '~/units';
import type { DemoCoach } from './demo-coaches';
import type { StoryRound } from './demo-story';
import { simulateFill } from './simulated-fill';

/** A fill may end this far from its target, kPa: one psi. */
const toleranceKpa = kpaPerPsi;

/** Who fills which coach, with what. */
export interface Filling {
  coach: DemoCoach;
  coachId: string;
  driverId: string;
  deviceId: string;
  roundId: string;
  tire: FittedTire;
  round: StoryRound;
  from: GaugeKpa;
  startedAt: Date;
  seed: number;
}

/** Simulates one fill and stores it with its log; answers what the tire was left at and when. */
export async function recordFill(filling: Filling): Promise<{ kpa: GaugeKpa; endedAt: Date }> {
  const setup = setupOf(filling);
  const simulated = simulateFill(setup, airOf(filling));
  const runId = randomUUID();
  const { coachId, roundId, tire, deviceId, driverId, startedAt } = filling;
  const rows = eventRows(runId, filling, [
    ...simulated.events,
    { type: 'ended', how: simulated.how, at: simulated.endedAt, id: randomUUID() },
  ]);
  await Run.create({
    id: runId,
    kind: 'fill',
    coachId,
    roundId,
    tireId: tire.tireId,
    position: tire.position,
    setup,
    engineVersion: ENGINE_VERSION,
    rigKey: rigKeyOf(setup),
    startedBy: driverId,
    deviceId,
    startedAt,
    lastSeq: rows.length,
    endedSeq: rows.length,
  });
  await RunEvent.bulkCreate(rows);
  const endedAt = new Date(startedAt.getTime() + simulated.endedAt * 1000);
  return { kpa: gaugeKpa(simulated.settledKpa), endedAt };
}

function setupOf({ coach, tire, round, from, seed }: Filling): FillSetup {
  const target = round.readings.find(({ position }) => position === tire.position)?.targetKpa;
  if (target === undefined) throw new RangeError(`position: ${tire.position} was not read`);
  return {
    tire: {
      startKpa: from,
      targetKpa: target,
      toleranceKpa,
      volumeL: tire.volumeL,
      limitKpa: Math.min(tire.sidewallLimitKpa, tire.wheelLimitKpa),
    },
    rig: {
      gauge: 'above-valve',
      valve: false,
      stepKpa: kpaPerPsi,
      hose: coach.rig.hose,
      chuck: coach.rig.chuck,
      gaugeName: coach.rig.gauge,
    },
    lowerBy: coach.lowerBy,
    crew: { helper: true },
    atmosphereKpa: round.atmosphere,
    seed,
  };
}

/** The coach's own air, the same coach every time; the tire is the one that is filled. */
function airOf({ coach, tire, round, from }: Filling) {
  return {
    seed: coach.seed,
    tire: { startKpa: from, volumeL: tire.volumeL * 1.03 },
    governor: {
      cutInKpa: coach.air.cutInPsi * kpaPerPsi,
      cutOutKpa: coach.air.cutOutPsi * kpaPerPsi,
    },
    fitting: coach.air.fitting,
    atmosphereKpa: round.atmosphere,
    governorJitterKpa: kpaPerPsi / 2,
  };
}

type Ended = { type: 'ended'; how: string; at: number; id: string };

function eventRows(runId: string, filling: Filling, events: (FillEvent | Ended)[]) {
  const { startedAt, deviceId, driverId } = filling;
  return events.map(({ type, at, id = randomUUID(), ...body }, index) => {
    const atMs = Math.round(at * 1000);
    const moment = new Date(startedAt.getTime() + atMs);
    return {
      runId,
      seq: index + 1,
      id,
      type,
      atMs,
      body,
      side: 'wheel' as const,
      actorId: driverId,
      deviceId,
      deviceSeq: index,
      deviceTime: moment,
      offsetMs: 0,
      receivedAt: moment,
    };
  });
}
