import { randomUUID } from 'node:crypto';
import { afterAll, describe, expect, it } from 'vitest';
import { acknowledgeCautions } from '~/commands/acknowledge-cautions.server';
import { closeRound } from '~/commands/close-round.server';
import { resultsSettled } from '~/commands/compute-result.server';
import { recordColdReading } from '~/commands/record-cold-reading.server';
import { startRound } from '~/commands/start-round.server';
import { afterwardsKeys, type ReadingBody, type RoundBody, versioned } from '~/fill/wire';
import { ColdReading } from '~/models/cold-reading.server';
import { Round } from '~/models/round.server';
import { loadRound } from '~/queries/round.server';
import { stopReplayPool } from '~/services/replay-pool.server';
import { kpaPerPsi } from '~/units';
import { addMember, createCoach } from './factories/coach';
import { createFillFor, createOpenRound, endFillAt } from './factories/run';
import { createUser } from './factories/user';

afterAll(async () => {
  await resultsSettled();
  await stopReplayPool();
});

const at = (secondsAgo: number) => new Date(Date.now() - secondsAgo * 1000).toISOString();

const roundOf = (coachId: string, startedAt = at(5)): RoundBody =>
  versioned({
    coachId,
    startedAt,
    place: 'Thistle Flat',
    altitudeM: 1500,
    ambientC: -3,
    timeZone: 'America/Denver',
    withHelper: true,
    deviceId: randomUUID(),
  });

const readingOf = (tireId: string, kpa = 690, readAt = at(1)): ReadingBody =>
  versioned({ tireId, kpa, warm: false, readAt });

describe('a round', () => {
  it('is stored once, however often it is sent', async () => {
    const { coachId, actor } = await createCoach((await createUser()).id);
    const body = roundOf(coachId);
    const roundId = randomUUID();
    await Promise.all(Array.from({ length: 10 }, () => startRound(actor, roundId, body)));
    expect(await Round.count({ where: { coachId } })).toBe(1);
    const other = startRound(actor, roundId, { ...body, ambientC: 4, place: 'Elsewhere' });
    await expect(other).rejects.toMatchObject({
      status: 409,
      code: 'other-body',
      problems: [{ field: 'place' }, { field: 'ambientC', value: 4 }],
    });
    const { round } = await loadRound(actor, roundId);
    expect(round).toMatchObject({ place: 'Thistle Flat', ambientC: -3, startedAt: body.startedAt });
  });

  it('gives its id away to no other coach', async () => {
    const { coachId, actor } = await createCoach((await createUser()).id);
    const other = await createCoach((await createUser()).id);
    const roundId = randomUUID();
    await startRound(actor, roundId, roundOf(coachId));
    const taken = startRound(other.actor, roundId, roundOf(other.coachId));
    await expect(taken).rejects.toMatchObject({ status: 409, code: 'other-body' });
    const hidden = loadRound(other.actor, roundId);
    await expect(hidden).rejects.toMatchObject({ status: 404, code: 'round-not-found' });
  });

  it('is refused when it began over 90 days ago or in the future', async () => {
    const { coachId, actor } = await createCoach((await createUser()).id);
    for (const startedAt of [at(90 * 86_400 + 60), at(-600)]) {
      const start = startRound(actor, randomUUID(), roundOf(coachId, startedAt));
      await expect(start).rejects.toMatchObject({
        status: 400,
        code: 'impossible-time',
        problems: [{ field: 'startedAt', value: startedAt }],
      });
    }
    expect(await Round.count({ where: { coachId } })).toBe(0);
  });

  it('keeps the first time at which the cautions were read', async () => {
    const { actor, roundId } = await createOpenRound({ cautions: false });
    const first = await acknowledgeCautions(actor, roundId, versioned({ acknowledgedAt: at(20) }));
    const again = await acknowledgeCautions(actor, roundId, versioned({ acknowledgedAt: at(1) }));
    expect(again).toEqual(first);
    expect((await loadRound(actor, roundId)).round.cautionsAt).toBe(first.acknowledgedAt);
  });

  it('is run by owners and drivers only', async () => {
    const { coachId, roundId, tires } = await createOpenRound();
    for (const role of ['helper', 'viewer'] as const) {
      const member = await addMember(coachId, (await createUser()).id, role);
      const reading = readingOf(tires['steer-left']);
      const attempts = [
        startRound(member, randomUUID(), roundOf(coachId)),
        acknowledgeCautions(member, roundId, versioned({ acknowledgedAt: at(1) })),
        recordColdReading(member, roundId, randomUUID(), reading),
        closeRound(
          member,
          roundId,
          versioned({ closedAt: at(0), afterwards: [...afterwardsKeys] }),
        ),
      ];
      for (const { status } of await Promise.allSettled(attempts)) expect(status).toBe('rejected');
    }
    expect(await Round.count({ where: { coachId } })).toBe(1);
    expect(await ColdReading.count({ where: { roundId } })).toBe(0);
  });
});

