/**
 * How well each member explains what was tapped. Every kind of observation has its own likelihood:
 * source, bias, graduation, lateness of hands, and a small chance that it is plain wrong.
 */
import { exp, normal, uniform } from './arithmetic';
import { fillTire, hoseGaugeAbs, PATH, SPEED, shiftFlow } from './coach';
import type { FillEvent, FillSetup } from './contract';
import type { Ensemble } from './ensemble';
import { KPA_PER_PSI, reconcileGovernor } from './priors';
import { GOVERNOR_JITTER_KPA, normalise, refreshLasting, resampleIfThin } from './renewal';

type Reading = Extract<FillEvent, { type: 'supply-reading' }>;
type TireReading = Extract<FillEvent, { type: 'tire-reading' }>;

/** A reading is plain wrong (mistyped, wrong needle) this often. */
const WRONG_SHARE = 0.02;
/** People read first and tap a moment later, s. */
const READ_LAG_S = 0.7;
const READ_LAG_SPREAD_S = 0.8;
/** Under this mean likelihood (a perfect match is 1) the reading, or the model, must be wrong. */
const SURPRISE = 0.012;
/** False purges a second; far more while somebody is on the pedal. */
const FALSE_PURGE_S = 1 / 500;
const FALSE_PURGE_PEDAL_S = 1 / 60;

const scratch = new Float64Array(4096);

function sourceNoise(reading: Reading, rig: FillSetup['rig']): number {
  if (reading.source === 'sensor') return Math.max(0.7, (reading.stepKpa ?? 1) * 0.29);
  const dash = reading.source === 'dash-gauge';
  const step = reading.stepKpa ?? (dash ? 5 * KPA_PER_PSI : (rig?.stepKpa ?? KPA_PER_PSI));
  const eye = dash ? 4 : 2;
  return Math.sqrt(step * step * 0.083 + eye * eye);
}

/** What the named gauge shows on member i, gauge kPa. */
export function predictedReading(e: Ensemble, i: number, source: Reading['source']): number {
  const m = e.members;
  const atmosphere = e.controls.atmosphereKpa;
  if (source === 'dash-gauge') return m.serviceAbs[i]! - atmosphere + m.dashBias[i]!;
  if (source === 'sensor') return e.sourceOf(i) - atmosphere;
  return hoseGaugeAbs(m, i) - atmosphere + m.wheelBias[i]!;
}

/** One bell, one where it is right on; squared distance in units of its spread. */
function bell(distance: number, spread: number): number {
  const z = distance / spread;
  return exp(-0.5 * z * z);
}

export function takeSupplyReading(e: Ensemble, reading: Reading, rig: FillSetup['rig']): void {
  const m = e.members;
  const noise = sourceNoise(reading, rig);
  if (!e.supplySeen) placeAll(e, reading, noise);
  e.supplySeen = true;
  if (reading.source === 'sensor') e.sensorSeen = true;
  let mean = 0;
  for (let i = 0; i < m.n; i++) {
    const distance = distanceTo(e, i, reading);
    const lateness = m.drift[i]! * READ_LAG_SPREAD_S;
    const drop = flowError(e, i, reading);
    const spread = Math.sqrt(noise * noise + lateness * lateness + drop * drop + m.doubt[i]!);
    let match = (bell(distance, spread) * noise) / spread;
    if (readsTire(e, i, reading, rig)) {
      const tire = m.tireAbs[i]! + m.warmth[i]! - e.controls.atmosphereKpa;
      match = Math.max(match, 0.5 * bell(reading.kpa - tire, noise));
    }
    scratch[i] = match;
    mean += e.weights[i]! * match;
  }
  if (mean < SURPRISE) {
    acceptOrDoubt(e, reading, noise);
    return;
  }
  correct(e, reading, noise);
  weigh(e, WRONG_SHARE * noise * 0.01);
}

/** With air moving, the gauge's place in the hose is known only roughly, kPa. */
function flowError(e: Ensemble, i: number, reading: Reading): number {
  const m = e.members;
  if (reading.source !== 'wheel-gauge' || m.path[i] === PATH.off) return 0;
  return 2 + 0.15 * Math.abs(e.sourceOf(i) - hoseGaugeAbs(m, i));
}

function distanceTo(e: Ensemble, i: number, reading: Reading): number {
  const late = e.members.drift[i]! * READ_LAG_S;
  return reading.kpa - predictedReading(e, i, reading.source) + late;
}

/** What the model leaves out is drawn anew from what the reading says about it. */
function correct(e: Ensemble, reading: Reading, noise: number): void {
  const m = e.members;
  for (let i = 0; i < m.n; i++) {
    const doubt = m.doubt[i]!;
    if (scratch[i]! < 1e-4 || doubt <= 0) continue;
    const lateness = m.drift[i]! * READ_LAG_SPREAD_S;
    const given = noise * noise + lateness * lateness;
    const gain = doubt / (doubt + given);
    const left = Math.sqrt(gain * given);
    e.shiftSupply(i, gain * distanceTo(e, i, reading) + left * normal(e.draws));
    m.doubt[i] = 0;
  }
}

