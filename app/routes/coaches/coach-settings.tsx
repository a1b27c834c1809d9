import { Form, redirect, useSearchParams } from 'react-router';
import { removeCoach } from '~/commands/remove-coach.server';
import { updateCoach } from '~/commands/update-coach.server';
import { Button } from '~/components/button';
import { Field, PressureField } from '~/components/form/field';
import { FormErrors } from '~/components/form/form-errors';
import { loadCoach } from '~/queries/coach.server';
import { requireCoach } from '~/queries/coach-access.server';
import { pageAnswers } from '~/services/answers.server';
import { requireViewer } from '~/services/viewer.server';
import { formatPressureDifference, kpaDifference } from '~/units';
import type { Route } from './+types/coach-settings';
import { sendBack } from './form/answer-form.server';
import { type FormAnswer, formValues, problemOf, readForm, shownValue } from './form/read-form';
import { Saved } from './form/saved';
import { removalSchema, settingsSchema } from './settings-schema';

export const loader = pageAnswers(async ({ context, request, params }: Route.LoaderArgs) => {
  const { actor, pressureUnit } = await requireViewer(context, request);
  return { coach: await loadCoach(actor, params.coachId), unit: pressureUnit };
});

export const action = pageAnswers(async ({ context, request, params }: Route.ActionArgs) => {
  const { actor, pressureUnit } = await requireViewer(context, request);
  const { coachId } = params;
  await requireCoach(actor, 'records:edit', coachId);
  const { name } = await loadCoach(actor, coachId);
  const values = formValues(await request.formData());
  if (values.intent === 'remove') {
    const read = readForm(removalSchema(name), values);
    if (!read.ok) return sendBack(read.answer);
    await removeCoach(actor, { coachId });
    return redirect('/coaches');
  }
  const read = readForm(settingsSchema(pressureUnit), values);
  if (!read.ok) return sendBack(read.answer);
  await updateCoach(actor, { coachId, ...read.data });
  return redirect('?saved=yes');
});

export default function CoachSettings({ loaderData, actionData: answer }: Route.ComponentProps) {
  const { coach, unit } = loaderData;
  const [search] = useSearchParams();
  const about = (intent: string) => (answer?.values.intent === intent ? answer : undefined);
  const settings = about('settings');
  const tolerance = formatPressureDifference(kpaDifference(coach.toleranceKpa), unit, {
    withUnit: false,
    trim: true,
  });
  return (
    <>
      <h1 className="mb-8">Settings</h1>
      <Form method="post" className="form" noValidate>
        <FormErrors errors={settings?.problems ?? []} />
        <Saved when={search.get('saved') === 'yes' && !answer}>The settings are kept.</Saved>
        <Field
          label="Name"
          name="name"
          autoComplete="off"
          readOnly={!coach.mayEdit}
          defaultValue={shownValue(settings, 'name', coach.name)}
          error={problemOf(settings, 'name')}
        />
        <PressureField
          label="Tolerance"
          name="toleranceKpa"
          hint="How far from its target a tire may be and still hold."
          unit={unit}
          readOnly={!coach.mayEdit}
          defaultValue={shownValue(settings, 'toleranceKpa', tolerance)}
          error={problemOf(settings, 'toleranceKpa')}
        />
        {coach.mayEdit && (
          <Button kind="main" name="intent" value="settings">
            Keep the settings
          </Button>
        )}
      </Form>
      {coach.mayRemove && <Removal name={coach.name} answer={about('remove')} />}
    </>
  );
}

function Removal({ name, answer }: { name: string; answer: FormAnswer | undefined }) {
  return (
    <Form method="post" className="form hair mt-14 pt-8" noValidate>
      <div>
        <h2>Remove this coach</h2>
        <p>Nobody sees it any more: not its tires, not its rounds, not its fills.</p>
      </div>
      <FormErrors errors={answer?.problems ?? []} />
      <Field
        label="Its name, to be sure"
        name="confirm"
        hint={`Type “${name}”.`}
        autoComplete="off"
        defaultValue={shownValue(answer, 'confirm')}
        error={problemOf(answer, 'confirm')}
      />
      <Button className="justify-self-start" name="intent" value="remove">
        Remove the coach
      </Button>
    </Form>
  );
}

export const meta: Route.MetaFunction = () => [{ title: 'Settings · Valveside' }];
