import { type Coach, chuckSideC, type WorldTire } from './coach';
import { flowThrough, pressureBetween, psi } from './flow';
import { between, type Dice, diceFor, normal } from './random';
import { cool, levelling, pressureAbs, shift, type Vessel } from './vessel';

/** One step of the world in seconds: far below a governor's swing and a hand's second. */
export const STEP_S = 0.1;

/** Tank walls are steel and bare, so that little of the warmth shows, and not for long. */
const TANK_WARMTH = { gain: 0.06, settleS: 20 };
/** Length of one push on the pedal, s. */
const PUSH_S = 0.6;
/** A badly seated chuck opens the core in part and lets air past (dm³/(s·bar)). */
const LEAKING = { coreShare: 0.6, leakC: 0.06 };
/** A pin in the core lets out about this share of what the core lets in. */
const BLEED_SHARE = 0.5;

export type ChuckState = 'off' | 'open' | 'blocked' | 'leaking';
export type Speed = 'idle' | 'fast-idle';

export interface World {
  coach: Coach;
  time: number;
  supply: Vessel;
  service: Vessel;
  accessory: Vessel;
  tires: Vessel[];
  active: number;
  loaded: boolean;
  /** The governor's next switch, with this cycle's jitter. */
  nextCutIn: number;
  nextCutOut: number;
  speed: Speed;
  pedal: boolean;
  pushedAt: number;
  drain: boolean;
  chuck: ChuckState;
  bleeding: boolean;
  /** Absolute pressure where the tee gauge sits, and flow into the tire (kPa·L/s). */
  teeKpaAbs: number;
  tireFlow: number;
  /** Counters: cut-outs, cut-ins, pushes; air that went back out of each tire (kPa). */
  cutOuts: number;
  cutIns: number;
  pushes: number;
  lostKpa: number[];
  /** Ledger of air from and to outside (kPa·L). */
  taken: number;
  given: number;
  dice: Dice;
}

/** A coach on its level ground, engine running for a while, somewhere in the governor's cycle. */
export function startWorld(coach: Coach, round: number): World {
  const dice = diceFor(coach.id, 2, round);
  const phase = between(dice, 0.05, 1);
  const supplyKpa = coach.cutInKpa + phase * (coach.cutOutKpa - coach.cutInKpa - psi(0.5));
  const world: World = {
    coach,
    time: 0,
    supply: tank(coach, coach.supplyL, supplyKpa),
    service: tank(coach, coach.serviceL, supplyKpa - coach.checkCrackKpa),
    accessory: tank(coach, coach.accessoryL, supplyKpa - 2 * coach.checkCrackKpa),
    tires: coach.tires.map((tire) => tireVessel(coach, tire)),
    active: 0,
    loaded: between(dice, 0, 1) < 0.5,
    nextCutIn: 0,
    nextCutOut: 0,
    speed: 'idle',
    pedal: false,
    pushedAt: Number.NEGATIVE_INFINITY,
    drain: false,
    chuck: 'off',
    bleeding: false,
    teeKpaAbs: 0,
    tireFlow: 0,
    cutOuts: 0,
    cutIns: 0,
    pushes: 0,
    lostKpa: coach.tires.map(() => 0),
    taken: 0,
    given: 0,
    dice,
  };
  drawSwitches(world);
  world.teeKpaAbs = pressureAbs(fittingVessel(world));
  return world;
}

function tank(coach: Coach, volumeL: number, gaugeKpa: number): Vessel {
  return { amount: (gaugeKpa + coach.atmosphereKpa) * volumeL, volumeL, warmth: 0, ...TANK_WARMTH };
}

function tireVessel(coach: Coach, tire: WorldTire): Vessel {
  return {
    amount: (tire.startKpa + coach.atmosphereKpa) * tire.volumeL,
    volumeL: tire.volumeL,
    warmth: 0,
    gain: tire.warmthGain,
    settleS: tire.settleS,
  };
}

function drawSwitches(world: World): void {
  const { coach, dice } = world;
  world.nextCutIn = coach.cutInKpa + normal(dice, 0, coach.governorJitterKpa);
  const cutOut = coach.cutOutKpa + normal(dice, 0, coach.governorJitterKpa);
  world.nextCutOut = Math.max(cutOut, world.nextCutIn + psi(5));
}

/** A copy that runs on alone; it meets the same jitter as the world that it was taken from. */
export function copyWorld(world: World): World {
  return {
    ...world,
    supply: { ...world.supply },
    service: { ...world.service },
    accessory: { ...world.accessory },
    tires: world.tires.map((tire) => ({ ...tire })),
    lostKpa: [...world.lostKpa],
    dice: { ...world.dice },
  };
}

function fittingVessel(world: World): Vessel {
  const { fitting } = world.coach;
  if (fitting === 'supply') return world.supply;
  return fitting === 'service' ? world.service : world.accessory;
}

/** Gauge kPa at the fitting: what the calls turn on. */
export function fittingKpa(world: World): number {
  return pressureAbs(fittingVessel(world)) - world.coach.atmosphereKpa;
}

/** Gauge kPa of the active tire once its warmth has gone. */
export function settledKpa(world: World): number {
  const tire = world.tires[world.active]!;
  return tire.amount / tire.volumeL - world.coach.atmosphereKpa;
}

/** Gauge kPa that a gauge on the valve would read now. */
export function tireKpa(world: World): number {
  return pressureAbs(world.tires[world.active]!) - world.coach.atmosphereKpa;
}

/** Supply over tire as felt at the path, kPa. */
export function headroomKpa(world: World): number {
  return fittingKpa(world) - tireKpa(world);
}

export function activeTire(world: World): WorldTire {
  return world.coach.tires[world.active]!;
}

