import { inSeries, psi, toPsi } from './flow';
import { between, chance, type Dice, diceFor, logBetween, normal, pick } from './random';

export type Fitting = 'service' | 'supply' | 'accessory';
export type LowerBy = 'pedal' | 'drain';

/** Pressures are gauge kPa, volumes L, conductances dm³/(s·bar), times s. */
export interface WorldTire {
  startKpa: number;
  targetKpa: number;
  toleranceKpa: number;
  limitKpa: number;
  volumeL: number;
  /** Volume that the product is told: estimated from the size code, so a little wrong. */
  saidVolumeL: number;
  coreC: number;
  /** Share of adiabatic warming that shows in the pressure, and how fast it goes. */
  warmthGain: number;
  settleS: number;
  reachable: boolean;
}

export interface GaugeTraits {
  biasKpa: number;
  stepKpa: number;
  noiseKpa: number;
}

export interface Coach {
  id: number;
  hard: boolean;
  atmosphereKpa: number;
  supplyL: number;
  serviceL: number;
  accessoryL: number;
  fitting: Fitting;
  cutInKpa: number;
  cutOutKpa: number;
  governorJitterKpa: number;
  idleDelivery: number;
  fastDelivery: number;
  /** Share of delivery lost for every 700 kPa above 700 kPa (clearance volume). */
  deliveryFade: number;
  leakKpaPerS: number;
  checkCrackKpa: number;
  checkC: number;
  protectionKpa: number;
  accessoryC: number;
  /** Supply air that the drier uses to renew itself at cut-out. */
  purgeDropKpa: number;
  brakeKpa: number;
  brakeEveryS: number;
  drainC: number;
  losesFastIdle: boolean;
  lowerBy: LowerBy[];
  valve: boolean;
  /** Hose up to the gauge, hose from the gauge to the chuck. */
  hoseToGaugeC: number;
  hoseToChuckC: number;
  criticalRatio: number;
  tee: GaugeTraits;
  dash: GaugeTraits;
  tireGauge: GaugeTraits;
  walkS: number;
  tires: WorldTire[];
}

/** Half of the coaches are hard (design/engine.md). */
const HARD_EVERY = 2;
/** Share of hard coaches whose front tires ask for more than the governor gives. */
const UNREACHABLE_SHARE = 0.2;
const TOLERANCE_PSI = 1;
/** A reachable target lies this far below the lowest peak that jitter gives. */
const LEAST_HEADROOM_PSI = 2;

/** Draws one coach; the same number gives the same coach. */
export function drawCoach(id: number): Coach {
  const dice = diceFor(id, 1);
  const hard = id % HARD_EVERY === 1;
  const air = drawAir(dice, id, hard);
  return { ...air, ...drawRig(dice), tires: drawTires(dice, air, hard) };
}

type Air = Omit<Coach, keyof ReturnType<typeof drawRig> | 'tires'>;

function drawAir(dice: Dice, id: number, hard: boolean): Air {
  const cutIn = between(dice, 84, 106);
  const fast = between(dice, 3, 7.5);
  const idle = Math.max(1.5, fast * between(dice, 0.4, 0.65));
  return {
    id,
    hard,
    atmosphereKpa: between(dice, 82, 102),
    ...drawTanks(dice),
    cutInKpa: psi(cutIn),
    cutOutKpa: psi(cutIn + between(dice, 13, 30)),
    governorJitterKpa: psi(between(dice, 0.2, 0.8)),
    idleDelivery: idle,
    fastDelivery: fast,
    deliveryFade: between(dice, 0.1, 0.35),
    leakKpaPerS: psi(between(dice, 0.1, 2.5)) / 60,
    checkCrackKpa: between(dice, 0.5, 3),
    checkC: between(dice, 6, 14),
    purgeDropKpa: chance(dice, 0.4) ? psi(between(dice, 0.5, 3)) : 0,
    ...drawLowering(dice, hard),
  };
}

function drawTanks(dice: Dice) {
  return {
    supplyL: between(dice, 15, 35),
    serviceL: between(dice, 50, 140),
    accessoryL: between(dice, 5, 20),
    fitting: pick<Fitting>(dice, [
      ['service', 0.5],
      ['supply', 0.3],
      ['accessory', 0.2],
    ]),
    protectionKpa: psi(between(dice, 60, 85)),
    accessoryC: between(dice, 1.5, 4),
  };
}

function drawLowering(dice: Dice, hard: boolean) {
  return {
    brakeKpa: psi(between(dice, 0.7, 3.5)),
    brakeEveryS: between(dice, 1.5, 2.6),
    drainC: between(dice, 0.3, 1),
    losesFastIdle: chance(dice, 0.4),
    // A hard coach without any way to lower its supply would have no perfect player either.
    lowerBy: pick<LowerBy[]>(dice, [
      [['pedal'], 0.45],
      [['drain'], 0.2],
      [['pedal', 'drain'], 0.25],
      [[], hard ? 0 : 0.1],
    ]),
  };
}

