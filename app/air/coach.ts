/**
 * One coach, or a few hundred side by side: the members' fields as columns, and the only step
 * function. Simulator, live filter and rollouts all call `step`.
 */

/** What changes from second to second. Pressures are absolute kPa. */
const STATE_FIELDS = [
  'supplyAbs', // supply (wet) tank
  'serviceAbs',
  'accessoryAbs',
  'loaded', // 1: the governor lets the compressor pump
  'speed', // 0 off, 1 idle, 2 fast idle
  'sinceSwitch', // s since the governor last switched
  'tireAbs', // settled
  'warmth', // kPa above settled
  'path', // one of PATH
  'flow', // kPa·L/s into the tire, negative: out of it
  'drift', // kPa/s of the tank that the fitting sits on
  'idleHands', // 1: nobody lowers the supply although the log says so
  'doubt', // variance of the supply by what the model leaves out, kPa²
] as const;

/** What lasts for a coach, its hose, its gauges. */
export const LASTING_FIELDS = [
  'fitting', // one of FITTING
  'supplyL',
  'serviceL',
  'accessoryL',
  'protectionKpa', // gauge; the accessory tank is fed above it
  'idleFlow', // dm³/s (ANR) delivered at 700 kPa gauge
  'fastFlow',
  'leak', // share of the gauge pressure lost a second
  'cutInKpa', // gauge
  'cutOutKpa',
  'pedalKpaS', // fall of the service tanks while the pedal is pumped
  'drainC', // dm³/(s·bar)
  'hoseC',
  'chuckC', // chuck and core, of a usual wheel
  'gaugeShare', // share of the hose's loss that lies before the gauge
  'wheelBias', // kPa, against the gauge that reads the tire
  'dashBias',
  'pedalDropsIdle', // 1: pressing the pedal ends fast idle
  'purgeKpa', // what the drier takes from the supply tank at cut-out
  'missesPurge', // chance that a purge is not tapped
  'deadCompressor', // 1: pumps nothing
] as const;

/** What belongs to this wheel and this fill. */
export const WHEEL_FIELDS = ['pathC', 'tireL', 'heating', 'coolingS', 'bleedC'] as const;

export const FIELDS = [...STATE_FIELDS, ...LASTING_FIELDS, ...WHEEL_FIELDS] as const;
export type Field = (typeof FIELDS)[number];
export type LastingField = (typeof LASTING_FIELDS)[number];

export const PATH = { off: 0, seated: 1, leaking: 2, shut: 3 } as const;
export const FITTING = { supply: 0, service: 1, accessory: 2 } as const;
export const SPEED = { off: 0, idle: 1, 'fast-idle': 2 } as const;

export type Members = { n: number; all: Float64Array } & Record<Field, Float64Array>;

export function createMembers(n: number): Members {
  const all = new Float64Array(n * FIELDS.length);
  const columns = {} as Record<Field, Float64Array>;
  FIELDS.forEach((field, k) => {
    columns[field] = all.subarray(k * n, (k + 1) * n);
  });
  return { n, all, ...columns };
}

/** Member i of `from` becomes member j of `to`. */
export function copyMember(from: Members, i: number, to: Members, j: number): void {
  for (let k = 0; k < FIELDS.length; k++) to.all[k * to.n + j] = from.all[k * from.n + i]!;
}

/** What people do, as far as it was tapped; the same for all members. */
export interface Controls {
  pedal: boolean;
  drain: boolean;
  bleeding: boolean;
  atmosphereKpa: number;
}

/** Critical pressure ratio of hose, chuck and core in series (ISO 6358; usual for such paths). */
export const CRITICAL_RATIO = 0.3;

/** ρ0·R·T at ISO 8778's 1.185 kg/m³ and 293.15 K, in units of 100 kPa: turns C·p1 into kPa·L/s. */
export const ANR = (1.185 * 287.05 * 293.15) / 100000;

/** Delivery falls by this share a bar of gauge pressure (clearance volume; common practice). */
const CLEARANCE_PER_BAR = 0.022;
const DELIVERY_AT_BAR = 7;

/** A chuck that is on but leaks loses this much beside the tire, dm³/(s·bar). */
const SEAT_LEAK_C = 0.12;

