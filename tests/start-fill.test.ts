import { randomUUID } from 'node:crypto';
import { afterAll, describe, expect, it } from 'vitest';
import type { AirProfile } from '~/air';
import { resultsSettled } from '~/commands/compute-result.server';
import { startFill } from '~/commands/start-fill.server';
import { AirProfileRow } from '~/models/air-profile.server';
import { Round } from '~/models/round.server';
import { Run } from '~/models/run.server';
import { stopReplayPool } from '~/services/replay-pool.server';
import { addMember } from './factories/coach';
import {
  createFillFor,
  createOpenFill,
  createOpenRound,
  endFillAt,
  runBodyOf,
  usualSetup,
} from './factories/run';
import { createUser } from './factories/user';

afterAll(async () => {
  await resultsSettled();
  await stopReplayPool();
});

const ago = (seconds: number) => new Date(Date.now() - seconds * 1000);
const day = 86_400;
const markOf = async (runId: string) => (await Run.findByPk(runId))?.overlapping;

describe('starting a fill', () => {
  it('stores it once, however often it is sent', async () => {
    const { actor, roundId, tires } = await createOpenRound();
    const body = runBodyOf(roundId, tires['drive-left-inner']);
    const runId = randomUUID();
    const starts = Array.from({ length: 20 }, () => startFill(actor, runId, body));
    expect(new Set((await Promise.all(starts)).map(({ overlapping }) => overlapping))).toEqual(
      new Set([false]),
    );
    const runs = await Run.findAll({ where: { roundId } });
    expect(runs).toHaveLength(1);
    expect(runs[0]).toMatchObject({
      position: 'drive-left-inner',
      setup: usualSetup,
      rigKey: 'a|b|c',
      startedBy: actor.userId,
      lastSeq: 0,
      endedSeq: null,
    });
  });

  it('refuses the same id with another set-up and names the field', async () => {
    const { actor, runId, body } = await createOpenFill();
    const other = { ...body, setup: { ...body.setup, seed: 8 } };
    await expect(startFill(actor, runId, other)).rejects.toMatchObject({
      status: 409,
      code: 'other-body',
      problems: [{ field: 'setup' }],
    });
    expect((await Run.findByPk(runId))?.setup).toEqual(usualSetup);
  });

  it('refuses a helper and a viewer, and hides the round from a stranger', async () => {
    const { actor: stranger } = await createOpenRound();
    const { coachId, roundId, tires } = await createOpenRound();
    const body = runBodyOf(roundId, tires['steer-left']);
    for (const role of ['helper', 'viewer'] as const) {
      const member = await addMember(coachId, (await createUser()).id, role);
      const start = startFill(member, randomUUID(), body);
      await expect(start).rejects.toMatchObject({ status: 403 });
    }
    const hidden = startFill(stranger, randomUUID(), body);
    await expect(hidden).rejects.toMatchObject({ status: 404, code: 'round-not-found' });
    expect(await Run.count({ where: { roundId } })).toBe(0);
  });

  it('refuses a start over 90 days back or in the future, and takes one just inside', async () => {
    const place = await createOpenRound({ startedAt: ago(90 * day) });
    const tooOld = createFillFor(place, { startedAt: ago(90 * day + 60) });
    await expect(tooOld).rejects.toMatchObject({
      status: 400,
      problems: [{ field: 'startedAt', expected: 'a time at most 90 days ago' }],
    });
    const tooEarly = createFillFor(place, { startedAt: ago(-6 * 60) });
    await expect(tooEarly).rejects.toMatchObject({ status: 400, code: 'impossible-time' });
    const { runId } = await createFillFor(place, { startedAt: ago(90 * day - 60) });
    expect(await Run.findByPk(runId)).not.toBeNull();
  });

  it('refuses a tire of another coach', async () => {
    const [mine, other] = [await createOpenRound(), await createOpenRound()];
    const body = runBodyOf(mine.roundId, other.tires['steer-left']);
    await expect(startFill(mine.actor, randomUUID(), body)).rejects.toMatchObject({
      status: 400,
      code: 'tire-not-on-coach',
      problems: [{ field: 'tireId', value: body.tireId }],
    });
  });

  it('refuses a profile that is not the engine’s', async () => {
    const place = await createOpenRound();
    const setup = { ...usualSetup, profile: { schema: 1, members: 'none' } as never as AirProfile };
    const start = createFillFor(place, { setup });
    await expect(start).rejects.toMatchObject({ status: 400, code: 'unusable-setup' });
  });

  it('refuses a start after the closing of its round', async () => {
    const place = await createOpenRound({ closed: true, startedAt: ago(3600) });
    await expect(createFillFor(place)).rejects.toMatchObject({ status: 409, code: 'round-closed' });
    const before = await createFillFor(place, { startedAt: ago(3000) });
    expect(await Run.findByPk(before.runId)).not.toBeNull();
    expect((await Round.findByPk(place.roundId))?.closedAt).not.toBeNull();
  });
});

describe('two fills at once on one coach', () => {
  it('refuses the second while online, and names the first', async () => {
    const first = await createOpenFill();
    const second = createFillFor(first, { runId: randomUUID(), position: 'steer-right' });
    await expect(second).rejects.toMatchObject({
      status: 409,
      code: 'fill-open',
      problems: [{ field: 'runId', value: first.runId }],
    });
  });

  it('lets only one of many parallel starts through', async () => {
    const place = await createOpenRound();
    const starts = await Promise.allSettled(
      Array.from({ length: 10 }, () => createFillFor(place, {})),
    );
    expect(starts.filter(({ status }) => status === 'fulfilled')).toHaveLength(1);
  });

  it('keeps both when the second was begun without signal, and marks both', async () => {
    const first = await createOpenFill();
    const second = await createFillFor(first, { runId: randomUUID(), startedAt: ago(61) });
    expect(second.overlapping).toBe(true);
    expect([await markOf(first.runId), await markOf(second.runId)]).toEqual([true, true]);
  });

  it('starts the next one as soon as the first has ended', async () => {
    const first = await createOpenFill();
    await endFillAt(first.actor, first.runId, 5000);
    const second = await createFillFor(first, { runId: randomUUID(), position: 'steer-right' });
    expect(second.overlapping).toBe(false);
  });

  it('marks fills that were sent one after the other and lay over each other', async () => {
    const place = await createOpenRound({ startedAt: ago(7200) });
    const first = await createFillFor(place, { startedAt: ago(3600) });
    await endFillAt(place.actor, first.runId, 600_000);
    await resultsSettled();
    expect(await AirProfileRow.count({ where: { coachId: place.coachId } })).toBe(1);
    const second = await createFillFor(place, { startedAt: ago(3300) });
    expect(second.overlapping).toBe(false);
    await endFillAt(place.actor, second.runId, 600_000);
    expect([await markOf(first.runId), await markOf(second.runId)]).toEqual([true, true]);
    await resultsSettled();
    expect(await AirProfileRow.count({ where: { coachId: place.coachId } })).toBe(0);
  });

  it('leaves fills unmarked that only touch, within what clocks differ', async () => {
    const place = await createOpenRound({ startedAt: ago(7200) });
    const first = await createFillFor(place, { startedAt: ago(3600) });
    await endFillAt(place.actor, first.runId, 600_000);
    const second = await createFillFor(place, { startedAt: ago(3005) });
    await endFillAt(place.actor, second.runId, 600_000);
    expect([await markOf(first.runId), await markOf(second.runId)]).toEqual([false, false]);
  });
});