function drawRig(dice: Dice) {
  const valve = chance(dice, 0.55);
  const hoseC = logBetween(dice, 0.6, 2.5);
  // With a valve the gauge sits a metre and a half up the hose, else at the chuck.
  const upstream = valve ? between(dice, 0.4, 0.7) : 0.95;
  return {
    valve,
    hoseToGaugeC: hoseC / Math.sqrt(upstream),
    hoseToChuckC: hoseC / Math.sqrt(1 - upstream),
    criticalRatio: between(dice, 0.2, 0.42),
    tee: drawGauge(
      dice,
      1.3,
      pick<number>(dice, [
        [1, 0.5],
        [2, 0.5],
      ]),
      0.25,
    ),
    dash: drawGauge(
      dice,
      2.5,
      pick<number>(dice, [
        [2, 0.3],
        [5, 0.7],
      ]),
      0.7,
    ),
    // The tire gauge is what the target is meant by, so that bias is counted against it.
    tireGauge: drawGauge(
      dice,
      0,
      pick<number>(dice, [
        [0.5, 0.85],
        [1, 0.15],
      ]),
      0.12,
    ),
    walkS: between(dice, 10, 22),
  };
}

function drawGauge(dice: Dice, biasPsi: number, stepPsi: number, noisePsi: number): GaugeTraits {
  const bias = Math.max(-2.2 * biasPsi, Math.min(2.2 * biasPsi, normal(dice, 0, biasPsi)));
  return { biasKpa: psi(bias), stepKpa: psi(stepPsi), noiseKpa: psi(noisePsi) };
}

/** The highest pressure that the fitting sees, jitter aside. */
function peakKpa(air: Pick<Coach, 'cutOutKpa' | 'checkCrackKpa' | 'fitting'>): number {
  const checks = air.fitting === 'supply' ? 0 : air.fitting === 'service' ? 1 : 2;
  return air.cutOutKpa - checks * air.checkCrackKpa;
}

function drawTires(dice: Dice, air: Air, hard: boolean): WorldTire[] {
  const beyond = hard && chance(dice, UNREACHABLE_SHARE);
  const front = beyond ? beyondTarget(dice, air) : reachableTarget(dice, air, hard);
  const rear = hard
    ? reachableTarget(dice, air, hard)
    : Math.min(front, reachableTarget(dice, air, hard));
  const coreC = logBetween(dice, 0.1, 0.42);
  const volumeL = between(dice, 70, 210);
  return [front, front, rear, rear].map((targetPsi) =>
    drawTire(dice, air, { hard, targetPsi, coreC, volumeL }),
  );
}

/** Whole psi, as people write targets down. */
function reachableTarget(dice: Dice, air: Air, hard: boolean): number {
  const peak = toPsi(peakKpa(air));
  const cutIn = toPsi(air.cutInKpa);
  const most = peak - LEAST_HEADROOM_PSI - 2 * toPsi(air.governorJitterKpa);
  if (hard) return Math.floor(Math.max(cutIn + 3, most - between(dice, 0, 6)));
  const lowest = air.lowerBy.length === 0 ? -25 : -20;
  const highest = air.lowerBy.length === 0 ? -3 : 5;
  return Math.floor(Math.min(cutIn + between(dice, lowest, highest), peak - 9));
}

function beyondTarget(dice: Dice, air: Air): number {
  return Math.ceil(toPsi(peakKpa(air)) + TOLERANCE_PSI + between(dice, 2, 9));
}

interface TirePlan {
  hard: boolean;
  targetPsi: number;
  coreC: number;
  volumeL: number;
}

function drawTire(dice: Dice, air: Air, plan: TirePlan): WorldTire {
  const volumeL = plan.volumeL * between(dice, 0.97, 1.03);
  return {
    startKpa: psi(plan.targetPsi - drawDeficit(dice, air, plan)),
    targetKpa: psi(plan.targetPsi),
    toleranceKpa: psi(TOLERANCE_PSI),
    limitKpa: psi(plan.targetPsi + Math.round(between(dice, 5, 20))),
    volumeL,
    saidVolumeL: Math.round(plan.volumeL * between(dice, 0.88, 1.14)),
    // Up to twofold from wheel to wheel (design/engine.md).
    coreC: plan.coreC * 2 ** between(dice, -0.5, 0.5),
    warmthGain: between(dice, 0.05, 0.3),
    settleS: between(dice, 20, 55),
    reachable: psi(plan.targetPsi - TOLERANCE_PSI) < peakKpa(air),
  };
}

/** How much a tire lacks at a cold check; redrawn for each round. */
export function drawDeficit(
  dice: Dice,
  air: Pick<Coach, 'cutInKpa'>,
  plan: { hard: boolean; targetPsi: number },
): number {
  if (!plan.hard) return between(dice, 3, 16);
  const room = plan.targetPsi - toPsi(air.cutInKpa);
  return between(dice, 2.5, Math.max(3.5, Math.min(6.5, room)));
}

/** Conductance from the gauge to the inside of the tire. */
export function chuckSideC(coach: Coach, tire: WorldTire): number {
  return inSeries(coach.hoseToChuckC, tire.coreC);
}
