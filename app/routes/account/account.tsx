import { Form, redirect } from 'react-router';
import { endLoginSessions } from '~/commands/account-end-sessions.server';
import { saveProfile } from '~/commands/account-save-profile.server';
import { Button } from '~/components/button';
import { ChoiceField } from '~/components/form/choice-field';
import { Field } from '~/components/form/field';
import { FormErrors } from '~/components/form/form-errors';
import { PageShell } from '~/components/shell/page-shell';
import { findDevices } from '~/queries/account-devices.server';
import { sendBack } from '~/routes/coaches/form/answer-form.server';
import {
  type FormAnswer,
  formValues,
  problemOf,
  readForm,
  shownValue,
} from '~/routes/coaches/form/read-form';
import { requireViewer } from '~/services/viewer.server';
import type { Route } from './+types/account';
import { endOneSchema, intentSchema, profileSchema, unitChoices } from './account.schema';
import { agoWords, deviceWords } from './device-words';
import { type DeviceRow, Devices } from './devices';

export async function loader({ context, request }: Route.LoaderArgs) {
  const { email, name, pressureUnit, sessionId, actor } = await requireViewer(context, request);
  const now = new Date();
  const devices: DeviceRow[] = (await findDevices(actor.userId, now)).map((device) => ({
    id: device.id,
    here: device.id === sessionId,
    words: deviceWords(device.userAgent),
    seen: agoWords(device.seenAt, now),
    since: agoWords(device.createdAt, now),
  }));
  devices.sort((left, right) => Number(right.here) - Number(left.here));
  return { email, name, pressureUnit, devices, done: doneOf(request) };
}

export async function action({ context, request }: Route.ActionArgs) {
  const viewer = await requireViewer(context, request);
  const { userId } = viewer.actor;
  const values = formValues(await request.formData());
  const wanted = readForm(intentSchema, values);
  if (!wanted.ok) return sendBack(wanted.answer);
  if (wanted.data.intent === 'save') {
    const profile = readForm(profileSchema, values);
    if (!profile.ok) return sendBack(profile.answer);
    await saveProfile(userId, profile.data);
    return redirect('/account?done=saved');
  }
  if (wanted.data.intent === 'end-others') {
    await endLoginSessions(userId, { allBut: viewer.sessionId });
    return redirect('/account?done=ended');
  }
  const which = readForm(endOneSchema, values);
  if (!which.ok) return sendBack(which.answer);
  await endLoginSessions(userId, { only: which.data.sessionId });
  return redirect('/account?done=ended');
}

const doneWords = { saved: 'Saved.', ended: 'Signed out there.' };

function doneOf(request: Request): string | undefined {
  const done = new URL(request.url).searchParams.get('done') ?? '';
  return Object.hasOwn(doneWords, done) ? doneWords[done as keyof typeof doneWords] : undefined;
}

export default function Account({ loaderData, actionData: answer }: Route.ComponentProps) {
  const { email, devices, done } = loaderData;
  return (
    <PageShell narrow>
      <h1>Account</h1>
      <p className="mt-3 mb-8">
        You are signed in as <strong className="break-words">{email}</strong>.
      </p>
      {done && !answer && (
        <p className="form-done mb-8" role="status">
          {done}
        </p>
      )}
      <Profile profile={loaderData} answer={answer} />
      <Devices devices={devices} />
      <section className="hair mt-10 grid gap-4 pt-6">
        <h2>This browser</h2>
        {/* A whole new page, so that nothing of this person stays in the browser's memory. */}
        <Form method="post" action="/logout" reloadDocument>
          <Button>Sign out</Button>
        </Form>
      </section>
    </PageShell>
  );
}

interface ProfileProps {
  profile: { name: string; pressureUnit: string };
  answer: FormAnswer | undefined;
}

function Profile({ profile, answer }: ProfileProps) {
  return (
    <Form method="post" className="form" noValidate>
      <FormErrors errors={answer?.problems ?? []} />
      <Field
        label="Your name"
        name="name"
        hint="As others on your coach know you."
        autoComplete="name"
        defaultValue={shownValue(answer, 'name', profile.name)}
        error={problemOf(answer, 'name')}
      />
      <ChoiceField
        label="Pressures in"
        name="pressureUnit"
        choices={unitChoices}
        defaultValue={shownValue(answer, 'pressureUnit', profile.pressureUnit)}
        error={problemOf(answer, 'pressureUnit')}
      />
      <Button kind="main" name="intent" value="save">
        Save
      </Button>
    </Form>
  );
}

export const meta: Route.MetaFunction = () => [{ title: 'Account · Valveside' }];