/** A gauge below a closed valve, on a connected chuck, reads the tire. */
function readsTire(e: Ensemble, i: number, reading: Reading, rig: FillSetup['rig']): boolean {
  return (
    reading.source === 'wheel-gauge' &&
    rig?.gauge === 'below-valve' &&
    e.members.path[i] === PATH.off
  );
}

function weigh(e: Ensemble, floor: number): void {
  for (let i = 0; i < e.weights.length; i++) e.weights[i] = e.weights[i]! * (scratch[i]! + floor);
  normalise(e.weights);
  resampleIfThin(e);
}

/** The first reading says where the supply is, whatever was guessed before. */
function placeAll(e: Ensemble, reading: Reading, noise: number): void {
  for (let i = 0; i < e.members.n; i++) {
    const shown = reading.kpa + noise * normal(e.draws);
    e.shiftSupply(i, shown - predictedReading(e, i, reading.source));
    reconcileGovernor(e.members, i, e.draws, e.controls.atmosphereKpa);
  }
}

/** Chance that an unexpected reading means that the governor has switched unnoticed. */
const SWITCHED_UNSEEN = 0.85;

/** Share of members that take an unexpected reading for wrong and stay as they are. */
const TAKEN_FOR_WRONG = 0.25;

/** Nobody expected this: most members believe it and think anew, the others take it for wrong. */
function acceptOrDoubt(e: Ensemble, reading: Reading, noise: number): void {
  const m = e.members;
  for (let i = 0; i < m.n; i++) {
    if (scratch[i]! > 0.1 || uniform(e.draws) < TAKEN_FOR_WRONG) continue;
    const higher = distanceTo(e, i, reading) > 0;
    const before = m.supplyAbs[i]! - e.controls.atmosphereKpa;
    if (uniform(e.draws) < 0.5) refreshLasting(e, i);
    if (uniform(e.draws) < SWITCHED_UNSEEN) switchUnseen(e, i, higher, before);
    const shown = reading.kpa + noise * normal(e.draws);
    e.shiftSupply(i, shown - predictedReading(e, i, reading.source));
    m.doubt[i] = 0;
    reconcileGovernor(m, i, e.draws, e.controls.atmosphereKpa);
  }
}

/** It stands higher, so it loaded near where it was last believed; or lower, so it does not pump. */
function switchUnseen(e: Ensemble, i: number, higher: boolean, before: number): void {
  const m = e.members;
  if (higher === (m.loaded[i] === 1)) return;
  m.loaded[i] = higher ? 1 : 0;
  m.sinceSwitch[i] = 20;
  if (higher) m.cutInKpa[i] = before + GOVERNOR_JITTER_KPA * normal(e.draws);
}

export function takeTireReading(e: Ensemble, reading: TireReading, rig: FillSetup['rig']): void {
  const m = e.members;
  const step = reading.stepKpa ?? rig?.stepKpa ?? KPA_PER_PSI;
  const noise = Math.sqrt(step * step * 0.083 + 1.2 * 1.2);
  let mean = 0;
  for (let i = 0; i < m.n; i++) {
    const tire = m.tireAbs[i]! + m.warmth[i]! - e.controls.atmosphereKpa;
    scratch[i] = bell(reading.kpa - tire, noise);
    mean += e.weights[i]! * scratch[i]!;
  }
  if (mean >= SURPRISE * 0.5) {
    weigh(e, WRONG_SHARE * noise * 0.01);
    return;
  }
  for (let i = 0; i < m.n; i++) {
    if (uniform(e.draws) < 0.5) continue;
    const tire = reading.kpa + noise * normal(e.draws) - m.warmth[i]!;
    m.tireAbs[i] = Math.max(0, tire) + e.controls.atmosphereKpa;
  }
}

/** A purge was heard: some members have just cut out, some were about to, some heard another hiss. */
export function takeCutOut(e: Ensemble): void {
  const m = e.members;
  const falseRate = e.controls.pedal ? FALSE_PURGE_PEDAL_S : FALSE_PURGE_S;
  for (let i = 0; i < m.n; i++) {
    if (m.speed[i] === SPEED.off) {
      scratch[i] = falseRate;
      continue;
    }
    const hears = 1 - m.missesPurge[i]!;
    let hit = 0;
    if (m.loaded[i] === 0) hit = m.sinceSwitch[i]! < 12 ? lagDensity(m.sinceSwitch[i]!) : 0;
    else hit = nearCutOut(e, i);
    hit *= hears;
    scratch[i] = hit + falseRate;
    if (m.loaded[i] === 1 && uniform(e.draws) * scratch[i]! < hit) cutOutNow(e, i);
  }
  e.heardAt = e.time;
  weigh(e, 0);
}

