/** What the ensemble believes at one moment, in the figures that the calls are decided by. */
import { standardDraw } from './arithmetic';
import { type Members, SPEED, sourceAbs } from './coach';
import type { Spread } from './contract';
import type { Ensemble } from './ensemble';
import { spreadOf } from './spread';

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

const column = new Float64Array(4096);

function spreadBy(e: Ensemble, value: (i: number) => number): Spread {
  const n = e.members.n;
  for (let i = 0; i < n; i++) column[i] = value(i);
  return spreadOf(column, e.weights, n);
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
  const m = e.members;
  const atmosphere = e.controls.atmosphereKpa;
  return {
    supply: spreadBy(e, (i) => supplyDrawn(m, i) - atmosphere),
    tire: spreadBy(e, (i) => m.tireAbs[i]! - atmosphere),
    loaded: chance(e, (i) => m.loaded[i] === 1 && m.speed[i] !== SPEED.off),
    flowsIn: chance(e, (i) => supplyDrawn(m, i) > m.tireAbs[i]! + m.warmth[i]!),
    fastIdle: chance(e, (i) => m.speed[i] === SPEED['fast-idle']),
    cutIn: spreadBy(e, (i) => m.cutInKpa[i]!),
    cutOut: spreadBy(e, (i) => m.cutOutKpa[i]!),
    gain: spreadBy(e, (i) => m.flow[i]! / m.tireL[i]!),
    supplyDrift: spreadBy(e, (i) => m.drift[i]!),
  };
}
