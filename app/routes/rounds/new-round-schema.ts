import { z } from 'zod';
import type { PressureUnit } from '~/units';
import { altitudeField, temperatureField } from '../coaches/form/typed-fields';
import { placeUnits } from './place-units';

/** Longest name of a place, characters. */
const longestPlace = 120;
const zoneWords = 'Type a time zone, for example America/Denver.';

/** What is asked once, before the cautions: where and when a round is. */
export function newRoundSchema(unit: PressureUnit) {
  const { temperature, altitude } = placeUnits(unit);
  return z.object({
    place: z
      .string()
      .trim()
      .max(longestPlace, `Type the place in ${longestPlace} characters or fewer.`),
    altitudeM: altitudeField(altitude).transform(Number),
    ambientC: temperatureField(temperature).transform(Number),
    timeZone: z.string(zoneWords).trim().refine(isTimeZone, zoneWords),
    withHelper: z
      .enum(['yes', 'no'], 'Say whether a helper is in the seat.')
      .transform((yes) => yes === 'yes'),
  });
}

function isTimeZone(name: string): boolean {
  if (name === '') return false;
  try {
    new Intl.DateTimeFormat('en', { timeZone: name });
    return true;
  } catch {
    return false;
  }
}
