import { expect, test } from 'vitest';
import { createCoach as makeCoach, type NewCoach } from '~/commands/create-coach.server';
import { removeCoach } from '~/commands/remove-coach.server';
import { setTargets } from '~/commands/set-targets.server';
import { updateCoach } from '~/commands/update-coach.server';
import { updateRig } from '~/commands/update-rig.server';
import { AxleTarget } from '~/models/axle-target.server';
import { Coach } from '~/models/coach.server';
import { Rig } from '~/models/rig.server';
import { Tire } from '~/models/tire.server';
import { loadAxleTargets } from '~/queries/axle-targets.server';
import { loadCoach } from '~/queries/coach.server';
import { loadActor } from '~/queries/coach-access.server';
import { listCoaches } from '~/queries/coaches.server';
import { loadFittedTires } from '~/queries/fitted-tires.server';
import { kpaPerPsi } from '~/units';
import { addMember, createCoach } from './factories/coach';
import { createRound } from './factories/round';
import { createUser } from './factories/user';

const psi = (value: number) => value * kpaPerPsi;

const axle = (targetPsi: number) => ({
  size: '295/75R22.5',
  sidewallLimitKpa: psi(120),
  wheelLimitKpa: psi(115),
  targetKpa: psi(targetPsi),
  volumeL: 140,
  volumeSource: 'estimated' as const,
});

const twoAxles = (steer: number, drive: number): NewCoach => ({
  name: 'Slow Magpie',
  layout: 'two-axles',
  toleranceKpa: psi(2),
  axles: { steer: axle(steer), drive: axle(drive) },
  unit: 'psi',
});

test('a coach is made with its axles, targets and tires, and belongs to who made it', async () => {
  const { id } = await createUser();
  const { coachId } = await makeCoach(await loadActor(id), twoAxles(110, 92));
  const owner = await loadActor(id);
  expect(owner.roles.get(coachId)).toBe('owner');
  const tires = await loadFittedTires(coachId);
  expect(tires.map(({ position }) => position).sort()).toEqual([
    'drive-left-inner',
    'drive-left-outer',
    'drive-right-inner',
    'drive-right-outer',
    'steer-left',
    'steer-right',
  ]);
  const targets = await loadAxleTargets(coachId);
  expect(Object.fromEntries(targets.map((row) => [row.axle, row.targetKpa / kpaPerPsi]))).toEqual({
    steer: 110,
    drive: 92,
  });
});

test('a target above the lowest limit is refused with both values, and nothing is written', async () => {
  const { id } = await createUser();
  const before = await Coach.count();
  await expect(makeCoach(await loadActor(id), twoAxles(118, 92))).rejects.toMatchObject({
    code: 'target-above-limit',
    status: 400,
    problems: [
      {
        field: 'steer.target',
        value: '118 psi',
        expected: '118 psi is above what the wheel allows, 115 psi. Type 115 psi or less.',
      },
    ],
  });
  expect(await Coach.count()).toBe(before);
  expect((await loadActor(id)).roles.size).toBe(0);
});

test('a row that the database refuses leaves nothing of the coach behind', async () => {
  const { id } = await createUser();
  const before = [await Coach.count(), await Tire.count()];
  const broken = {
    ...twoAxles(110, 92),
    axles: { steer: axle(110), drive: { ...axle(92), volumeL: 0 } },
  };
  await expect(makeCoach(await loadActor(id), broken)).rejects.toThrow();
  expect([await Coach.count(), await Tire.count()]).toEqual(before);
});

test('a new target is added and the old one stays; the same again adds nothing', async () => {
  const { coachId, actor } = await createCoach((await createUser()).id);
  const counted = () => AxleTarget.count({ where: { setBy: actor.userId } });
  const before = await counted();
  await setTargets(actor, { coachId, targets: { steer: psi(112) }, unit: 'psi' });
  expect(await counted()).toBe(before + 1);
  await setTargets(actor, { coachId, targets: { steer: psi(112) }, unit: 'psi' });
  expect(await counted()).toBe(before + 1);
  const steer = (await loadAxleTargets(coachId)).find((row) => row.axle === 'steer');
  expect(steer?.targetKpa).toBeCloseTo(psi(112), 9);
});

