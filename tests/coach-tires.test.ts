import { expect, test } from 'vitest';
import { correctTire, replaceTire, swapTires } from '~/commands/update-tires.server';
import { Fitting } from '~/models/fitting.server';
import { Tire } from '~/models/tire.server';
import { loadFittedTires } from '~/queries/fitted-tires.server';
import { loadTireReadings } from '~/queries/tire-readings.server';
import { kpaPerPsi } from '~/units';
import { addMember, createCoach, tiresOf } from './factories/coach';
import { createRound } from './factories/round';
import { createUser } from './factories/user';

const psi = (value: number) => value * kpaPerPsi;
const newTire = (sidewallPsi: number, wheelPsi = 125) => ({
  size: '315/80R22.5',
  sidewallLimitKpa: psi(sidewallPsi),
  wheelLimitKpa: psi(wheelPsi),
  volumeL: 170,
  volumeSource: 'typed' as const,
});

test('replacing a tire ends the fitting before it and keeps its readings', async () => {
  const { coachId, actor, tires } = await createCoach((await createUser()).id);
  await createRound(coachId, { closed: true, readings: { 'steer-left': 108 } });
  await replaceTire(actor, { coachId, unit: 'psi', position: 'steer-left', tire: newTire(130) });
  const now = await tiresOf(coachId);
  expect(now['steer-left']).not.toBe(tires['steer-left']);
  expect(now['steer-right']).toBe(tires['steer-right']);
  const before = await Fitting.findOne({ where: { tireId: tires['steer-left'] } });
  const after = await Fitting.findOne({ where: { tireId: now['steer-left'] } });
  expect(before?.fittedUntil).toEqual(after?.fittedFrom);
  const readings = await loadTireReadings(coachId, new Date(0));
  expect(readings.map(({ tireId, kpa }) => [tireId, kpa / kpaPerPsi])).toEqual([
    [tires['steer-left'], 108],
  ]);
});

test('two tires change places with their wheels, and where they were stays on record', async () => {
  const { coachId, actor, tires } = await createCoach((await createUser()).id);
  const tire = newTire(120, 118);
  await correctTire(actor, { coachId, unit: 'psi', position: 'steer-left', tire });
  await swapTires(actor, {
    coachId,
    unit: 'psi',
    position: 'steer-left',
    with: 'drive-left-inner',
  });
  const now = await loadFittedTires(coachId);
  const at = (position: string) => now.find((each) => each.position === position);
  expect(at('drive-left-inner')).toMatchObject({ tireId: tires['steer-left'] });
  expect(at('drive-left-inner')?.wheelLimitKpa).toBe(psi(118));
  expect(at('steer-left')).toMatchObject({ tireId: tires['drive-left-inner'] });
  const past = await Fitting.findAll({ where: { tireId: tires['steer-left'] } });
  expect(past.map(({ position, fittedUntil }) => [position, fittedUntil === null]).sort()).toEqual([
    ['drive-left-inner', true],
    ['steer-left', false],
  ]);
});

test('a limit below the axle’s target is refused beside it, and the tire stays as it was', async () => {
  const { coachId, actor, tires } = await createCoach((await createUser()).id);
  const change = { coachId, unit: 'psi' as const, position: 'steer-left' as const };
  await expect(correctTire(actor, { ...change, tire: newTire(105) })).rejects.toMatchObject({
    code: 'target-above-limit',
    problems: [
      {
        field: 'sidewallLimit',
        expected:
          'Steer left would be allowed 105 psi, below its target of 110 psi. Lower the target first.',
      },
    ],
  });
  expect((await Tire.findByPk(tires['steer-left']))?.size).toBe('295/75R22.5');
  await expect(replaceTire(actor, { ...change, tire: newTire(130, 100) })).rejects.toMatchObject({
    problems: [{ field: 'wheelLimit' }],
  });
  expect((await tiresOf(coachId))['steer-left']).toBe(tires['steer-left']);
});

test('a move that would put a weak tire under a high target is undone as a whole', async () => {
  const { coachId, actor, tires } = await createCoach((await createUser()).id);
  const change = { coachId, unit: 'psi' as const };
  await correctTire(actor, { ...change, position: 'drive-left-outer', tire: newTire(100) });
  await expect(
    swapTires(actor, { ...change, position: 'drive-left-outer', with: 'steer-left' }),
  ).rejects.toMatchObject({ code: 'target-above-limit', problems: [{ field: 'with' }] });
  expect(await tiresOf(coachId)).toEqual(tires);
});

test('a driver may not change tires', async () => {
  const { coachId, tires } = await createCoach((await createUser()).id);
  const driver = await addMember(coachId, (await createUser()).id, 'driver');
  await expect(
    replaceTire(driver, { coachId, unit: 'psi', position: 'steer-left', tire: newTire(130) }),
  ).rejects.toMatchObject({ status: 403 });
  expect(await tiresOf(coachId)).toEqual(tires);
});
