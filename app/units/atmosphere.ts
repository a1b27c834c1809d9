import { type Metres, metres } from './length';
import { type AbsoluteKpa, absoluteKpa, seaLevelKpa } from './pressure';

/** Lowest altitude that `standardAtmosphere` answers for; shores lie above −500 m. */
export const lowestAltitude = metres(-500);
/** Above the troposphere the relation is another one. */
export const highestAltitude = metres(11_000);

/** Kelvin at sea level. U.S. Standard Atmosphere 1976. */
const seaLevelKelvin = 288.15;
/** Kelvin a metre in the troposphere. U.S. Standard Atmosphere 1976. */
const lapseRate = 0.0065;
/** g0 · M / (R* · lapse rate): 9.80665 × 0.0289644 / (8.31432 × 0.0065). U.S. Standard Atmosphere 1976. */
const exponent = (9.80665 * 0.0289644) / (8.31432 * lapseRate);

/**
 * The air's pressure on a standard day, kPa above vacuum. Uses `**`, which may differ in the last
 * bit between JavaScript engines: a fill stores the figure once and never works it out again.
 * @param altitude metres above the sea, −500 to 11 000
 * @throws RangeError naming the altitude when it lies outside.
 * Source: U.S. Standard Atmosphere 1976, troposphere.
 */
export function standardAtmosphere(altitude: Metres): AbsoluteKpa {
  if (!(altitude >= lowestAltitude && altitude <= highestAltitude)) {
    throw new RangeError(
      `altitude: ${altitude} m is outside ${lowestAltitude} to ${highestAltitude} m, which the standard atmosphere covers`,
    );
  }
  return absoluteKpa(seaLevelKpa * (1 - (lapseRate * altitude) / seaLevelKelvin) ** exponent);
}
