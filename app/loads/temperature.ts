import {
  type AbsoluteKpa,
  absoluteKpa,
  type Celsius,
  type GaugeKpa,
  kelvinOf,
  toAbsolute,
  toGauge,
} from '~/units';

/**
 * The pressure that the same air in the same tire shows at another temperature.
 * @param gauge kPa above the air around, found at `from`
 * @param atmosphere the air around, kPa above vacuum, the same for both
 * @throws RangeError when `from` or `to` is absolute zero, where a gas law says nothing, or when
 * `gauge` lies below vacuum.
 * Source: ideal gas law at constant volume, absolute pressure over absolute temperature.
 */
export function pressureAtTemperature(
  gauge: GaugeKpa,
  from: Celsius,
  to: Celsius,
  atmosphere: AbsoluteKpa,
): GaugeKpa {
  const [kelvinFrom, kelvinTo] = [kelvinOf(from), kelvinOf(to)];
  if (!(kelvinFrom > 0)) throw new RangeError(`from: ${from} °C is not above absolute zero`);
  if (!(kelvinTo > 0)) throw new RangeError(`to: ${to} °C is not above absolute zero`);
  const settled = (toAbsolute(gauge, atmosphere) * kelvinTo) / kelvinFrom;
  return toGauge(absoluteKpa(settled), atmosphere);
}
