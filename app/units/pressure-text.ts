import {
  formatNumber,
  type Parsed,
  parseNumberWithUnit,
  type UnitName,
  withinRange,
} from './number-text';
import { type GaugeKpa, type KpaDifference, kpaPerBar, kpaPerPsi } from './pressure';

/** The units in which a person may read and type pressures. */
export const pressureUnits = ['psi', 'kPa', 'bar'] as const;
export type PressureUnit = (typeof pressureUnits)[number];

export interface FormatPressureOptions {
  /** Decimals; by default psi 1, kPa 0, bar 2. */
  digits?: number;
  /** `false` leaves the unit to a column's header. */
  withUnit?: boolean;
  /** Drops zeros after the decimal mark: "112 psi", but "104.5 psi". */
  trim?: boolean;
}

export interface FormatDifferenceOptions extends FormatPressureOptions {
  /** Writes a plus before what is above zero. */
  sign?: boolean;
}

const kpaPer: Record<PressureUnit, number> = { psi: kpaPerPsi, kPa: 1, bar: kpaPerBar };
// Half the last figure is at most 0.5 kPa: finer than any tire gauge.
const shownDigits: Record<PressureUnit, number> = { psi: 1, kPa: 0, bar: 2 };
// Graduations of hand gauges. Common practice.
const gaugeStep: Record<PressureUnit, number> = { psi: 1, kPa: 10, bar: 0.1 };

const unitNames: readonly UnitName<PressureUnit>[] = [
  { unit: 'psi', pattern: /^psi$/i },
  { unit: 'kPa', pattern: /^kpa$/i },
  { unit: 'bar', pattern: /^bar$/i },
];

/** The range that the engine accepts, kPa: see `FillEvent` in design/engine.md. */
export const pressureRange = { minimum: 0 as GaugeKpa, maximum: 1400 as GaugeKpa };

/** One graduation of a common gauge in that unit, kPa: 1 psi, 10 kPa or 0.1 bar. */
export const defaultStepKpa = (unit: PressureUnit): KpaDifference =>
  (gaugeStep[unit] * kpaPer[unit]) as KpaDifference;

/**
 * Writes a gauge pressure in the reader's unit, `"104.5 psi"`, with a decimal point.
 * @throws RangeError when the pressure is not finite.
 */
export const formatPressure = (
  kpa: GaugeKpa,
  unit: PressureUnit,
  options?: FormatPressureOptions,
): string => format(kpa, unit, options);

/** Writes what lies between two pressures: scaled only, since a difference has no atmosphere. */
export const formatPressureDifference = (
  kpa: KpaDifference,
  unit: PressureUnit,
  options?: FormatDifferenceOptions,
): string => format(kpa, unit, options);

function format(
  kpa: number,
  unit: PressureUnit,
  { digits = shownDigits[unit], withUnit = true, trim, sign }: FormatDifferenceOptions = {},
): string {
  const figure = formatNumber(kpa / kpaPer[unit], digits, { trim, sign });
  return withUnit ? `${figure} ${unit}` : figure;
}

/**
 * Reads a typed gauge pressure, with a decimal point or comma. A unit that is written out counts
 * before `unit`. Out of range unless within `range`, by default 0 to 1400 kPa.
 */
export const parsePressure = (
  text: string,
  unit: PressureUnit,
  range: { minimum: GaugeKpa; maximum: GaugeKpa } = pressureRange,
): Parsed<GaugeKpa> => parse(text, unit, range);

/** Reads a typed difference, such as a tolerance or a gauge's graduation. */
export const parsePressureDifference = (
  text: string,
  unit: PressureUnit,
  range: { minimum: KpaDifference; maximum: KpaDifference },
): Parsed<KpaDifference> => parse(text, unit, range);

function parse<Value extends number>(
  text: string,
  unit: PressureUnit,
  range: { minimum: Value; maximum: Value },
): Parsed<Value> {
  const typed = parseNumberWithUnit(text, unit, unitNames);
  if (!typed.ok) return typed;
  const { minimum, maximum } = range;
  const { unit: typedUnit } = typed.value;
  return withinRange(typed.value, {
    toInternal: (figure) => figure * kpaPer[typedUnit],
    minimum,
    maximum,
    shownDigits: shownDigits[typedUnit],
  });
}
