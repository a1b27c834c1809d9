/**
 * Pressure, temperature, mass, volume, altitude and time as types. One internal unit a quantity:
 * kPa, °C, kg, L, m, s. Other units exist only where people read and type.
 */
export * from './altitude-text';
export * from './atmosphere';
export * from './duration';
export * from './length';
export * from './mass';
export type { Parsed } from './number-text';
export * from './pressure';
export * from './pressure-text';
export type { Quantity } from './quantity';
export * from './temperature';
export * from './temperature-text';
export * from './volume';
