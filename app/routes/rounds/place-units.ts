import type { AltitudeUnit, PressureUnit, TemperatureUnit } from '~/units';

/** What goes with a person's unit of pressure: °F and ft with psi, °C and m with kPa and bar. */
export const placeUnits = (
  unit: PressureUnit,
): { temperature: TemperatureUnit; altitude: AltitudeUnit } =>
  unit === 'psi' ? { temperature: '°F', altitude: 'ft' } : { temperature: '°C', altitude: 'm' };
