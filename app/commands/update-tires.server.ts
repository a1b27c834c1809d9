import { randomUUID } from 'node:crypto';
import type { Transaction } from 'sequelize';
import type { Actor } from '~/access/can';
import { axleOf, positionName, type WheelPosition } from '~/loads';
import { AxleTarget } from '~/models/axle-target.server';
import { Fitting } from '~/models/fitting.server';
import { Tire } from '~/models/tire.server';
import { loadAxleTargets } from '~/queries/axle-targets.server';
import { type FittedTire, loadFittedTires } from '~/queries/fitted-tires.server';
import { notFound, Refusal } from '~/services/refusal.server';
import type { PressureUnit } from '~/units';
import { changeCoach } from './coach-transaction.server';
import {
  isAboveLimit,
  type Limits,
  lowestOf,
  shownPressure,
  withinLimit,
} from './target-limit.server';

/** A tire as it is described. Pressures are gauge kPa, the volume litres. */
export interface TireDescription extends Limits {
  size: string;
  volumeL: number;
  volumeSource: 'estimated' | 'typed';
}

interface TireChange {
  coachId: string;
  /** The unit in which a refusal speaks. */
  unit: PressureUnit;
}

/**
 * Corrects what is known about the tire at a position: a mistyped size, a limit read anew.
 * @throws Refusal `target-above-limit` when the axle's target is above the new limits;
 * `tire-not-found`, `not-allowed`, `coach-not-found`.
 */
export async function correctTire(
  actor: Actor,
  input: TireChange & { position: WheelPosition; tire: TireDescription },
): Promise<void> {
  await changeCoach(actor, 'records:edit', input.coachId, async (transaction) => {
    const fitting = await fittingAt(input.coachId, input.position, transaction);
    const { wheelLimitKpa, ...tire } = input.tire;
    await Tire.update(tire, { where: { id: fitting.tireId }, transaction });
    await fitting.update({ wheelLimitKpa }, { transaction });
    await refuseBelowTarget(input, transaction);
  });
}

/**
 * Takes another tire into use at a position. The one before is taken off and keeps its readings,
 * fills and the time for which it was fitted.
 * @throws Refusal as `correctTire`.
 */
export async function replaceTire(
  actor: Actor,
  input: TireChange & { position: WheelPosition; tire: TireDescription },
): Promise<void> {
  await changeCoach(actor, 'records:edit', input.coachId, async (transaction) => {
    const { coachId, position } = input;
    const fitting = await fittingAt(coachId, position, transaction);
    const { wheelLimitKpa, ...description } = input.tire;
    const now = new Date();
    await fitting.update({ fittedUntil: now }, { transaction });
    const tire = await Tire.create({ id: randomUUID(), coachId, ...description }, { transaction });
    await fitAt(tire.id, { coachId, position, wheelLimitKpa }, now, transaction);
    await refuseBelowTarget(input, transaction);
  });
}

/**
 * Lets the tires at two positions change places, each with its wheel and so with that wheel's
 * limit. Where they were before stays on record.
 * @throws Refusal as `correctTire`; `same-position` when both are one.
 */
export async function swapTires(
  actor: Actor,
  input: TireChange & { position: WheelPosition; with: WheelPosition },
): Promise<void> {
  if (input.position === input.with) {
    throw new Refusal('bad-input', 'same-position', 'Choose another place to move it to.', [
      { field: 'with', value: input.with, expected: 'Choose another place than its own.' },
    ]);
  }
  await changeCoach(actor, 'records:edit', input.coachId, async (transaction) => {
    const { coachId } = input;
    const one = await fittingAt(coachId, input.position, transaction);
    const other = await fittingAt(coachId, input.with, transaction);
    const now = new Date();
    await one.update({ fittedUntil: now }, { transaction });
    await other.update({ fittedUntil: now }, { transaction });
    const { wheelLimitKpa } = other;
    await fitAt(one.tireId, { ...one.get(), position: other.position }, now, transaction);
    await fitAt(other.tireId, { coachId, position: one.position, wheelLimitKpa }, now, transaction);
    await refuseBelowTarget({ ...input, field: 'with' }, transaction);
  });
}

async function fittingAt(coachId: string, position: WheelPosition, transaction: Transaction) {
  const fitting = await Fitting.findOne({
    where: { coachId, position, fittedUntil: null },
    transaction,
  });
  if (!fitting) throw notFound('tire');
  return fitting;
}

async function fitAt(
  tireId: string,
  where: { coachId: string; position: WheelPosition; wheelLimitKpa: number },
  fittedFrom: Date,
  transaction: Transaction,
): Promise<void> {
  const { coachId, position, wheelLimitKpa } = where;
  await Fitting.create(
    { id: randomUUID(), tireId, coachId, position, wheelLimitKpa, fittedFrom },
    { transaction },
  );
}

/** Undoes the change when it leaves an axle with a target that one of its tires may not hold. */
async function refuseBelowTarget(
  { coachId, unit, field }: TireChange & { field?: string },
  transaction: Transaction,
): Promise<void> {
  const tires = await loadFittedTires(coachId, transaction);
  for (const { axle, axleId, targetKpa } of await loadAxleTargets(coachId, transaction)) {
    const onAxle = tires.filter((tire) => axleOf(tire.position) === axle);
    const low = onAxle.find((tire) => isAboveLimit(targetKpa, [tire], unit));
    if (low) throw belowTarget(low, targetKpa, unit, field);
    const kept = withinLimit(targetKpa, onAxle);
    if (kept < targetKpa) await addTarget(axleId, kept, transaction);
  }
}

/** A limit that was typed anew may read the same as the target and lie a hair below it. */
async function addTarget(axleId: string, targetKpa: number, transaction: Transaction) {
  await AxleTarget.create(
    { id: randomUUID(), axleId, targetKpa, source: 'typed' },
    { transaction },
  );
}

function belowTarget(tire: FittedTire, targetKpa: number, unit: PressureUnit, field?: string) {
  const lowest = lowestOf([tire]);
  const limit = shownPressure(lowest.kpa, unit);
  const words = `${positionName(tire.position)} would be allowed ${limit}, below its target of ${shownPressure(targetKpa, unit)}. Lower the target first.`;
  const name = field ?? (lowest.of === 'tire' ? 'sidewallLimit' : 'wheelLimit');
  return new Refusal('bad-input', 'target-above-limit', words, [
    { field: name, value: limit, expected: words },
  ]);
}
