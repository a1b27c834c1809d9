/**
 * Keeping the ensemble alive: resampling, jitter, and fresh members from the broad prior. An
 * ensemble dies of certainty: a belief that a few survivors share is never given up again.
 */
import { type Draws, exp, normal, uniform } from './arithmetic';
import { copyMember, createMembers, type LastingField, type Members } from './coach';
import type { Ensemble } from './ensemble';
import { drawLasting, drawWheel, KPA_PER_PSI, reconcileGovernor, WHEEL_BIAS_KPA } from './priors';

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
  const share = m.gaugeShare[i]! + 0.02 * normal(draws);
  m.gaugeShare[i] = Math.min(1, Math.max(0.1, share));
}

/** How much of a gauge's error a copy keeps. */
const BIAS_KEPT = 0.93;
const BIAS_DRAWN = Math.sqrt(1 - BIAS_KEPT * BIAS_KEPT);

/**
 * No reading of a gauge tells its error: resampling alone would settle on one by chance. A move
 * along that direction, error against supply and governor, leaves readings and prior as they are.
 * A sensor has no such error, and ties the supply.
 */
function turnBias(m: Members, i: number, draws: Draws): void {
  const wheel = BIAS_KEPT * m.wheelBias[i]! + BIAS_DRAWN * WHEEL_BIAS_KPA * normal(draws);
  const change = m.wheelBias[i]! - wheel;
  m.wheelBias[i] = wheel;
  m.dashBias[i] = m.dashBias[i]! - change;
  m.supplyAbs[i] = m.supplyAbs[i]! + change;
  m.serviceAbs[i] = m.serviceAbs[i]! + change;
  m.accessoryAbs[i] = m.accessoryAbs[i]! + change;
  m.cutInKpa[i] = m.cutInKpa[i]! + change;
  m.cutOutKpa[i] = m.cutOutKpa[i]! + change;
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
    if (!e.sensorSeen) turnBias(e.members, i, e.draws);
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
const DOUBT_LOWERING = 4;

/** A forgotten "stop" tap: hands come off in about this time once there is nothing to lower for. */
const HANDS_OFF_S = 7;
const HANDS_OFF_UNASKED_S = 500;
const ENOUGH_LOWERED_KPA = 78 * KPA_PER_PSI;

/** While the log says that the supply is being lowered: members in which nobody does any more. */
export function restHands(e: Ensemble, seconds: number): void {
  if (!e.controls.pedal && !e.controls.drain) return;
  const m = e.members;
  for (let i = 0; i < m.n; i++) {
    const low = m.supplyAbs[i]! - e.controls.atmosphereKpa < ENOUGH_LOWERED_KPA;
    const asked = low || (m.loaded[i] === 1 && m.sinceSwitch[i]! > 4);
    const chance = seconds / (asked ? HANDS_OFF_S : HANDS_OFF_UNASKED_S);
    if (m.idleHands[i] === 0 && uniform(e.draws) < chance) m.idleHands[i] = 1;
  }
}

/** The slow wandering of what is held constant: leaks come and go, other users draw air. */
export function wander(e: Ensemble, seconds: number): void {
  const m = e.members;
  const lowering = e.controls.pedal || e.controls.drain ? DOUBT_LOWERING : 0;
  const root = Math.sqrt(seconds);
  for (let i = 0; i < m.n; i++) {
    const drift = m.drift[i]!;
    m.doubt[i] = m.doubt[i]! + (DOUBT_AT_REST + lowering + DOUBT_BY_RATE * drift * drift) * seconds;
    m.tireAbs[i] =
      m.tireAbs[i]! + (0.01 + 0.03 * Math.abs(m.flow[i]! / m.tireL[i]!)) * root * normal(e.draws);
  }
}

/** Governor points move a little from cycle to cycle. */
export const GOVERNOR_JITTER_KPA = 0.9 * KPA_PER_PSI;
