import { randomUUID } from 'node:crypto';
import { expect, test } from 'vitest';
import { createFill, ENGINE_VERSION } from '~/air';
import { appendEvents } from '~/commands/append-events.server';
import { setTargets } from '~/commands/set-targets.server';
import { AirProfileRow } from '~/models/air-profile.server';
import { loadLearnedAir } from '~/queries/air-profile.server';
import { loadTireStates } from '~/queries/coach-overview.server';
import { loadHistory, roundsOnPage } from '~/queries/history.server';
import { kpaPerPsi } from '~/units';
import { addMember, createCoach } from './factories/coach';
import { createRound } from './factories/round';
import { batchOf, createFillFor, eventOf, usualSetup } from './factories/run';
import { createUser } from './factories/user';

const psi = (value: number) => value * kpaPerPsi;
const dayMs = 86_400_000;
const daysAgo = (days: number) => new Date(Date.now() - days * dayMs);

async function oldCoach() {
  const owner = await createUser();
  const coach = await createCoach(owner.id, { since: daysAgo(200), targetPsi: { steer: 110 } });
  return { owner, ...coach };
}

/** A fill of steer left that ends with the tire gauged at `kpa`; an earlier gauging is taken back. */
async function fillSteerLeft(coach: Awaited<ReturnType<typeof oldCoach>>, kpa: number) {
  const round = await createRound(coach.coachId, { readings: { 'steer-left': 104 } });
  const fill = await createFillFor({ ...coach, roundId: round.id });
  const slip = eventOf({ type: 'tire-reading', kpa: 999 }, 70_000);
  const events = [
    eventOf({ type: 'tire-reading', kpa }, 60_000),
    slip,
    eventOf({ type: 'taken-back', of: slip.id }, 72_000),
    eventOf({ type: 'ended', how: 'done' }, 80_000),
  ];
  await appendEvents(coach.actor, fill.runId, batchOf(events));
  return { round, fill };
}

test('a tire’s state is its last cold reading, what changed since, and its loss a month', async () => {
  const coach = await oldCoach();
  for (const [days, reading] of [
    [90, 112],
    [60, 110],
    [30, 108],
  ] as const) {
    const readings = { 'steer-left': reading };
    await createRound(coach.coachId, { startedAt: daysAgo(days), closed: true, readings });
  }
  const states = await loadTireStates({ id: coach.coachId, layout: 'two-axles' }, new Date());
  expect(states).toHaveLength(6);
  const [left, right] = states;
  expect(left).toMatchObject({ position: 'steer-left', warm: false });
  expect(left?.kpa).toBeCloseTo(psi(108), 6);
  expect(left?.sinceLastKpa).toBeCloseTo(psi(-2), 6);
  // 2 psi in 30 days, a month being 365.25 / 12 days; the temperature was always the same, and the
  // reading is brought from 12 to 20 °C, which makes it larger by less than 4 %.
  expect(left?.lossPerMonthKpa).toBeGreaterThan((psi(2) * 30.4375) / 30);
  expect(left?.lossPerMonthKpa).toBeLessThan(((psi(2) * 30.4375) / 30) * 1.04);
  expect(right).toMatchObject({ kpa: null, checkedAt: null, sinceLastKpa: null });
});

test('after a fill a tire stands at what it was last gauged at, not at what was taken back', async () => {
  const coach = await oldCoach();
  await fillSteerLeft(coach, psi(110));
  const [left] = await loadTireStates({ id: coach.coachId, layout: 'two-axles' }, new Date());
  expect(left?.kpa).toBeCloseTo(psi(110), 6);
});

test('the history tells each reading against the target of its day, and how fills ended', async () => {
  const coach = await oldCoach();
  const before = { startedAt: daysAgo(20), closed: true, readings: { 'steer-left': 109 } };
  await createRound(coach.coachId, before);
  await setTargets(coach.actor, {
    coachId: coach.coachId,
    targets: { steer: psi(114) },
    unit: 'psi',
  });
  const { round, fill } = await fillSteerLeft(coach, psi(113.5));
  const { rounds, pages } = await loadHistory(coach.actor, coach.coachId, 1);
  expect(pages).toBe(1);
  expect(rounds[0]).toMatchObject({ id: round.id, closed: false });
  expect(rounds.map(({ readings }) => readings.map((r) => Math.round(r.targetKpa)))).toEqual([
    [Math.round(psi(114))],
    [Math.round(psi(110))],
  ]);
  expect(rounds[0]?.fills).toMatchObject([{ id: fill.runId, how: 'done', endKpa: psi(113.5) }]);
  expect(rounds[1]?.fills).toEqual([]);
});

test('the history shows rounds newest first, a page at a time, and no page beyond the last', async () => {
  const coach = await oldCoach();
  const count = roundsOnPage + 3;
  for (let index = 0; index < count; index++) {
    await createRound(coach.coachId, { startedAt: daysAgo(index + 1), place: `Place ${index}` });
  }
  const first = await loadHistory(coach.actor, coach.coachId, 1);
  const second = await loadHistory(coach.actor, coach.coachId, 2);
  const places = [...first.rounds, ...second.rounds].map(({ place }) => place);
  expect(places).toEqual(Array.from({ length: count }, (_, index) => `Place ${index}`));
  expect(await loadHistory(coach.actor, coach.coachId, 99)).toEqual(second);
  expect((await loadHistory(coach.actor, coach.coachId, -4)).page).toBe(1);
});

test('a helper may not read the history, and a viewer may', async () => {
  const coach = await oldCoach();
  await createRound(coach.coachId);
  const helper = await addMember(coach.coachId, (await createUser()).id, 'helper');
  const viewer = await addMember(coach.coachId, (await createUser()).id, 'viewer');
  await expect(loadHistory(helper, coach.coachId, 1)).rejects.toMatchObject({ status: 403 });
  expect((await loadHistory(viewer, coach.coachId, 1)).rounds).toHaveLength(1);
});

test('what was learned of the air is told as the engine’s own profile has it', async () => {
  const { coachId } = await oldCoach();
  expect(await loadLearnedAir(coachId)).toBeNull();
  const profile = createFill(usualSetup).profile();
  const row = { coachId, rigKey: 'a|b|c', schemaVersion: profile.schema, profile };
  await AirProfileRow.create({ id: randomUUID(), engineVersion: ENGINE_VERSION, ...row });
  const learned = await loadLearnedAir(coachId);
  expect(learned).toMatchObject({ fills: 1, hose: 'a', chuck: 'b', gauge: 'c' });
  const column = profile.fields.indexOf('cutOutKpa');
  const rising = profile.members.map((member) => member[column]!).sort((a, b) => a - b);
  const { low, middle, high } = learned!.cutOutKpa!;
  expect(rising).toEqual(expect.arrayContaining([low, middle, high]));
  expect(rising.filter((kpa) => kpa < low).length).toBeLessThanOrEqual(rising.length / 10);
  expect(rising.filter((kpa) => kpa > high).length).toBeLessThanOrEqual(rising.length / 10 + 1);
  expect(learned!.cutInKpa!.middle).toBeLessThan(middle);
});
