/**
 * One coach with chosen parameters, run by the engine's own step function: for practice, classes,
 * the demo and tests. Gauge kPa and seconds throughout.
 */
import { createDraws, normal, uniform } from './arithmetic';
import {
  createMembers,
  FIELDS,
  FITTING,
  hoseGaugeAbs,
  PATH,
  SPEED,
  seriesC,
  sourceAbs,
  step,
} from './coach';
import type { EngineSpeed, LowerBy } from './contract';
import { KPA_PER_PSI, setSupply } from './priors';

export interface PracticeOptions {
  seed: number;
  tire: { startKpa: number; volumeL: number; limitKpa?: number };
  governor?: { cutInKpa: number; cutOutKpa: number };
  supplyKpa?: number;
  fitting?: 'supply' | 'service' | 'accessory';
  engine?: EngineSpeed;
  loaded?: boolean;
  atmosphereKpa?: number;
  /** What the wheel gauge and the dash gauge add, and how finely they are marked (0: not rounded). */
  wheelGauge?: { biasKpa?: number; stepKpa?: number };
  dashGauge?: { biasKpa?: number; stepKpa?: number };
  /** Governor points wander by about this much from cycle to cycle, kPa. */
  governorJitterKpa?: number;
  /** Any of the coach's lasting parameters, under the names of the model. */
  supplyL?: number;
  serviceL?: number;
  accessoryL?: number;
  idleFlow?: number;
  fastFlow?: number;
  leakPsiPerMinute?: number;
  hoseC?: number;
  chuckC?: number;
  pedalPsiPerSecond?: number;
  drainC?: number;
  pedalDropsIdle?: boolean;
  heating?: number;
  coolingS?: number;
}

export interface PracticeNotice {
  type: 'cut-out' | 'cut-in' | 'low-air-on' | 'low-air-off';
  at: number;
}

/** Everything a coach needs to go on later, as plain JSON. */
export interface PracticeSnapshot {
  options: PracticeOptions;
  at: number;
  members: number[];
  pedal: boolean;
  drain: boolean;
  bleeding: boolean;
  lowAir: boolean;
  draws: number;
}

export interface PracticeCoach {
  readonly at: number;
  /** Runs on by that many seconds (0 to 24 h); what a person would hear or see comes back. */
  advance(seconds: number): PracticeNotice[];
  setEngine(speed: EngineSpeed): void;
  engine(): EngineSpeed;
  setChuck(on: boolean): void;
  setLowering(by: LowerBy, on: boolean): void;
  setBleeding(on: boolean): void;
  /** What a gauge on the hose shows; with air moving it reads between supply and tire. */
  wheelGaugeKpa(): number;
  dashGaugeKpa(): number;
  /** The tire's pressure with the path closed, as it is now (warm from filling). */
  tireKpa(): number;
  /** The same when its warmth has gone. */
  settledKpa(): number;
  /** True pressure of the tank that the fitting sits on. */
  supplyKpa(): number;
  loaded(): boolean;
  chuckOn(): boolean;
  snapshot(): PracticeSnapshot;
}

const STEP_S = 0.1;
/** 49 CFR 571.121 S5.1.5: the warning stands below 60 psi. */
const LOW_AIR_KPA = 60 * KPA_PER_PSI;

function round(kpa: number, stepKpa: number): number {
  return stepKpa > 0 ? Math.round(kpa / stepKpa) * stepKpa : kpa;
}

function buildMembers(options: PracticeOptions) {
  const m = createMembers(1);
  const draws = createDraws(options.seed);
  const like = (value: number | undefined, usual: number, spread: number) =>
    value ?? usual * (1 + spread * (2 * uniform(draws) - 1));
  const atmosphere = options.atmosphereKpa ?? 101.325;
  const governor = options.governor ?? { cutInKpa: 95 * KPA_PER_PSI, cutOutKpa: 120 * KPA_PER_PSI };
  m.fitting[0] = FITTING[options.fitting ?? 'service'];
  m.supplyL[0] = like(options.supplyL, 24, 0.2);
  m.serviceL[0] = like(options.serviceL, 80, 0.25);
  m.accessoryL[0] = like(options.accessoryL, 12, 0.2);
  m.protectionKpa[0] = 70 * KPA_PER_PSI;
  m.idleFlow[0] = like(options.idleFlow, 2.4, 0.2);
  m.fastFlow[0] = options.fastFlow ?? 2 * m.idleFlow[0]!;
  m.leak[0] = (options.leakPsiPerMinute ?? 0.8) / 60 / 105;
  m.cutInKpa[0] = governor.cutInKpa;
  m.cutOutKpa[0] = governor.cutOutKpa;
  m.pedalKpaS[0] = (options.pedalPsiPerSecond ?? 1.1) * KPA_PER_PSI;
  m.drainC[0] = options.drainC ?? 1.2;
  m.hoseC[0] = like(options.hoseC, 1.3, 0.2);
  m.chuckC[0] = like(options.chuckC, 0.26, 0.25);
  m.gaugeShare[0] = 0.7;
  m.wheelBias[0] = options.wheelGauge?.biasKpa ?? 0;
  m.dashBias[0] = options.dashGauge?.biasKpa ?? 0;
  m.pedalDropsIdle[0] = options.pedalDropsIdle === false ? 0 : 1;
  m.pathC[0] = seriesC(m.hoseC[0]!, m.chuckC[0]!);
  m.tireL[0] = options.tire.volumeL;
  m.heating[0] = options.heating ?? 0.08;
  m.coolingS[0] = options.coolingS ?? 60;
  m.bleedC[0] = 0.15;
  m.tireAbs[0] = options.tire.startKpa + atmosphere;
  m.speed[0] = SPEED[options.engine ?? 'idle'];
  const supply =
    options.supplyKpa ??
    like(undefined, 0.5, 0.8) * (governor.cutOutKpa - governor.cutInKpa) + governor.cutInKpa;
  setSupply(m, 0, supply + atmosphere);
  m.loaded[0] = (options.loaded ?? supply < governor.cutInKpa) ? 1 : 0;
  m.sinceSwitch[0] = 60;
  return { m, draws, atmosphere, governor };
}

