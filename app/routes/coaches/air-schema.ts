import { z } from 'zod';
import type { PressureUnit } from '~/units';
import { differenceField, nameField } from './form/typed-fields';

/** Longest name of a hose, chuck or gauge, characters. */
const longestName = 60;

/** Finer than any hand gauge, and coarser, kPa. */
const stepRange = { minimum: 0.5, maximum: 100 };

const exampleStep: Record<PressureUnit, string> = { psi: '1 psi', kPa: '10 kPa', bar: '0.1 bar' };

export const gaugePlaces = ['above-valve', 'at-chuck', 'below-valve', 'dash-only'] as const;
export const fittingOutcomes = ['follows-supply', 'accessory-tank', 'no-air'] as const;

/** Hose, chuck and gauge. */
export const rigSchema = (unit: PressureUnit) =>
  z
    .object({
      hose: nameField('a name for the hose', longestName),
      chuck: nameField('a name for the chuck', longestName),
      gauge: nameField('a name for the gauge', longestName),
      gaugePlace: z.enum(gaugePlaces, 'Say where the gauge sits.'),
      hasValve: z
        .enum(['yes', 'no'], 'Say whether there is a ball valve.')
        .transform((yes) => yes === 'yes'),
      stepKpa: differenceField(
        unit,
        { what: 'one graduation of the gauge', example: exampleStep[unit] },
        stepRange,
      ).transform(Number),
    })
    .refine(({ gaugePlace, hasValve }) => hasValve || !needsValve(gaugePlace), {
      path: ['gaugePlace'],
      error: 'This place speaks of a valve. Choose another, or say that there is one.',
    });

const needsValve = (place: (typeof gaugePlaces)[number]) =>
  place === 'above-valve' || place === 'below-valve';

/** The ways in which the supply may be brought down; none is an answer too. */
export const lowerSchema = z.object({
  lowerBy: z.array(z.enum(['pedal', 'drain'], 'Choose among the ways that are offered.')),
});

export const fittingSchema = z.object({
  outcome: z.enum(fittingOutcomes, 'Say what the gauge did.'),
});
