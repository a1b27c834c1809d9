import { type Quantity, quantity } from './quantity';

/** The house's own unit of temperature. */
export type Celsius = Quantity<'°C'>;
/** For reading and typing only. */
export type Fahrenheit = Quantity<'°F'>;

/** 0 °C in kelvin, exact. NIST SP 811. */
const freezingKelvin = 273.15;
const fahrenheitPerCelsius = 1.8;
const freezingFahrenheit = 32;

/** @throws RangeError when `value` is not finite or below −273.15. */
export const celsius = (value: number): Celsius =>
  quantity('temperature in °C', value, -freezingKelvin);
/** @throws RangeError when `value` is not finite or below −459.67. */
export const fahrenheit = (value: number): Fahrenheit =>
  quantity('temperature in °F', value, -459.67);

export const celsiusToFahrenheit = (value: Celsius): Fahrenheit =>
  fahrenheit(value * fahrenheitPerCelsius + freezingFahrenheit);
/** The bare arithmetic, for figures that nobody has checked yet. */
export const degreesFromFahrenheit = (figure: number): number =>
  (figure - freezingFahrenheit) / fahrenheitPerCelsius;
export const fahrenheitToCelsius = (value: Fahrenheit): Celsius =>
  // −459.67 °F comes out one bit below −273.15 °C in floating point.
  celsius(Math.max(degreesFromFahrenheit(value), -freezingKelvin));

/** Kelvin above absolute zero, for gas laws. */
export const kelvinOf = (value: Celsius): number => value + freezingKelvin;
