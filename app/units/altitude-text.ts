import { highestAltitude, lowestAltitude } from './atmosphere';
import { type Metres, metresPerFoot } from './length';
import {
  formatNumber,
  type Parsed,
  parseNumberWithUnit,
  type UnitName,
  withinRange,
} from './number-text';

export const altitudeUnits = ['ft', 'm'] as const;
export type AltitudeUnit = (typeof altitudeUnits)[number];

const metresPer: Record<AltitudeUnit, number> = { ft: metresPerFoot, m: 1 };

const unitNames: readonly UnitName<AltitudeUnit>[] = [
  { unit: 'ft', pattern: /^(ft|feet)$/i },
  { unit: 'm', pattern: /^(m|metres?|meters?)$/i },
];

/** `"5280 ft"`, always whole: a foot is 4 Pa. */
export function formatAltitude(
  value: Metres,
  unit: AltitudeUnit,
  { withUnit = true }: { withUnit?: boolean } = {},
): string {
  const figure = formatNumber(value / metresPer[unit], 0);
  return withUnit ? `${figure} ${unit}` : figure;
}

/**
 * Reads an altitude within the standard atmosphere's range, −500 to 11 000 m. "5,280" and "5.280"
 * are five thousand. A unit that is written out counts before `unit`.
 */
export function parseAltitude(text: string, unit: AltitudeUnit): Parsed<Metres> {
  const typed = parseNumberWithUnit(text, unit, unitNames, { grouping: true });
  if (!typed.ok) return typed;
  const factor = metresPer[typed.value.unit];
  return withinRange(typed.value, {
    toInternal: (figure) => figure * factor,
    minimum: lowestAltitude,
    maximum: highestAltitude,
    shownDigits: 0,
  });
}
