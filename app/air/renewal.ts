/**
 * Keeping the ensemble alive: resampling, jitter, and fresh members from the broad prior. An
 * ensemble dies of certainty: a belief that a few survivors share is never given up again.
 */
import { type Draws, exp, normal, uniform } from './arithmetic';
import { copyMember, createMembers, type LastingField, type Members } from './coach';
import type { Ensemble } from './ensemble';
import { drawLasting, drawWheel, KPA_PER_PSI, reconcileGovernor } from './priors';

/** Resample when fewer than this share of the members carries the weight. */
const LEAST_EFFECTIVE = 0.5;
/** At each resampling this share gets lasting parameters from the broad prior. */
const FRESH_SHARE = 0.03;

const SCALED: readonly LastingField[] = [
  'supplyL',
  'serviceL',
  'accessoryL',
  'idleFlow',
  'fastFlow',
  'leak',
  'pedalKpaS',
  'drainC',
  'hoseC',
];

export function normalise(weights: Float64Array): void {
  let sum = 0;
  for (let i = 0; i < weights.length; i++) sum += weights[i]!;
  if (!(sum > 0)) {
    weights.fill(1 / weights.length);
    return;
  }
  for (let i = 0; i < weights.length; i++) weights[i] = weights[i]! / sum;
}

function effectiveShare(weights: Float64Array): number {
  let squares = 0;
  for (let i = 0; i < weights.length; i++) squares += weights[i]! * weights[i]!;
  return 1 / (squares * weights.length);
}

/** Copies members by weight, at even distances from one offset (systematic resampling). */
export function pickByWeight(
  from: Members,
  weights: Float64Array,
  to: Members,
  offset: number,
): void {
  let i = 0;
  let sum = weights[0]!;
  for (let j = 0; j < to.n; j++) {
    const mark = (j + offset) / to.n;
    while (sum < mark && i < from.n - 1) sum += weights[++i]!;
    copyMember(from, i, to, j);
  }
}

/** Jitter of lasting parameters, so that copies do not stay copies. */
export function jitterMember(m: Members, i: number, draws: Draws, widths: Widths): void {
  SCALED.forEach((field, k) => {
    m[field][i] = m[field][i]! * exp(widths.scaled[k]! * normal(draws));
  });
  const core = exp(widths.core * normal(draws));
  m.chuckC[i] = m.chuckC[i]! * core;
  m.pathC[i] = m.pathC[i]! * core;
  m.cutInKpa[i] = m.cutInKpa[i]! + widths.cutIn * normal(draws);
  m.cutOutKpa[i] = m.cutOutKpa[i]! + widths.cutOut * normal(draws);
  m.wheelBias[i] = m.wheelBias[i]! + 0.6 * normal(draws);
  m.dashBias[i] = m.dashBias[i]! + 1.2 * normal(draws);
  const share = m.gaugeShare[i]! + 0.02 * normal(draws);
  m.gaugeShare[i] = Math.min(1, Math.max(0.1, share));
}

/** How far copies are moved apart: relative for what is scaled, kPa for the governor's points. */
export interface Widths {
  scaled: number[];
  core: number;
  cutIn: number;
  cutOut: number;
}

/** The least width, for an ensemble that has become certain. */
export const LEAST_WIDTHS: Widths = {
  scaled: SCALED.map(() => 0.03),
  core: 0.025,
  cutIn: 1.5,
  cutOut: 1.5,
};

/** Share of the ensemble's own spread that copies are moved by. */
const KERNEL = 0.15;

function deviation(column: Float64Array, relative: boolean): number {
  let sum = 0;
  for (let i = 0; i < column.length; i++) sum += column[i]!;
  const mean = sum / column.length;
  let squares = 0;
  for (let i = 0; i < column.length; i++) {
    squares += (column[i]! - mean) * (column[i]! - mean);
  }
  const width = Math.sqrt(squares / column.length);
  return relative ? width / Math.max(1e-9, Math.abs(mean)) : width;
}

function widthsOf(m: Members): Widths {
  return {
    scaled: SCALED.map((field, k) =>
      Math.max(LEAST_WIDTHS.scaled[k]!, KERNEL * Math.min(0.6, deviation(m[field], true))),
    ),
    core: Math.max(LEAST_WIDTHS.core, KERNEL * Math.min(0.6, deviation(m.pathC, true))),
    cutIn: Math.max(LEAST_WIDTHS.cutIn, KERNEL * deviation(m.cutInKpa, false)),
    cutOut: Math.max(LEAST_WIDTHS.cutOut, KERNEL * deviation(m.cutOutKpa, false)),
  };
}

const spare = new Map<number, Members>();

export function resampleIfThin(e: Ensemble): void {
  if (effectiveShare(e.weights) >= LEAST_EFFECTIVE) return;
  let copy = spare.get(e.members.n);
  if (!copy) {
    copy = createMembers(e.members.n);
    spare.set(e.members.n, copy);
  }
  copy.all.set(e.members.all);
  pickByWeight(copy, e.weights, e.members, uniform(e.draws));
  e.weights.fill(1 / e.members.n);
  const widths = widthsOf(e.members);
  for (let i = 0; i < e.members.n; i++) {
    jitterMember(e.members, i, e.draws, widths);
    if (uniform(e.draws) < FRESH_SHARE) refreshLasting(e, i);
  }
}

/** New lasting parameters from the broad prior; the member keeps its pressures and its tire. */
export function refreshLasting(e: Ensemble, i: number): void {
  const m = e.members;
  const path = m.path[i]!;
  const tire = m.tireAbs[i]!;
  const warmth = m.warmth[i]!;
  const source = e.sourceOf(i);
  const lag = e.lagOfService(i);
  drawLasting(m, i, e.draws);
  drawWheel(m, i, e.draws, e.tireL, e.slowValve);
  m.path[i] = path;
  m.tireAbs[i] = tire;
  m.warmth[i] = warmth;
  e.placeSupply(i, source, lag);
  reconcileGovernor(m, i, e.draws, e.controls.atmosphereKpa);
}

/** What the model leaves out: others draw air, pushes differ. kPa² a second at rest, and by rate. */
const DOUBT_AT_REST = 0.15;
const DOUBT_BY_RATE = 0.025;

/** The slow wandering of what is held constant: leaks come and go, other users draw air. */
export function wander(e: Ensemble, seconds: number): void {
  const m = e.members;
  const root = Math.sqrt(seconds);
  for (let i = 0; i < m.n; i++) {
    const drift = m.drift[i]!;
    m.doubt[i] = m.doubt[i]! + (DOUBT_AT_REST + DOUBT_BY_RATE * drift * drift) * seconds;
    m.tireAbs[i] =
      m.tireAbs[i]! + (0.01 + 0.03 * Math.abs(m.flow[i]! / m.tireL[i]!)) * root * normal(e.draws);
  }
}

/** Governor points move a little from cycle to cycle. */
export const GOVERNOR_JITTER_KPA = 0.9 * KPA_PER_PSI;
