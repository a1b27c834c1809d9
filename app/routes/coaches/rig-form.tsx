import { Form, Link } from 'react-router';
import { Button } from '~/components/button';
import { ChoiceField } from '~/components/form/choice-field';
import { Field, PressureField } from '~/components/form/field';
import { FormErrors } from '~/components/form/form-errors';
import { defaultStepKpa, formatPressureDifference, kpaDifference } from '~/units';
import type { gaugePlaces } from './air-schema';
import type { AirSection } from './air-section';
import { problemOf, shownValue } from './form/read-form';
import { Saved } from './form/saved';

const places: { value: (typeof gaugePlaces)[number]; label: string; hint: string }[] = [
  {
    value: 'above-valve',
    label: 'On the hose, before the ball valve',
    hint: 'With the valve shut it reads the supply.',
  },
  {
    value: 'at-chuck',
    label: 'At the chuck, or on a hose without a valve',
    hint: 'While air moves it reads between supply and tire.',
  },
  {
    value: 'below-valve',
    label: 'Between the ball valve and the chuck',
    hint: 'With the valve shut it reads the tire.',
  },
  {
    value: 'dash-only',
    label: 'Nowhere: only the dash gauge',
    hint: 'It is coarse and less exact.',
  },
];

/** Hose, chuck and gauge. What is learned belongs to these three. */
export function RigForm({ coach, unit, answer, saved }: AirSection) {
  const { rig, mayEdit } = coach;
  const text = (name: 'hose' | 'chuck' | 'gauge', label: string, hint: string) => (
    <Field
      label={label}
      name={name}
      hint={hint}
      autoComplete="off"
      readOnly={!mayEdit}
      defaultValue={shownValue(answer, name, rig?.[name])}
      error={problemOf(answer, name)}
    />
  );
  const step = formatPressureDifference(kpaDifference(rig?.stepKpa ?? defaultStepKpa(unit)), unit, {
    withUnit: false,
    trim: true,
  });
  return (
    <Form method="post" action="#rig" className="form" id="rig" noValidate>
      <div>
        <h2 className="mb-2">Hose, chuck and gauge</h2>
        <p>
          Name them as you call them. What is learned belongs to these three.{' '}
          <Link to="/help/rig">What a good rig is</Link>
        </p>
      </div>
      <FormErrors errors={answer?.problems ?? []} />
      <Saved when={saved}>The rig is kept.</Saved>
      {text('hose', 'Hose', 'For example: grey, 15 m. Rated 200 psi or more.')}
      {text('chuck', 'Chuck', 'One that shuts by itself and holds by itself.')}
      {text('gauge', 'Gauge', 'One that spans at least 160 psi.')}
      <fieldset disabled={!mayEdit} className="contents">
        <ChoiceField
          label="Where the gauge sits"
          name="gaugePlace"
          choices={places}
          defaultValue={shownValue(answer, 'gaugePlace', rig?.gaugePlace)}
          error={problemOf(answer, 'gaugePlace')}
        />
        <ChoiceField
          label="A ball valve in the hose"
          name="hasValve"
          choices={[
            { value: 'yes', label: 'Yes', hint: 'The chuck goes on with the valve shut.' },
            { value: 'no', label: 'No' },
          ]}
          defaultValue={shownValue(
            answer,
            'hasValve',
            rig ? (rig.hasValve ? 'yes' : 'no') : undefined,
          )}
          error={problemOf(answer, 'hasValve')}
        />
      </fieldset>
      <PressureField
        label="One graduation of the gauge"
        name="stepKpa"
        hint="From one mark to the next."
        unit={unit}
        readOnly={!mayEdit}
        defaultValue={shownValue(answer, 'stepKpa', step)}
        error={problemOf(answer, 'stepKpa')}
      />
      {mayEdit && (
        <Button name="intent" value="rig">
          Keep the rig
        </Button>
      )}
    </Form>
  );
}
