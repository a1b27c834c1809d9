import { z } from 'zod';
import { estimateTireVolume, parseTireSize, type TireSizeProblem, wheelPositions } from '~/loads';
import type { Litres, PressureUnit } from '~/units';
import type { FormValues } from './form/read-form';
import { limitField, nameField, volumeField } from './form/typed-fields';

/** Longest size that is kept, characters. */
const longestSize = 40;

const sizeWords: Record<TireSizeProblem, string> = {
  empty: 'Type the size as it stands on the sidewall, for example 295/75R22.5.',
  'not-a-size': 'This does not read as a tire size. Type it as on the sidewall: 295/75R22.5.',
  'diameter-first':
    'A size that begins with the diameter gives no volume. Type the volume of air too.',
  'width-implausible': 'The first number is no tire’s width. A digit may be missing or doubled.',
  'aspect-implausible': 'The number after the stroke should be from 25 to 100.',
  'rim-implausible': 'The last number should be the rim’s diameter, from 12 to 26 inches.',
  'suffix-unknown': 'Leave out what stands behind the rim’s diameter.',
};

/**
 * The fields of one tire. Where no volume is typed it is estimated from the size, so a size that
 * can't be read is asked for again; beside a typed volume the size may be anything.
 */
export function tireFields(unit: PressureUnit, values: FormValues) {
  const volumeTyped = hasText(values.volume);
  return {
    size: sizeField(volumeTyped),
    sidewallLimit: limitField(unit, 'the highest cold pressure moulded on the sidewall'),
    wheelLimit: limitField(unit, 'the highest pressure stamped on the wheel'),
    volume: volumeTyped ? volumeField() : noVolume,
  };
}

const noVolume = z.any().transform(() => undefined);

const hasText = (value: FormValues[string] | undefined) =>
  typeof value === 'string' && value.trim() !== '';

const sizeField = (volumeTyped: boolean) =>
  nameField('the size as it stands on the sidewall, for example 295/75R22.5', longestSize)
    .superRefine((text, context) => {
      const estimate = estimateFor(text);
      if (volumeTyped || estimate.ok) return;
      context.addIssue({ code: 'custom', message: estimate.message });
    })
    .transform(spelled);

/** What the fields of one tire gave, as the commands take it. */
export function describeTire(fields: {
  size: string;
  sidewallLimit: number;
  wheelLimit: number;
  volume?: number;
}) {
  const estimate = estimateFor(fields.size);
  const volumeL = fields.volume ?? (estimate.ok ? estimate.volumeL : undefined);
  if (volumeL === undefined) throw new RangeError(`size: ${fields.size} gives no volume`);
  return {
    size: fields.size,
    sidewallLimitKpa: fields.sidewallLimit,
    wheelLimitKpa: fields.wheelLimit,
    volumeL: volumeL as number,
    volumeSource: fields.volume === undefined ? ('estimated' as const) : ('typed' as const),
  };
}

type Estimate = { ok: true; volumeL: Litres } | { ok: false; message: string };

/** The volume of a size as typed, or why it can't be said. */
export function estimateFor(text: string): Estimate {
  const parsed = parseTireSize(text);
  if (!parsed.ok) return { ok: false, message: sizeWords[parsed.problem] };
  const estimate = estimateTireVolume(parsed.size);
  return estimate
    ? { ok: true, volumeL: estimate.volumeL }
    : { ok: false, message: sizeWords['not-a-size'] };
}

/** One spelling for a size that can be read; another stays as it was typed. */
function spelled(text: string): string {
  const parsed = parseTireSize(text);
  return parsed.ok ? parsed.size.code : text;
}

const positionField = z.enum(wheelPositions, 'Choose a tire of this coach.');

/** One tire described anew, and whether it is another tire. */
export const tireChangeSchema = (unit: PressureUnit, values: FormValues) =>
  z
    .object({
      position: positionField,
      what: z.enum(['corrected', 'replaced'], 'Say what happened.'),
      ...tireFields(unit, values),
    })
    .transform(({ position, what, ...tire }) => ({ position, what, tire: describeTire(tire) }));

/** Two tires that change places. */
export const moveSchema = z.object({
  position: positionField,
  with: z.enum(wheelPositions, 'Choose the place that it goes to.'),
});
