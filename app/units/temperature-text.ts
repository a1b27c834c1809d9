import {
  formatNumber,
  type Parsed,
  parseNumberWithUnit,
  type UnitName,
  withinRange,
} from './number-text';
import { type Celsius, celsius, celsiusToFahrenheit, degreesFromFahrenheit } from './temperature';

export const temperatureUnits = ['°F', '°C'] as const;
export type TemperatureUnit = (typeof temperatureUnits)[number];

const unitNames: readonly UnitName<TemperatureUnit>[] = [
  { unit: '°F', pattern: /^°?\s*f$/i },
  { unit: '°C', pattern: /^°?\s*c$/i },
];

/** Colder and hotter than any place where somebody checks tires outdoors, °C. */
const typedTemperature = { minimum: celsius(-60), maximum: celsius(60) };

/** `"72 °F"`; whole degrees unless `digits` says otherwise. */
export function formatTemperature(
  value: Celsius,
  unit: TemperatureUnit,
  { digits = 0, withUnit = true }: { digits?: number; withUnit?: boolean } = {},
): string {
  const figure = formatNumber(unit === '°F' ? celsiusToFahrenheit(value) : value, digits);
  return withUnit ? `${figure} ${unit}` : figure;
}

/** Reads an outdoor temperature, −60 to 60 °C. A unit that is written out counts before `unit`. */
export function parseTemperature(text: string, unit: TemperatureUnit): Parsed<Celsius> {
  const typed = parseNumberWithUnit(text, unit, unitNames);
  if (!typed.ok) return typed;
  return withinRange(typed.value, {
    toInternal: typed.value.unit === '°F' ? degreesFromFahrenheit : (figure) => figure,
    ...typedTemperature,
    shownDigits: 0,
  });
}
