import { z } from 'zod';
import { type AfterwardsKey, afterwardsKeys } from '~/fill/wire';
import type { PressureUnit } from '~/units';
import { readingField } from '../coaches/form/typed-fields';
import { afterwardsWords } from './afterwards-words';

const tireField = z.uuid('Choose a tire of this coach.');

/** What a gauge showed on one tire. */
export const readingSchema = (unit: PressureUnit) =>
  z.object({
    tireId: tireField,
    kpa: readingField(unit).transform(Number),
    warm: z
      .string()
      .optional()
      .transform((ticked) => ticked === 'yes'),
  });

/** The tire that is to be filled now. */
export const fillSchema = z.object({ tireId: tireField });

/** The list of afterwards, all of it ticked. */
export const closingSchema = z.object({
  afterwards: z.array(z.string()).transform((ticked, context): AfterwardsKey[] => {
    const missing = afterwardsKeys.filter((key) => !ticked.includes(key));
    if (missing.length === 0) return [...afterwardsKeys];
    const names = missing.map((key) => afterwardsWords[key]).join(', ');
    context.addIssue({ code: 'custom', message: `Tick the whole list. Still open: ${names}.` });
    return z.NEVER;
  }),
});
