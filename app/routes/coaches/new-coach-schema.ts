import { z } from 'zod';
import { type Axle, axleLayouts, axlesOf } from '~/loads';
import type { PressureUnit } from '~/units';
import { type FormValues, readForm } from './form/read-form';
import { limitField, nameField } from './form/typed-fields';
import { describeTire, tireFields } from './tire-schema';

/** How far off target still counts as on it, kPa: two graduations of a common gauge. Practice. */
export const usualToleranceKpa: Record<PressureUnit, number> = {
  psi: 2 * 6.894757293168361,
  kPa: 15,
  bar: 15,
};

/** Longest name of a coach, characters. */
export const longestName = 80;

/** One axle of the form; in the form its fields are named `<axle>.<field>`. */
const axleSchema = (unit: PressureUnit, values: FormValues) =>
  z
    .object({
      ...tireFields(unit, values),
      target: limitField(unit, 'the target cold pressure'),
    })
    .transform(({ target, ...tire }) => ({ ...describeTire(tire), targetKpa: target as number }));

/** Reads the first form of a coach: what `createCoach` takes, or the form with its problems. */
export function readNewCoach(values: FormValues, unit: PressureUnit) {
  const layout = values.layout === 'with-tag' ? 'with-tag' : 'two-axles';
  const axles = Object.fromEntries(
    axlesOf(layout).map((axle) => [axle, axleSchema(unit, fieldsOf(values, axle))]),
  ) as Record<Axle, ReturnType<typeof axleSchema>>;
  const schema = z.object({
    name: nameField('a name for the coach', longestName),
    layout: z.enum(axleLayouts, 'Choose how many axles the coach has.'),
    ...axles,
  });
  const nested = { ...values, ...byAxle(values) };
  const read = readForm(schema, nested as FormValues);
  if (!read.ok) return { ok: false as const, answer: { ...read.answer, values } };
  const { name, layout: chosen, ...given } = read.data;
  return {
    ok: true as const,
    data: { name, layout: chosen, axles: given, toleranceKpa: usualToleranceKpa[unit], unit },
  };
}

const fieldsOf = (values: FormValues, axle: Axle): FormValues => ({
  size: values[`${axle}.size`] ?? '',
  sidewallLimit: values[`${axle}.sidewallLimit`] ?? '',
  wheelLimit: values[`${axle}.wheelLimit`] ?? '',
  target: values[`${axle}.target`] ?? '',
  volume: values[`${axle}.volume`] ?? '',
});

const byAxle = (values: FormValues) =>
  Object.fromEntries(axlesOf('with-tag').map((axle) => [axle, fieldsOf(values, axle)]));
