import { type Quantity, quantity } from './quantity';

/** The house's own unit of mass. */
export type Kilograms = Quantity<'kg'>;
/** For reading and typing only. */
export type Pounds = Quantity<'lb'>;

/** Exact. NIST SP 811. */
export const kilogramsPerPound = 0.45359237;

/** @throws RangeError when `value` is not finite or below 0. */
export const kilograms = (value: number): Kilograms => quantity('mass in kg', value, 0);
/** @throws RangeError when `value` is not finite or below 0. */
export const pounds = (value: number): Pounds => quantity('mass in lb', value, 0);

export const poundsToKilograms = (value: Pounds): Kilograms => kilograms(value * kilogramsPerPound);
export const kilogramsToPounds = (value: Kilograms): Pounds => pounds(value / kilogramsPerPound);