test('targets are all refused when one of them is above a limit, in the person’s unit', async () => {
  const { coachId, actor } = await createCoach((await createUser()).id, { sidewallPsi: 120 });
  const targets = { steer: 900, drive: 600 };
  await expect(setTargets(actor, { coachId, targets, unit: 'kPa' })).rejects.toMatchObject({
    problems: [
      {
        field: 'steer',
        expected: '900 kPa is above what the tire allows, 827 kPa. Type 827 kPa or less.',
      },
    ],
  });
  const drive = (await loadAxleTargets(coachId)).find((row) => row.axle === 'drive');
  expect(drive?.targetKpa).toBeCloseTo(psi(92), 9);
});

test('a target that reads the same as its limit is taken, and stored no higher than it', async () => {
  const { coachId, actor } = await createCoach((await createUser()).id, { sidewallPsi: 119.9 });
  // 119.9 psi is 826.68 kPa, which reads 827 kPa.
  await setTargets(actor, { coachId, targets: { steer: 827 }, unit: 'kPa' });
  const steer = (await loadAxleTargets(coachId)).find((row) => row.axle === 'steer');
  expect(steer?.targetKpa).toBe(psi(119.9));
});

test('a driver may see a coach and edit nothing of it', async () => {
  const { coachId } = await createCoach((await createUser()).id);
  const driver = await addMember(coachId, (await createUser()).id, 'driver');
  await expect(loadCoach(driver, coachId)).resolves.toMatchObject({ mayEdit: false, mayRun: true });
  const refused = { code: 'not-allowed', status: 403 };
  await expect(updateCoach(driver, { coachId, name: 'Mine' })).rejects.toMatchObject(refused);
  await expect(removeCoach(driver, { coachId })).rejects.toMatchObject(refused);
  await expect(
    setTargets(driver, { coachId, targets: { steer: psi(100) }, unit: 'psi' }),
  ).rejects.toMatchObject(refused);
  expect((await Coach.findByPk(coachId))?.name).toBe('The Test Bench');
});

test('a stranger is told that there is no such coach', async () => {
  const { coachId } = await createCoach((await createUser()).id);
  const stranger = await loadActor((await createUser()).id);
  const refused = { code: 'coach-not-found', status: 404 };
  await expect(loadCoach(stranger, coachId)).rejects.toMatchObject(refused);
  await expect(updateCoach(stranger, { coachId, name: 'Mine' })).rejects.toMatchObject(refused);
});

test('a helper finds the coach in the list only while a round is open', async () => {
  const { coachId } = await createCoach((await createUser()).id);
  const helper = await addMember(coachId, (await createUser()).id, 'helper');
  expect(await listCoaches(helper)).toEqual([]);
  await createRound(coachId);
  expect(await listCoaches(helper)).toMatchObject([{ id: coachId, roundOpen: true }]);
});

test('another rig retires the one before; the same again changes nothing', async () => {
  const { coachId, actor } = await createCoach((await createUser()).id);
  const rig = {
    coachId,
    hose: 'Red coil, 12 m',
    chuck: 'Closed clip-on',
    gauge: 'Tee gauge',
    gaugePlace: 'at-chuck' as const,
    hasValve: false,
    stepKpa: psi(1),
  };
  await updateRig(actor, rig);
  await updateRig(actor, rig);
  const rigs = await Rig.findAll({ where: { coachId }, order: [['createdAt', 'ASC']] });
  expect(rigs.map(({ hose, retiredAt }) => [hose, retiredAt === null])).toEqual([
    ['Grey hose, 15 m', false],
    ['Red coil, 12 m', true],
  ]);
});

test('a coach that was removed is gone for everybody, and its rows stay', async () => {
  const owner = await createUser();
  const { coachId, actor } = await createCoach(owner.id);
  const driver = await createUser();
  await addMember(coachId, driver.id, 'driver');
  await removeCoach(actor, { coachId });
  for (const id of [owner.id, driver.id]) {
    const after = await loadActor(id);
    expect(await listCoaches(after)).toEqual([]);
    await expect(loadCoach(after, coachId)).rejects.toMatchObject({ status: 404 });
  }
  expect((await Coach.findByPk(coachId))?.deletedAt).toBeInstanceOf(Date);
  expect(await loadFittedTires(coachId)).toHaveLength(6);
});
