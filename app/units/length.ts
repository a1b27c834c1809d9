import { type Quantity, quantity } from './quantity';

/** The house's own unit of altitude. Below sea level is below zero. */
export type Metres = Quantity<'m'>;
/** For reading and typing only. */
export type Feet = Quantity<'ft'>;

/** Exact. NIST SP 811. */
export const metresPerFoot = 0.3048;

/** @throws RangeError when `value` is not finite. */
export const metres = (value: number): Metres => quantity('length in m', value);
/** @throws RangeError when `value` is not finite. */
export const feet = (value: number): Feet => quantity('length in ft', value);

export const feetToMetres = (value: Feet): Metres => metres(value * metresPerFoot);
export const metresToFeet = (value: Metres): Feet => feet(value / metresPerFoot);
