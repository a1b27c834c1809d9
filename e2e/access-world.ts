import { randomUUID } from 'node:crypto';
import { Round } from '~/models/round.server';
import { addMember, createCoach } from '../tests/factories/coach';
import { createRound } from '../tests/factories/round';
import { createFillFor, endFillAt } from '../tests/factories/run';
import { createLoginSession, createUser } from '../tests/factories/user';
import type { Role } from './access-expectations';
import './database';

/** A coach with a round, and somebody who asks about it. */
export interface World {
  /** Absent for nobody. */
  cookie?: string;
  coachId: string;
  coachName: string;
  roundId: string;
  /** Only where a fill was wanted. */
  runId: string;
  tireId: string;
}

/**
 * A coach of its own for one who asks. Its round is open, and so is its fill if one is wanted; for
 * the plain `helper` both are over.
 */
export async function createWorld(role: Role, { fill }: { fill: boolean }): Promise<World> {
  const owner = await createUser();
  const coachName = 'The Long Way Round';
  const { coachId, actor, tires } = await createCoach(owner.id, { name: coachName });
  const round = await createRound(coachId, {
    startedBy: owner.id,
    readings: { 'steer-left': 100 },
  });
  const place = { owner, coachId, actor, tires, roundId: round.id };
  const runId = fill ? (await createFillFor(place)).runId : randomUUID();
  if (role === 'helper') {
    if (fill) await endFillAt(actor, runId, 5000);
    await Round.update({ closedAt: new Date() }, { where: { id: round.id } });
  }
  const world = { coachId, coachName, roundId: round.id, runId, tireId: tires['steer-left'] };
  if (role === 'nobody') return world;
  return { ...world, cookie: await createLoginSession(await askerOf(role, owner.id, coachId)) };
}

async function askerOf(role: Role, ownerId: string, coachId: string): Promise<string> {
  if (role === 'owner') return ownerId;
  const asker = await createUser();
  if (role === 'viewer' || role === 'driver') await addMember(coachId, asker.id, role);
  if (role === 'helper' || role === 'helper during a round') {
    await addMember(coachId, asker.id, 'helper');
  }
  return asker.id;
}

/** The address of a route in a world. */
export function addressOf(path: string, world: World): string {
  const params: Record<string, string> = {
    coachId: world.coachId,
    roundId: world.roundId,
    runId: world.runId,
    fillId: world.runId,
    readingId: randomUUID(),
  };
  return path
    .replace(/:(\w+)/g, (_, name: string) => params[name] ?? `no-${name}`)
    .replace('*', 'no-such-page');
}
