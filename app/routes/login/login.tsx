import { data, Form, redirect } from 'react-router';
import { Button } from '~/components/button';
import { Field } from '~/components/form/field';
import { FormErrors } from '~/components/form/form-errors';
import { PageShell } from '~/components/shell/page-shell';
import {
  type FormAnswer,
  formValues,
  problemOf,
  readForm,
  shownValue,
} from '~/routes/coaches/form/read-form';
import { localPath } from '~/services/local-path.server';
import { Refusal } from '~/services/refusal.server';
import { askForCode, firstPage } from '~/services/sign-in.server';
import { viewerOf } from '~/services/viewer.server';
import type { Route } from './+types/login';
import { askSchema } from './login.schema';

export async function loader({ context, request }: Route.LoaderArgs) {
  const to = localPath(new URL(request.url).searchParams.get('to'), firstPage);
  if (await viewerOf(context)) throw redirect(to);
  return { to };
}

export async function action({ request }: Route.ActionArgs) {
  const values = formValues(await request.formData());
  const read = readForm(askSchema, values);
  if (!read.ok) return data(read.answer, { status: 400 });
  try {
    return await askForCode(request, read.data);
  } catch (thrown) {
    if (!(thrown instanceof Refusal)) throw thrown;
    const answer: FormAnswer = { values, problems: [{ message: thrown.words }] };
    return data(answer, { status: thrown.status });
  }
}

export default function Login({ loaderData, actionData: answer }: Route.ComponentProps) {
  return (
    <PageShell narrow>
      <h1>Sign in</h1>
      <p className="mt-3 mb-8">
        Type your e-mail address. A code of six digits comes by mail. The first time, this makes
        your account.
      </p>
      <Form method="post" className="form" noValidate>
        <FormErrors errors={answer?.problems ?? []} />
        <input type="hidden" name="to" value={shownValue(answer, 'to', loaderData.to)} />
        <Field
          label="E-mail address"
          name="email"
          type="email"
          autoComplete="email"
          autoCapitalize="none"
          spellCheck={false}
          defaultValue={shownValue(answer, 'email')}
          error={problemOf(answer, 'email')}
        />
        <Button kind="main">Send the code</Button>
      </Form>
    </PageShell>
  );
}

export const meta: Route.MetaFunction = () => [{ title: 'Sign in · Valveside' }];