/** Starts a coach; with a snapshot it goes on where that one stood. */
export function createPracticeCoach(
  options: PracticeOptions,
  from?: PracticeSnapshot,
): PracticeCoach {
  const { m, draws, atmosphere, governor } = buildMembers(options);
  const controls = { pedal: false, drain: false, bleeding: false, atmosphereKpa: atmosphere };
  let at = 0;
  let lowAir = m.serviceAbs[0]! - atmosphere < LOW_AIR_KPA;
  if (from) {
    m.all.set(from.members);
    Object.assign(controls, { pedal: from.pedal, drain: from.drain, bleeding: from.bleeding });
    at = from.at;
    lowAir = from.lowAir;
    draws.state = from.draws;
  }

  function wander(): void {
    const jitter = options.governorJitterKpa ?? 0;
    m.cutInKpa[0] = governor.cutInKpa + jitter * normal(draws);
    m.cutOutKpa[0] = governor.cutOutKpa + jitter * normal(draws);
  }

  function stepOnce(h: number, notices: PracticeNotice[]): void {
    const was = m.loaded[0];
    step(m, 0, 1, h, controls);
    at += h;
    if (m.loaded[0] !== was) {
      if (m.speed[0] !== SPEED.off) notices.push({ type: was === 1 ? 'cut-out' : 'cut-in', at });
      wander();
    }
    const low = m.serviceAbs[0]! - atmosphere < LOW_AIR_KPA;
    if (low !== lowAir) notices.push({ type: low ? 'low-air-on' : 'low-air-off', at });
    lowAir = low;
  }

  return {
    get at() {
      return at;
    },
    advance(seconds) {
      if (!(seconds >= 0 && seconds <= 86400)) {
        throw new RangeError(`seconds is ${seconds}; expected 0 to 86400 s`);
      }
      const notices: PracticeNotice[] = [];
      const goal = at + seconds;
      while (goal - at > 1e-9) stepOnce(Math.min(STEP_S, goal - at), notices);
      return notices;
    },
    setEngine(speed) {
      m.speed[0] = SPEED[speed];
    },
    engine() {
      return m.speed[0] === SPEED.off ? 'off' : m.speed[0] === SPEED.idle ? 'idle' : 'fast-idle';
    },
    setChuck(on) {
      m.path[0] = on ? PATH.seated : PATH.off;
    },
    setLowering(by, on) {
      controls[by] = on;
      const drops = by === 'pedal' && on && m.pedalDropsIdle[0] === 1;
      if (drops && m.speed[0] === SPEED['fast-idle']) m.speed[0] = SPEED.idle;
    },
    setBleeding(on) {
      controls.bleeding = on;
    },
    wheelGaugeKpa() {
      const shown = hoseGaugeAbs(m, 0) - atmosphere + m.wheelBias[0]!;
      return round(shown, options.wheelGauge?.stepKpa ?? 0);
    },
    dashGaugeKpa() {
      const shown = m.serviceAbs[0]! - atmosphere + m.dashBias[0]!;
      return round(shown, options.dashGauge?.stepKpa ?? 0);
    },
    tireKpa: () => m.tireAbs[0]! + m.warmth[0]! - atmosphere,
    settledKpa: () => m.tireAbs[0]! - atmosphere,
    supplyKpa: () => sourceAbs(m, 0) - atmosphere,
    loaded: () => m.loaded[0] === 1,
    chuckOn: () => m.path[0] !== PATH.off,
    snapshot: () => ({
      options,
      at,
      members: Array.from(m.all),
      pedal: controls.pedal,
      drain: controls.drain,
      bleeding: controls.bleeding,
      lowAir,
      draws: draws.state,
    }),
  };
}

/** Goes on where a snapshot stood. */
export function restorePracticeCoach(from: PracticeSnapshot): PracticeCoach {
  if (from.members.length !== FIELDS.length) {
    throw new RangeError(`snapshot has ${from.members.length} fields; expected ${FIELDS.length}`);
  }
  return createPracticeCoach(from.options, from);
}
