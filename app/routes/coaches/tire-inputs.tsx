import { useState } from 'react';
import { Field, PressureField } from '~/components/form/field';
import type { PressureUnit } from '~/units';
import { type FormAnswer, problemOf, shownValue } from './form/read-form';
import { estimateFor } from './tire-schema';

export interface TireInputsProps {
  unit: PressureUnit;
  answer: FormAnswer | undefined;
  /** Set before each name: "steer." */
  prefix?: string;
  /** What is stored, as the person reads it. */
  stored?: { size: string; sidewallLimit: string; wheelLimit: string; volume: string };
}

/** Size, limits and volume of a tire, the same for one and for all of an axle. */
export function TireInputs({ unit, answer, prefix = '', stored }: TireInputsProps) {
  const field = (name: keyof NonNullable<TireInputsProps['stored']>) => ({
    name: prefix + name,
    error: problemOf(answer, prefix + name),
    defaultValue: shownValue(answer, prefix + name, stored?.[name]),
  });
  const [size, setSize] = useState(field('size').defaultValue ?? '');
  return (
    <>
      <Field
        label="Tire size"
        hint="As on the sidewall, for example 295/75R22.5."
        autoComplete="off"
        autoCapitalize="characters"
        spellCheck={false}
        onChange={(event) => setSize(event.currentTarget.value)}
        {...field('size')}
      />
      <PressureField
        label="Sidewall limit"
        hint="The highest cold pressure moulded on the tire."
        unit={unit}
        {...field('sidewallLimit')}
      />
      <PressureField
        label="Wheel limit"
        hint="The highest pressure stamped on the wheel."
        unit={unit}
        {...field('wheelLimit')}
      />
      <Field
        label="Volume of air"
        hint={volumeHint(size)}
        unit="L"
        inputMode="decimal"
        autoComplete="off"
        {...field('volume')}
      />
    </>
  );
}

/** Follows the size while it is typed; without script it says what happens. */
function volumeHint(size: string): string {
  const estimate = estimateFor(size);
  if (!estimate.ok) return 'Leave it empty: it is estimated from the size.';
  return `About ${estimate.volumeL} L by its size. Type another figure if you know it.`;
}