/** Density of the delay between purge and tap, 1/s. */
function lagDensity(seconds: number): number {
  return 0.26 * bell(seconds - 1.3, 1.5);
}

/** Density in time of cutting out just now for a loaded member, 1/s. */
function nearCutOut(e: Ensemble, i: number): number {
  const m = e.members;
  const gauge = m.supplyAbs[i]! - e.controls.atmosphereKpa;
  const rate = Math.max(0.15, m.drift[i]!);
  const spread = 2.5 * GOVERNOR_JITTER_KPA;
  return (0.4 / spread) * bell(m.cutOutKpa[i]! - gauge, spread) * rate;
}

function cutOutNow(e: Ensemble, i: number): void {
  const m = e.members;
  const gauge = m.supplyAbs[i]! - e.controls.atmosphereKpa - READ_LAG_S * Math.max(0, m.drift[i]!);
  m.loaded[i] = 0;
  m.sinceSwitch[i] = 1.3;
  m.cutOutKpa[i] = gauge + 0.3 * GOVERNOR_JITTER_KPA * normal(e.draws);
  reconcileGovernor(m, i, e.draws, e.controls.atmosphereKpa);
}

/** The compressor was seen or heard to load. */
export function takeCutIn(e: Ensemble): void {
  const m = e.members;
  const spread = 3 * GOVERNOR_JITTER_KPA;
  for (let i = 0; i < m.n; i++) {
    const gauge = m.supplyAbs[i]! - e.controls.atmosphereKpa;
    const near = bell(Math.max(0, gauge - m.cutInKpa[i]!), spread);
    scratch[i] = m.loaded[i] === 1 ? (m.sinceSwitch[i]! < 20 ? 1 : 0.15) : near;
    if (m.loaded[i] === 1 || uniform(e.draws) > near + 0.02) continue;
    m.loaded[i] = 1;
    m.sinceSwitch[i] = 1;
    m.cutInKpa[i] = gauge + 0.3 * GOVERNOR_JITTER_KPA * normal(e.draws);
    reconcileGovernor(m, i, e.draws, e.controls.atmosphereKpa);
  }
  weigh(e, 0.02);
}

/** Silence: members that cut out eight seconds ago, and nobody tapped a purge. */
export function takeSilence(e: Ensemble, window: number): void {
  if (e.time - e.heardAt < 14) return;
  const m = e.members;
  let changed = false;
  for (let i = 0; i < m.n; i++) {
    const since = m.sinceSwitch[i]!;
    scratch[i] = 1;
    if (m.loaded[i] === 1 || m.speed[i] === SPEED.off || since < 8 || since >= 8 + window) continue;
    scratch[i] = m.missesPurge[i]!;
    changed = true;
  }
  if (changed) weigh(e, 0);
}

export function takeLowAir(e: Ensemble, on: boolean): void {
  const m = e.members;
  for (let i = 0; i < m.n; i++) {
    const gauge = (m.serviceAbs[i]! - e.controls.atmosphereKpa) / KPA_PER_PSI;
    scratch[i] = on ? bell(Math.max(0, gauge - 68), 5) : bell(Math.max(0, 58 - gauge), 5);
  }
  weigh(e, 0.02);
}

/** Chuck on: seated as a rule; sometimes it leaks, or does not open the core, or the valve is shut. */
export function takeChuckOn(e: Ensemble): void {
  const m = e.members;
  for (let i = 0; i < m.n; i++) {
    if (m.path[i] !== PATH.off) continue;
    const kind = uniform(e.draws);
    m.path[i] = kind < 0.92 ? PATH.seated : kind < 0.95 ? PATH.leaking : PATH.shut;
    const late = 0.5 + 0.7 * normal(e.draws);
    if (late > 0) fillTire(m, i, late, e.controls.atmosphereKpa);
  }
}

/** Chuck off; hands and tap differ by a moment. */
export function takeChuckOff(e: Ensemble): void {
  const m = e.members;
  for (let i = 0; i < m.n; i++) {
    if (m.path[i] === PATH.off) continue;
    shiftFlow(m, i, -0.5 + 0.7 * normal(e.draws));
    m.path[i] = PATH.off;
    m.flow[i] = 0;
  }
}

/** Pressing the pedal makes many engines fall from fast idle to idle. */
export function takeLowering(e: Ensemble, by: 'pedal' | 'drain', on: boolean): void {
  const m = e.members;
  e.controls[by] = on;
  e.members.idleHands.fill(0);
  if (by !== 'pedal' || !on) return;
  for (let i = 0; i < m.n; i++) {
    if (m.pedalDropsIdle[i] === 1 && m.speed[i] === SPEED['fast-idle']) m.speed[i] = SPEED.idle;
  }
}
