import { Form, redirect } from 'react-router';
import { createCoach } from '~/commands/create-coach.server';
import { Button } from '~/components/button';
import { ChoiceField } from '~/components/form/choice-field';
import { Field, PressureField } from '~/components/form/field';
import { FormErrors } from '~/components/form/form-errors';
import { PageShell } from '~/components/shell/page-shell';
import { type Axle, axleName, axlesOf } from '~/loads';
import { pageAnswers } from '~/services/answers.server';
import { requireViewer } from '~/services/viewer.server';
import type { PressureUnit } from '~/units';
import type { Route } from './+types/new-coach';
import { runForForm, sendBack } from './form/answer-form.server';
import { type FormAnswer, formValues, problemOf, shownValue } from './form/read-form';
import { readNewCoach } from './new-coach-schema';
import { TireInputs } from './tire-inputs';

export const loader = pageAnswers(async ({ context, request }: Route.LoaderArgs) => {
  const { pressureUnit } = await requireViewer(context, request);
  return { unit: pressureUnit };
});

export const action = pageAnswers(async ({ context, request }: Route.ActionArgs) => {
  const { actor, pressureUnit } = await requireViewer(context, request);
  const values = formValues(await request.formData());
  const read = readNewCoach(values, pressureUnit);
  if (!read.ok) return sendBack(read.answer);
  const made = await runForForm(values, () => createCoach(actor, read.data));
  return made.ok ? redirect(`/coaches/${made.result.coachId}`) : sendBack(made.answer);
});

export default function NewCoach({ loaderData, actionData: answer }: Route.ComponentProps) {
  const { unit } = loaderData;
  return (
    <PageShell narrow>
      <h1>A new coach</h1>
      <p className="mt-3 mb-8">
        Say how it stands and what its tires may hold. Hose, chuck and gauge come after.
      </p>
      <Form method="post" className="form group" noValidate>
        <FormErrors errors={answer?.problems ?? []} />
        <Field
          label="Name"
          name="name"
          hint="As you call it."
          autoComplete="off"
          defaultValue={shownValue(answer, 'name')}
          error={problemOf(answer, 'name')}
        />
        <ChoiceField
          label="Axles"
          name="layout"
          choices={[
            { value: 'two-axles', label: 'Two', hint: 'Steer, and drive with duals. Six tires.' },
            { value: 'with-tag', label: 'Three', hint: 'A tag axle behind them. Eight tires.' },
          ]}
          defaultValue={shownValue(answer, 'layout', 'two-axles')}
          error={problemOf(answer, 'layout')}
        />
        {axlesOf('with-tag').map((axle) => (
          <AxleFields key={axle} axle={axle} unit={unit} answer={answer} />
        ))}
        <Button kind="main">Make the coach</Button>
      </Form>
    </PageShell>
  );
}

interface AxleFieldsProps {
  axle: Axle;
  unit: PressureUnit;
  answer: FormAnswer | undefined;
}

// The tag axle's fields go by the choice above them in CSS alone, so that they do without script.
const onlyWithTag = 'group-has-[[value=two-axles]:checked]:hidden';

function AxleFields({ axle, unit, answer }: AxleFieldsProps) {
  const target = `${axle}.target`;
  return (
    <fieldset
      className={`hair grid items-end gap-6 pt-6 sm:grid-cols-2 ${axle === 'tag' ? onlyWithTag : ''}`}
    >
      <legend className="float-left w-full sm:col-span-2">
        <h2>{axleName(axle)} axle</h2>
      </legend>
      <p className="quiet -mt-4 sm:col-span-2">
        For all of its tires. You can change single ones later.
      </p>
      <PressureField
        label="Target, cold"
        hint="By the tire maker’s table, for the heavier end of this axle."
        unit={unit}
        name={target}
        defaultValue={shownValue(answer, target)}
        error={problemOf(answer, target)}
      />
      <TireInputs unit={unit} answer={answer} prefix={`${axle}.`} />
    </fieldset>
  );
}

export const meta: Route.MetaFunction = () => [{ title: 'A new coach · Valveside' }];
