import { z } from 'zod';
import type { PressureUnit } from '~/units';
import { differenceField, nameField } from './form/typed-fields';
import { longestName } from './new-coach-schema';

/** The least that a gauge tells apart, and the most that leaves "80 %" apart from it, kPa. */
const toleranceRange = { minimum: 2, maximum: 50 };

const exampleTolerance: Record<PressureUnit, string> = {
  psi: '2 psi',
  kPa: '15 kPa',
  bar: '0.15 bar',
};

export const settingsSchema = (unit: PressureUnit) =>
  z.object({
    name: nameField('a name for the coach', longestName),
    toleranceKpa: differenceField(
      unit,
      { what: 'the tolerance', example: exampleTolerance[unit] },
      toleranceRange,
    ).transform(Number),
  });

/** The coach's name typed once more, so that no slip removes it. */
export const removalSchema = (name: string) =>
  z.object({
    confirm: z
      .string(`Type “${name}” to remove it.`)
      .refine((typed) => typed.trim().toLowerCase() === name.toLowerCase(), {
        error: `Type “${name}” to remove it.`,
      }),
  });