/** Advances the world by one step. */
export function stepWorld(world: World): void {
  compress(world);
  leak(world);
  lower(world);
  passChecks(world);
  passTire(world);
  settle(world);
  govern(world);
  world.time += STEP_S;
}

/** Moves air and warms where it arrives; a missing vessel is the outside. */
function move(world: World, from: Vessel | null, to: Vessel | null, amount: number): void {
  if (from) shift(from, -amount);
  else world.taken += amount;
  if (to) shift(to, amount);
  else world.given += amount;
}

function compress(world: World): void {
  if (!world.loaded) return;
  const { coach } = world;
  const rate = world.speed === 'fast-idle' ? coach.fastDelivery : coach.idleDelivery;
  const gauge = pressureAbs(world.supply) - coach.atmosphereKpa;
  const fade = 1 - (coach.deliveryFade * (gauge - 700)) / 700;
  // A dm³ ANR is 100 kPa·L; thin air on a mountain is taken in by volume.
  const thin = coach.atmosphereKpa / 100;
  move(world, null, world.supply, Math.max(0, rate * fade) * 100 * thin * STEP_S);
}

function leak(world: World): void {
  const { coach, service } = world;
  const share = (pressureAbs(service) - coach.atmosphereKpa) / coach.cutOutKpa;
  move(world, service, null, coach.leakKpaPerS * share * service.volumeL * STEP_S);
}

function lower(world: World): void {
  const { coach } = world;
  if (world.drain) {
    const flow = flowThrough(pressureAbs(world.supply), coach.atmosphereKpa, coach.drainC, 0.3);
    move(world, world.supply, null, flow * STEP_S);
  }
  if (world.pedal && world.time - world.pushedAt >= coach.brakeEveryS) {
    world.pushedAt = world.time;
    world.pushes += 1;
    if (coach.losesFastIdle) world.speed = 'idle';
  }
  if (world.time - world.pushedAt < PUSH_S) {
    const gauge = pressureAbs(world.service) - coach.atmosphereKpa;
    const perPush = coach.brakeKpa * (gauge / coach.cutOutKpa) * world.service.volumeL;
    move(world, world.service, null, (perPush * STEP_S) / PUSH_S);
  }
}

function passChecks(world: World): void {
  const { coach } = world;
  passCheck(world, world.supply, world.service, coach.checkC);
  const open = pressureAbs(world.service) - coach.atmosphereKpa > coach.protectionKpa;
  if (open) passCheck(world, world.service, world.accessory, coach.accessoryC);
}

function passCheck(world: World, up: Vessel, down: Vessel, c: number): void {
  const drop = pressureAbs(up) - world.coach.checkCrackKpa - pressureAbs(down);
  if (drop <= 0) return;
  const flow = flowThrough(pressureAbs(up) - world.coach.checkCrackKpa, pressureAbs(down), c, 0.3);
  move(world, up, down, Math.min(flow * STEP_S, levelling(up, down, drop)));
}

function passTire(world: World): void {
  const { coach } = world;
  const tire = world.tires[world.active]!;
  const source = fittingVessel(world);
  world.tireFlow = 0;
  world.teeKpaAbs = pressureAbs(source);
  if (world.bleeding) bleed(world, tire);
  if (world.chuck === 'off' || world.chuck === 'blocked') return;
  if (world.chuck === 'leaking') {
    move(world, source, null, pressureAbs(source) * LEAKING.leakC * STEP_S);
  }
  const share = world.chuck === 'leaking' ? LEAKING.coreShare : 1;
  const chuckC = chuckSideC(coach, activeTire(world)) * share;
  const outward = pressureAbs(source) >= pressureAbs(tire);
  if (outward) passAir(world, source, tire, coach.hoseToGaugeC, chuckC);
  else passAir(world, tire, source, chuckC, coach.hoseToGaugeC);
}

function passAir(world: World, up: Vessel, down: Vessel, firstC: number, secondC: number): void {
  const b = world.coach.criticalRatio;
  const upAbs = pressureAbs(up);
  const downAbs = pressureAbs(down);
  world.teeKpaAbs = pressureBetween(upAbs, firstC, downAbs, secondC, b);
  // Taken where the drop is greater, and the error of the pressure between them smaller.
  const tee = world.teeKpaAbs;
  const flow =
    upAbs - tee > tee - downAbs
      ? flowThrough(upAbs, tee, firstC, b)
      : flowThrough(tee, downAbs, secondC, b);
  const amount = Math.min(flow * STEP_S, levelling(up, down, upAbs - downAbs));
  move(world, up, down, amount);
  const tire = world.tires[world.active]!;
  world.tireFlow = (down === tire ? amount : -amount) / STEP_S;
  if (up === tire) world.lostKpa[world.active]! += amount / tire.volumeL;
}

function bleed(world: World, tire: Vessel): void {
  const c = activeTire(world).coreC * BLEED_SHARE;
  move(
    world,
    tire,
    null,
    flowThrough(pressureAbs(tire), world.coach.atmosphereKpa, c, 0.3) * STEP_S,
  );
}

function settle(world: World): void {
  for (const tank of [world.supply, world.service, world.accessory]) cool(tank, STEP_S);
  for (const tire of world.tires) cool(tire, STEP_S);
}

function govern(world: World): void {
  const gauge = pressureAbs(world.supply) - world.coach.atmosphereKpa;
  if (world.loaded && gauge >= world.nextCutOut) {
    world.loaded = false;
    world.cutOuts += 1;
    move(world, world.supply, null, world.coach.purgeDropKpa * world.supply.volumeL);
  } else if (!world.loaded && gauge <= world.nextCutIn) {
    world.loaded = true;
    world.cutIns += 1;
    drawSwitches(world);
  }
}
