/** Heat of compression at constant volume, (γ − 1) for air. */
const HEATING = 0.4;
/** Air in a vessel, as pressure times volume at ambient temperature (kPa·L). */
export interface Vessel {
  amount: number;
  volumeL: number;
  /** Gas temperature over ambient, less one. */
  warmth: number;
  gain: number;
  settleS: number;
}

/** Absolute kPa, warmth included. */
export function pressureAbs(vessel: Vessel): number {
  return (vessel.amount / vessel.volumeL) * (1 + vessel.warmth);
}

/** Puts air in (or takes it out, when negative) and warms what is there. */
export function shift(vessel: Vessel, amount: number): void {
  vessel.warmth += (vessel.gain * HEATING * amount) / vessel.amount;
  vessel.amount += amount;
}

/** The amount that brings two vessels level: no step may carry more across. */
export function levelling(up: Vessel, down: Vessel, drop: number): number {
  return (drop * up.volumeL * down.volumeL) / (up.volumeL + down.volumeL);
}

/** Warmth goes with the vessel's own time. */
export function cool(vessel: Vessel, seconds: number): void {
  vessel.warmth -= (vessel.warmth * seconds) / vessel.settleS;
}
