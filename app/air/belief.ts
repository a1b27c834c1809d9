/** What the ensemble believes at one moment, in the figures that the calls are decided by. */
import { standardDraw } from './arithmetic';
import { createMembers, type Members, SPEED, sourceAbs } from './coach';
import type { Spread } from './contract';
import type { Ensemble } from './ensemble';
import type { Facts } from './facts';
import { pickByWeight } from './renewal';
import { evenSpread } from './spread';

export interface Belief {
  supply: Spread;
  tire: Spread;
  loaded: number;
  flowsIn: number;
  fastIdle: number;
  cutIn: Spread;
  cutOut: Spread;
  /** kPa a second into the tire. */
  gain: Spread;
  supplyDrift: Spread;
}

/** Quantiles are taken over this many members, picked evenly by weight. */
const PICKED = 160;
const picked = createMembers(PICKED);
const column = new Float64Array(PICKED);

function spreadBy(value: (i: number) => number): Spread {
  for (let i = 0; i < PICKED; i++) column[i] = value(i);
  return evenSpread(column);
}

/** The supply of a member with its doubt drawn: the same standard draw for the same place. */
export function supplyDrawn(m: Members, i: number): number {
  return sourceAbs(m, i) + Math.sqrt(m.doubt[i]!) * standardDraw(i);
}

export function chance(e: Ensemble, holds: (i: number) => boolean): number {
  let sum = 0;
  for (let i = 0; i < e.members.n; i++) if (holds(i)) sum += e.weights[i]!;
  return Math.min(1, Math.round(sum * 1e6) / 1e6);
}

export function believe(e: Ensemble): Belief {
  const all = e.members;
  pickByWeight(all, e.weights, picked, 0.5);
  const m = picked;
  const atmosphere = e.controls.atmosphereKpa;
  return {
    supply: spreadBy((i) => supplyDrawn(m, i) - atmosphere),
    tire: spreadBy((i) => m.tireAbs[i]! - atmosphere),
    loaded: chance(e, (i) => all.loaded[i] === 1 && all.speed[i] !== SPEED.off),
    flowsIn: chance(e, (i) => supplyDrawn(all, i) > all.tireAbs[i]! + all.warmth[i]!),
    fastIdle: chance(e, (i) => all.speed[i] === SPEED['fast-idle']),
    cutIn: spreadBy((i) => m.cutInKpa[i]!),
    cutOut: spreadBy((i) => m.cutOutKpa[i]!),
    gain: spreadBy((i) => m.flow[i]! / m.tireL[i]!),
    supplyDrift: spreadBy((i) => m.drift[i]!),
  };
}

/** Lowering by the log, unless the ensemble believes that a stop was not tapped. */
export function isLowering(e: Ensemble, facts: Facts): boolean {
  return facts.lowering !== undefined && chance(e, (i) => e.members.idleHands[i] === 1) <= 0.75;
}