/** ISO 6358-1: flow as a share of choked flow, for the ratio downstream/upstream (absolute). */
export function flowShare(ratio: number): number {
  if (ratio <= CRITICAL_RATIO) return 1;
  const x = (ratio - CRITICAL_RATIO) / (1 - CRITICAL_RATIO);
  return x >= 1 ? 0 : Math.sqrt(1 - x * x);
}

/**
 * A step to an event can be a millisecond long. Tanks that even out in it would make a rate that no
 * air has, so such a step keeps the rate of the one before. A wide-open drain makes about 100 kPa/s
 * on the smallest tank of the prior.
 */
const LEAST_FOR_DRIFT_S = 0.05;
const MOST_DRIFT_KPA_S = 100;

/**
 * Advances members `from` to `to` (exclusive) by h seconds.
 * Air passes check valves within the step; a flow never passes the point of equal pressure.
 * One long function with locals, since it is the hot loop of everything.
 */
export function step(m: Members, from: number, to: number, h: number, controls: Controls): void {
  const { atmosphereKpa: atmosphere, pedal, drain, bleeding } = controls;
  for (let i = from; i < to; i++) {
    const fitting = m.fitting[i]!;
    const supplyL = m.supplyL[i]!;
    const serviceL = m.serviceL[i]!;
    let supply = m.supplyAbs[i]!;
    let service = m.serviceAbs[i]!;
    let accessory = m.accessoryAbs[i]!;
    const before =
      fitting === FITTING.supply ? supply : fitting === FITTING.service ? service : accessory;

    const speed = m.speed[i]!;
    if (m.loaded[i] === 1 && speed !== SPEED.off && m.deadCompressor[i] === 0) {
      const rated = speed === SPEED.idle ? m.idleFlow[i]! : m.fastFlow[i]!;
      const bar = (supply - atmosphere) / 100;
      const share = Math.max(0, 1 - CLEARANCE_PER_BAR * (bar - DELIVERY_AT_BAR));
      supply += (rated * share * 100 * ANR * h) / supplyL;
    }

    const kept = 1 - m.leak[i]! * h;
    supply = atmosphere + (supply - atmosphere) * kept;
    service = atmosphere + (service - atmosphere) * kept;
    accessory = atmosphere + (accessory - atmosphere) * kept;
    const lowers = m.idleHands[i] === 0;
    if (pedal && lowers) service = Math.max(atmosphere, service - m.pedalKpaS[i]! * h);
    if (drain && lowers) {
      const out = m.drainC[i]! * supply * ANR * flowShare(atmosphere / supply) * h;
      supply = Math.max(atmosphere, supply - out / supplyL);
    }

    // Check valves: the supply feeds accessory and service, never back.
    if (fitting === FITTING.accessory && supply > accessory) {
      if (supply - atmosphere > m.protectionKpa[i]!) {
        const accessoryL = m.accessoryL[i]!;
        supply = (supply * supplyL + accessory * accessoryL) / (supplyL + accessoryL);
        accessory = supply;
      }
    }
    if (supply > service) {
      supply = (supply * supplyL + service * serviceL) / (supplyL + serviceL);
      service = supply;
    }
    m.supplyAbs[i] = supply;
    m.serviceAbs[i] = service;
    m.accessoryAbs[i] = accessory;

    if (m.path[i] !== PATH.off) fillTire(m, i, h, atmosphere);
    else m.flow[i] = 0;
    const cooling = m.coolingS[i]!;
    m.warmth[i] =
      (m.warmth[i]! * cooling) / (cooling + h) + (m.heating[i]! * m.flow[i]! * h) / m.tireL[i]!;
    if (bleeding) bleed(m, i, h, atmosphere);
    if (h >= LEAST_FOR_DRIFT_S) {
      const drift = (sourceAbs(m, i) - before) / h;
      m.drift[i] = Math.max(-MOST_DRIFT_KPA_S, Math.min(MOST_DRIFT_KPA_S, drift));
    }
    govern(m, i, h, atmosphere);
  }
}

/** Pressure of the tank that the fitting sits on. */
export function sourceAbs(m: Members, i: number): number {
  const fitting = m.fitting[i]!;
  if (fitting === FITTING.supply) return m.supplyAbs[i]!;
  return fitting === FITTING.service ? m.serviceAbs[i]! : m.accessoryAbs[i]!;
}

