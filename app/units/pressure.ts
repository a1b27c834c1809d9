import { type Quantity, quantity } from './quantity';

/** Pressure above the air around, kPa: what a tire gauge shows. The house's own unit. */
export type GaugeKpa = Quantity<'kPa above the air around'>;
/** Pressure above vacuum, kPa: what gas laws want. */
export type AbsoluteKpa = Quantity<'kPa above vacuum'>;
/** What lies between two pressures, kPa. It has no zero point, so no atmosphere shifts it. */
export type KpaDifference = Quantity<'kPa between two pressures'>;
/** Gauge pressure in psi, for reading and typing only. */
export type Psi = Quantity<'psi above the air around'>;
/** Gauge pressure in bar, for reading and typing only. */
export type Bar = Quantity<'bar above the air around'>;

/** 1 lbf/in²: 0.45359237 kg × 9.80665 m/s² over (0.0254 m)². NIST SP 811. */
export const kpaPerPsi = 6.894757293168361;
/** Exact by definition of the bar. NIST SP 811. */
export const kpaPerBar = 100;
/** Sea level of the standard atmosphere, kPa, exact. U.S. Standard Atmosphere 1976. */
export const seaLevelKpa = 101.325 as AbsoluteKpa;

/** @throws RangeError when `value` is not finite. Below zero is a vacuum and allowed. */
export const gaugeKpa = (value: number): GaugeKpa => quantity('gauge pressure in kPa', value);
/** @throws RangeError when `value` is not finite or below 0. */
export const absoluteKpa = (value: number): AbsoluteKpa =>
  quantity('absolute pressure in kPa', value, 0);
/** @throws RangeError when `value` is not finite. */
export const kpaDifference = (value: number): KpaDifference =>
  quantity('pressure difference in kPa', value);
/** @throws RangeError when `value` is not finite. */
export const psi = (value: number): Psi => quantity('gauge pressure in psi', value);
/** @throws RangeError when `value` is not finite. */
export const bar = (value: number): Bar => quantity('gauge pressure in bar', value);

export const psiToKpa = (value: Psi): GaugeKpa => gaugeKpa(value * kpaPerPsi);
export const kpaToPsi = (value: GaugeKpa): Psi => psi(value / kpaPerPsi);
export const barToKpa = (value: Bar): GaugeKpa => gaugeKpa(value * kpaPerBar);
export const kpaToBar = (value: GaugeKpa): Bar => bar(value / kpaPerBar);

/**
 * @param gauge kPa above the air around
 * @param atmosphere the air around, kPa above vacuum
 * @throws RangeError when the result would lie below vacuum.
 */
export const toAbsolute = (gauge: GaugeKpa, atmosphere: AbsoluteKpa): AbsoluteKpa =>
  absoluteKpa(gauge + atmosphere);

/** The gauge pressure that `absolute` shows where the air around has `atmosphere`. */
export const toGauge = (absolute: AbsoluteKpa, atmosphere: AbsoluteKpa): GaugeKpa =>
  gaugeKpa(absolute - atmosphere);

/** `left` less `right`; above zero when `left` is the higher one. */
export const pressureBetween = (left: GaugeKpa, right: GaugeKpa): KpaDifference =>
  kpaDifference(left - right);

/** `base` raised by `by` (lowered when `by` is below zero). */
export const raisedBy = (base: GaugeKpa, by: KpaDifference): GaugeKpa => gaugeKpa(base + by);
