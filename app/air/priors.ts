/**
 * What is believed of a coach before anything was tapped: wide, with tails, so that a fact outside
 * the usual range widens the belief and does not break it. Ranges are common practice.
 */
import { type Draws, lognormal, normal, uniform, uniformBetween } from './arithmetic';
import { FITTING, type Members, PATH, SPEED, seriesC } from './coach';

export const KPA_PER_PSI = 6.894757293168361;

/** "A gauge is wrong by one and a half psi or so and always the same way" (common practice). */
export const WHEEL_BIAS_KPA = 1.5 * KPA_PER_PSI;

/** This share of the draws comes from far outside the usual range. */
const TAIL_SHARE = 0.06;

/** Draws all lasting parameters of member i from the broad prior. */
export function drawLasting(m: Members, i: number, draws: Draws): void {
  const kind = uniform(draws);
  m.fitting[i] = kind < 0.42 ? FITTING.supply : kind < 0.76 ? FITTING.service : FITTING.accessory;
  m.supplyL[i] = lognormal(draws, 24, 0.28);
  m.serviceL[i] = lognormal(draws, 88, 0.33);
  m.accessoryL[i] = lognormal(draws, 11, 0.38);
  m.protectionKpa[i] = uniformBetween(draws, 60, 85) * KPA_PER_PSI;
  m.idleFlow[i] = lognormal(draws, 2.5, 0.35);
  m.fastFlow[i] = m.idleFlow[i]! * lognormal(draws, 1.95, 0.22);
  m.leak[i] = (uniform(draws) * uniform(draws) * 3) / 60 / 105;
  drawGovernor(m, i, draws);
  m.pedalKpaS[i] = lognormal(draws, 1.25, 0.5) * KPA_PER_PSI;
  m.drainC[i] = lognormal(draws, 1.2, 0.7);
  m.hoseC[i] = lognormal(draws, 1.25, 0.4);
  m.chuckC[i] = lognormal(draws, 0.24, 0.55);
  m.gaugeShare[i] = uniformBetween(draws, 0.35, 1);
  m.wheelBias[i] = normal(draws) * WHEEL_BIAS_KPA;
  m.dashBias[i] = normal(draws) * 3.2 * KPA_PER_PSI;
  m.pedalDropsIdle[i] = uniform(draws) < 0.5 ? 1 : 0;
  m.purgeKpa[i] = uniform(draws) < 0.4 ? uniformBetween(draws, 0.3, 3) * KPA_PER_PSI : 0;
  m.missesPurge[i] = uniform(draws) < 0.75 ? uniformBetween(draws, 0.05, 0.3) : 0.95;
  m.deadCompressor[i] = uniform(draws) < 0.01 ? 1 : 0;
}

/** Cut-in 80 to 110 psi, span 12 to 35 psi as a rule, farther in the tail. */
export function drawGovernor(m: Members, i: number, draws: Draws): void {
  const tail = uniform(draws) < TAIL_SHARE;
  const cutIn = tail ? uniformBetween(draws, 60, 135) : 95 + 8.5 * normal(draws);
  const span = tail ? uniformBetween(draws, 6, 45) : Math.abs(22 + 6 * normal(draws));
  m.cutInKpa[i] = cutIn * KPA_PER_PSI;
  m.cutOutKpa[i] = (cutIn + Math.max(4, span)) * KPA_PER_PSI;
}

/** What this wheel adds: its core (up to twofold from wheel to wheel), its volume, its warmth. */
export function drawWheel(
  m: Members,
  i: number,
  draws: Draws,
  volumeL: number,
  slowValve: boolean,
): void {
  const core = m.chuckC[i]! * lognormal(draws, slowValve ? 0.7 : 1, 0.24);
  m.pathC[i] = seriesC(m.hoseC[i]!, core);
  m.tireL[i] = volumeL * lognormal(draws, 1, 0.07);
  m.heating[i] = uniformBetween(draws, 0.02, 0.16);
  m.coolingS[i] = uniformBetween(draws, 20, 80);
  m.bleedC[i] = lognormal(draws, 0.16, 0.5);
  m.path[i] = PATH.off;
  m.flow[i] = 0;
  m.warmth[i] = 0;
}

/** The supply before any reading: usually somewhere in the governor's range, seldom far below. */
export function drawSupply(m: Members, i: number, draws: Draws, atmosphereKpa: number): void {
  const inRange = uniform(draws) < 0.85;
  const low = inRange ? m.cutInKpa[i]! - 12 * KPA_PER_PSI : 0;
  const gauge = uniformBetween(draws, Math.max(0, low), m.cutOutKpa[i]!);
  setSupply(m, i, gauge + atmosphereKpa);
  m.loaded[i] = gauge < m.cutInKpa[i]! || uniform(draws) < 0.5 ? 1 : 0;
  m.sinceSwitch[i] = 60;
  m.drift[i] = 0;
  const speed = uniform(draws);
  m.speed[i] = speed < 0.12 ? SPEED.off : speed < 0.56 ? SPEED.idle : SPEED['fast-idle'];
}

/** All tanks at one pressure (absolute). */
export function setSupply(m: Members, i: number, abs: number): void {
  m.supplyAbs[i] = abs;
  m.serviceAbs[i] = abs;
  m.accessoryAbs[i] = abs;
}

/**
 * A member with new lasting parameters may not deny what its supply does at this moment: the
 * governor's points are moved to the far side of the pressure that it has.
 */
export function reconcileGovernor(
  m: Members,
  i: number,
  draws: Draws,
  atmosphereKpa: number,
): void {
  const gauge = m.supplyAbs[i]! - atmosphereKpa;
  if (m.loaded[i] === 1 && m.cutOutKpa[i]! < gauge) {
    m.cutOutKpa[i] = gauge + uniformBetween(draws, 0.5, 12) * KPA_PER_PSI;
  }
  if (m.loaded[i] === 0 && m.cutInKpa[i]! > gauge) {
    m.cutInKpa[i] = gauge - uniformBetween(draws, 0.5, 12) * KPA_PER_PSI;
  }
  const least = 4 * KPA_PER_PSI;
  if (m.cutOutKpa[i]! - m.cutInKpa[i]! < least) {
    if (m.loaded[i] === 1) m.cutInKpa[i] = m.cutOutKpa[i]! - least;
    else m.cutOutKpa[i] = m.cutInKpa[i]! + least;
  }
}