export function setSourceAbs(m: Members, i: number, abs: number): void {
  const fitting = m.fitting[i]!;
  if (fitting === FITTING.supply) m.supplyAbs[i] = abs;
  else if (fitting === FITTING.service) m.serviceAbs[i] = abs;
  else m.accessoryAbs[i] = abs;
}

function sourceL(m: Members, i: number): number {
  const fitting = m.fitting[i]!;
  if (fitting === FITTING.supply) return m.supplyL[i]!;
  return fitting === FITTING.service ? m.serviceL[i]! : m.accessoryL[i]!;
}

/** Lets air move between the fitting's tank and the tire for h seconds, h above 0. */
export function fillTire(m: Members, i: number, h: number, atmosphere: number): void {
  const path = m.path[i]!;
  const tireL = m.tireL[i]!;
  let flow = 0;
  if (path === PATH.seated || path === PATH.leaking) {
    const source = sourceAbs(m, i);
    const tire = m.tireAbs[i]! + m.warmth[i]!;
    const volume = sourceL(m, i);
    const most = Math.abs(source - tire) / (1 / volume + 1 / tireL) / h;
    const upstream = Math.max(source, tire);
    const downstream = Math.min(source, tire);
    flow = m.pathC[i]! * upstream * ANR * flowShare(downstream / upstream);
    flow = Math.min(flow, most);
    if (source < tire) flow = -flow;
    let left = source - (flow * h) / volume;
    if (path === PATH.leaking) left -= (SEAT_LEAK_C * left * ANR * h) / volume;
    setSourceAbs(m, i, Math.max(atmosphere, left));
    m.tireAbs[i] = m.tireAbs[i]! + (flow * h) / tireL;
  }
  m.flow[i] = flow;
}

/** Moves what the present flow carries in some seconds (negative: takes it back). */
export function shiftFlow(m: Members, i: number, seconds: number): void {
  const amount = m.flow[i]! * seconds;
  m.tireAbs[i] = m.tireAbs[i]! + amount / m.tireL[i]!;
  setSourceAbs(m, i, sourceAbs(m, i) - amount / sourceL(m, i));
}

function bleed(m: Members, i: number, h: number, atmosphere: number): void {
  const tire = m.tireAbs[i]!;
  const out = m.bleedC[i]! * tire * ANR * flowShare(atmosphere / tire) * h;
  m.tireAbs[i] = Math.max(atmosphere, tire - out / m.tireL[i]!);
}

function govern(m: Members, i: number, h: number, atmosphere: number): void {
  const gauge = m.supplyAbs[i]! - atmosphere;
  m.sinceSwitch[i] = m.sinceSwitch[i]! + h;
  if (m.loaded[i] === 1 && gauge >= m.cutOutKpa[i]!) {
    m.loaded[i] = 0;
    m.sinceSwitch[i] = 0;
    m.supplyAbs[i] = m.supplyAbs[i]! - m.purgeKpa[i]!;
  } else if (m.loaded[i] === 0 && gauge <= m.cutInKpa[i]!) {
    m.loaded[i] = 1;
    m.sinceSwitch[i] = 0;
  }
}

/** Hose and chuck in series (ISO 6358-3's rule for equal critical ratios). */
export function seriesC(hoseC: number, chuckC: number): number {
  return (hoseC * chuckC) / Math.sqrt(hoseC * hoseC + chuckC * chuckC);
}

/**
 * What a gauge on the hose shows, absolute kPa: the supply with the path closed, and between supply
 * and tire with air moving, by the share of the loss that lies before the gauge.
 */
export function hoseGaugeAbs(m: Members, i: number): number {
  const source = sourceAbs(m, i);
  const path = m.path[i]!;
  if (path === PATH.off || path === PATH.shut) return source;
  const tire = m.tireAbs[i]! + m.warmth[i]!;
  const ratio = m.pathC[i]! / m.hoseC[i]!;
  const share = Math.min(1, m.gaugeShare[i]! * ratio * ratio);
  return Math.sqrt(Math.max(0, source * source - (source * source - tire * tire) * share));
}
