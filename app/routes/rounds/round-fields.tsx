import { useEffect, useState } from 'react';
import { ChoiceField } from '~/components/form/choice-field';
import { Field } from '~/components/form/field';
import type { RoundHead } from '~/queries/coach.server';
import { formatAltitude, metres, type PressureUnit } from '~/units';
import { type FormAnswer, problemOf, shownValue } from '../coaches/form/read-form';
import { placeUnits } from './place-units';

export interface RoundFieldsProps {
  unit: PressureUnit;
  /** The round before: its place is offered, since many rounds are made at one. */
  last: RoundHead | null;
  answer: FormAnswer | undefined;
}

/** Where and when a round is. */
export function RoundFields({ unit, last, answer }: RoundFieldsProps) {
  const { temperature, altitude } = placeUnits(unit);
  const before = last && formatAltitude(metres(last.altitudeM), altitude, { withUnit: false });
  const field = (name: string, stored?: string) => ({
    name,
    defaultValue: shownValue(answer, name, stored),
    error: problemOf(answer, name),
  });
  return (
    <>
      <Field
        label="Place"
        hint="As you call it. It may stay empty."
        autoComplete="off"
        {...field('place', last?.place)}
      />
      <Field
        label="Altitude"
        hint="Roughly. The gauge reads against the air around."
        unit={altitude}
        inputMode="decimal"
        autoComplete="off"
        {...field('altitudeM', before ?? undefined)}
      />
      <Field
        label="Air temperature"
        hint="In the shade, now."
        unit={temperature}
        // A decimal keyboard has no minus on some phones.
        inputMode="text"
        autoComplete="off"
        {...field('ambientC')}
      />
      <ZoneField {...field('timeZone', last?.timeZone)} />
      <ChoiceField
        label="Is a helper in the driver’s seat?"
        choices={[
          {
            value: 'yes',
            label: 'Yes',
            hint: 'Somebody sets fast idle and brings the supply down.',
          },
          {
            value: 'no',
            label: 'No, I am alone',
            hint: 'The calls allow for your way to the seat.',
          },
        ]}
        {...field('withHelper', 'no')}
      />
    </>
  );
}

/** The browser knows its time zone; without script it is asked for. */
function ZoneField({
  name,
  defaultValue,
  error,
}: {
  name: string;
  defaultValue?: string;
  error?: string;
}) {
  const [zone, setZone] = useState<string>();
  useEffect(() => setZone(Intl.DateTimeFormat().resolvedOptions().timeZone), []);
  if (zone) return <input type="hidden" name={name} value={zone} />;
  return (
    <Field
      label="Time zone"
      hint="For example America/Denver."
      autoComplete="off"
      name={name}
      defaultValue={defaultValue ?? 'UTC'}
      error={error}
    />
  );
}