describe('a cold reading', () => {
  it('is stored once with the position and the target of its day', async () => {
    const { actor, roundId, tires } = await createOpenRound();
    const readingId = randomUUID();
    const body = readingOf(tires['drive-right-outer'], 612.5);
    const copies = Array.from({ length: 10 }, () =>
      recordColdReading(actor, roundId, readingId, body),
    );
    await Promise.all(copies);
    const rows = await ColdReading.findAll({ where: { roundId } });
    expect(rows).toHaveLength(1);
    expect(rows[0]).toMatchObject({ position: 'drive-right-outer', pressureKpa: 612.5 });
    expect(rows[0]?.targetKpa).toBeCloseTo(92 * kpaPerPsi, 9);
    const changed = recordColdReading(actor, roundId, readingId, { ...body, kpa: 700 });
    await expect(changed).rejects.toMatchObject({
      status: 409,
      problems: [{ field: 'kpa', value: 700 }],
    });
  });

  it('is refused when it was read after the closing of its round', async () => {
    const { actor, roundId, tires } = await createOpenRound({ closed: true });
    const late = recordColdReading(actor, roundId, randomUUID(), readingOf(tires['steer-left']));
    await expect(late).rejects.toMatchObject({ status: 409, code: 'round-closed' });
    const before = readingOf(tires['steer-left'], 690, at(29 * 60));
    await recordColdReading(actor, roundId, randomUUID(), before);
    expect(await ColdReading.count({ where: { roundId } })).toBe(1);
  });
});

describe('closing a round', () => {
  const closing = () => versioned({ closedAt: at(0), afterwards: [...afterwardsKeys] });

  it('waits for a fill that is open, and names it', async () => {
    const place = await createOpenRound();
    const { runId, actor, roundId } = await createFillFor(place);
    await expect(closeRound(actor, roundId, closing())).rejects.toMatchObject({
      status: 409,
      code: 'fill-open',
      problems: [{ field: 'runId', value: runId }],
    });
    await endFillAt(actor, runId, 4000);
    const { closedAt } = await closeRound(actor, roundId, closing());
    expect((await loadRound(actor, roundId)).round).toMatchObject({
      closedAt,
      afterwards: [...afterwardsKeys],
    });
  });

  it('counts once: a second closing answers the first', async () => {
    const { actor, roundId } = await createOpenRound();
    const first = await closeRound(actor, roundId, closing());
    expect(await closeRound(actor, roundId, closing())).toEqual(first);
  });
});

describe('the page of a round', () => {
  it('holds readings, fills with how they ended, and the newest fill’s log', async () => {
    const place = await createOpenRound({ readings: { 'steer-left': 101.5 } });
    const first = await createFillFor(place);
    await endFillAt(place.actor, first.runId, 4000, 'done');
    const second = await createFillFor(place, { position: 'steer-right' });
    const page = await loadRound(place.actor, place.roundId);
    expect(page.round.readings).toMatchObject([{ tireId: place.tires['steer-left'], warm: false }]);
    expect(page.fills).toMatchObject([
      { id: first.runId, how: 'done', endKpa: null },
      { id: second.runId, how: null },
    ]);
    expect(page.newestFill).toMatchObject({ id: second.runId, log: [], mayEnd: true });
    expect(page.coach.wheels).toHaveLength(6);
    expect(page.mayRun).toBe(true);
  });
});
