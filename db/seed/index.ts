import { randomUUID } from 'node:crypto';
import { afterwardsKeys } from '~/fill/wire';
import { type WheelPosition, walkOrderOf } from '~/loads';
import { ColdReading } from '~/models/cold-reading.server';
import { Membership } from '~/models/membership.server';
import { Round } from '~/models/round.server';
import { User } from '~/models/user.server';
import { type FittedTire, loadFittedTires } from '~/queries/fitted-tires.server';
import { type DemoCoach, demoCoaches, demoPeople } from './demo-coaches';
import { recordFill } from './demo-fills';
import { recordCoach } from './demo-records';
import { type StoryRound, tellStory } from './demo-story';

const minute = 60_000;
/** Minutes to walk round and gauge every tire before the first is filled. */
const coldCheckMinutes = 12;

/**
 * Fills an empty database with the demo: two invented coaches, an owner, a driver, half a year of
 * rounds with fills that the engine's own simulator ran.
 */
export async function seedDemo(): Promise<void> {
  const owner = await person(demoPeople.owner);
  const driver = await person(demoPeople.driver);
  for (const coach of demoCoaches) {
    const coachId = await recordCoach(owner, coach);
    if (coach.withDriver) {
      await Membership.create({ id: randomUUID(), userId: driver, coachId, role: 'driver' });
    }
    await recordStory(coach, coachId, coach.withDriver ? driver : owner);
  }
}

async function person({ email, name }: { email: string; name: string }): Promise<string> {
  const { id } = await User.create({ id: randomUUID(), email, name });
  return id;
}

async function recordStory(coach: DemoCoach, coachId: string, driverId: string): Promise<void> {
  const tires = new Map((await loadFittedTires(coachId)).map((tire) => [tire.position, tire]));
  const tireAt = (position: WheelPosition): FittedTire => {
    const tire = tires.get(position);
    if (!tire) throw new RangeError(`position: no tire is fitted at ${position}`);
    return tire;
  };
  const deviceId = randomUUID();
  let walk = { roundId: '', free: new Date(0) };
  let seed = coach.seed;

  const story = tellStory(coach, new Date(), async (round, position, from) => {
    seed += 1;
    const { roundId, free: startedAt } = walk;
    const tire = tireAt(position);
    const fill = {
      coach,
      coachId,
      driverId,
      deviceId,
      roundId,
      tire,
      round,
      from,
      startedAt,
      seed,
    };
    const { kpa, endedAt } = await recordFill(fill);
    walk.free = new Date(endedAt.getTime() + 2 * minute);
    await Round.update({ closedAt: walk.free }, { where: { id: roundId } });
    return kpa;
  });
  for await (const round of story) {
    walk = await recordRound(coach, coachId, driverId, deviceId, round, tireAt);
  }
}

async function recordRound(
  coach: DemoCoach,
  coachId: string,
  driverId: string,
  deviceId: string,
  round: StoryRound,
  tireAt: (position: WheelPosition) => FittedTire,
): Promise<{ roundId: string; free: Date }> {
  const roundId = randomUUID();
  const free = new Date(round.at.getTime() + coldCheckMinutes * minute);
  await Round.create({
    id: roundId,
    coachId,
    startedBy: driverId,
    deviceId,
    place: round.place.place,
    altitudeM: round.place.altitudeM,
    ambientC: round.ambientC,
    timeZone: 'America/Denver',
    withHelper: true,
    startedAt: round.at,
    cautionsAt: new Date(round.at.getTime() + minute),
    closedAt: free,
    afterwards: [...afterwardsKeys],
    receivedAt: free,
  });
  const order = walkOrderOf(coach.layout);
  await ColdReading.bulkCreate(
    round.readings.map(({ position, kpa, targetKpa }) => ({
      id: randomUUID(),
      roundId,
      tireId: tireAt(position).tireId,
      position,
      pressureKpa: kpa,
      targetKpa,
      warm: false,
      readAt: new Date(round.at.getTime() + (2 + order.indexOf(position)) * minute),
      receivedAt: free,
    })),
  );
  return { roundId, free };
}
