import { randomUUID } from 'node:crypto';
import type { Transaction } from 'sequelize';
import type { Actor } from '~/access/can';
import { type Axle as AxleKind, type AxleLayout, axleOf, positionsOf } from '~/loads';
import { Axle } from '~/models/axle.server';
import { AxleTarget } from '~/models/axle-target.server';
import { Coach } from '~/models/coach.server';
import { sequelize } from '~/models/database.server';
import { Fitting } from '~/models/fitting.server';
import { Membership } from '~/models/membership.server';
import { Tire } from '~/models/tire.server';
import type { PressureUnit } from '~/units';
import { type Limits, refuseProblems, targetProblem, withinLimit } from './target-limit.server';

/** What every tire of an axle starts with. Pressures are gauge kPa, the volume litres. */
export interface NewAxle extends Limits {
  size: string;
  volumeL: number;
  volumeSource: 'estimated' | 'typed';
  targetKpa: number;
}

export interface NewCoach {
  name: string;
  layout: AxleLayout;
  /** How far from the target still counts as on it, kPa. */
  toleranceKpa: number;
  /** One entry for each axle of the layout. */
  axles: Partial<Record<AxleKind, NewAxle>>;
  /** The unit in which a refusal speaks. */
  unit: PressureUnit;
}

/**
 * Makes a coach with its axles, targets and tires, owned by the person who makes it.
 * @throws Refusal `target-above-limit`, naming `<axle>.target`, when a target is above the
 * sidewall or wheel limit of its axle. Nothing is written then.
 */
export async function createCoach(actor: Actor, input: NewCoach): Promise<{ coachId: string }> {
  refuseProblems(
    axleEntries(input).map(([kind, axle]) =>
      targetProblem(`${kind}.target`, axle.targetKpa, [axle], input.unit),
    ),
    'target-above-limit',
  );
  const coachId = randomUUID();
  await sequelize.transaction(async (transaction) => {
    const { name, layout, toleranceKpa } = input;
    await Coach.create({ id: coachId, name, layout, toleranceKpa }, { transaction });
    await Membership.create(
      { id: randomUUID(), userId: actor.userId, coachId, role: 'owner' },
      { transaction },
    );
    await createAxles(coachId, actor.userId, input, transaction);
    await fitTires(coachId, input, transaction);
  });
  return { coachId };
}

/** The axles of the layout, front first. */
function axleEntries({ layout, axles }: NewCoach): [AxleKind, NewAxle][] {
  const kinds = [...new Set(positionsOf(layout).map(axleOf))];
  return kinds.map((kind) => [kind, axleFor(axles, kind)]);
}

function axleFor(axles: NewCoach['axles'], kind: AxleKind): NewAxle {
  const axle = axles[kind];
  if (!axle) throw new RangeError(`axles: the layout has a ${kind} axle, but it was not given`);
  return axle;
}

async function createAxles(
  coachId: string,
  userId: string,
  input: NewCoach,
  transaction: Transaction,
): Promise<void> {
  for (const [kind, given] of axleEntries(input)) {
    const targetKpa = withinLimit(given.targetKpa, [given]);
    const axle = await Axle.create({ id: randomUUID(), coachId, kind }, { transaction });
    await AxleTarget.create(
      { id: randomUUID(), axleId: axle.id, targetKpa, source: 'typed', setBy: userId },
      { transaction },
    );
  }
}

async function fitTires(coachId: string, input: NewCoach, transaction: Transaction): Promise<void> {
  const fitted = positionsOf(input.layout).map((position) => ({
    position,
    tireId: randomUUID(),
    axle: axleFor(input.axles, axleOf(position)),
  }));
  await Tire.bulkCreate(
    fitted.map(({ tireId, axle: { size, sidewallLimitKpa, volumeL, volumeSource } }) => ({
      id: tireId,
      coachId,
      size,
      sidewallLimitKpa,
      volumeL,
      volumeSource,
    })),
    { transaction },
  );
  await Fitting.bulkCreate(
    fitted.map(({ tireId, position, axle: { wheelLimitKpa } }) => ({
      id: randomUUID(),
      coachId,
      tireId,
      position,
      wheelLimitKpa,
    })),
    { transaction },
  );
}
