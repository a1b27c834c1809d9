import { data, Form, Link, redirect } from 'react-router';
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
import { enterCode } from '~/services/sign-in.server';
import { readPending } from '~/services/sign-in-cookies.server';
import type { Route } from './+types/code';
import { codeSchema } from './login.schema';

export async function loader({ request }: Route.LoaderArgs) {
  const pending = await readPending(request);
  if (!pending) throw redirect('/login');
  return { email: pending.email, to: pending.to };
}

export async function action({ request }: Route.ActionArgs) {
  const values = formValues(await request.formData());
  const read = readForm(codeSchema, values);
  if (!read.ok) return data(read.answer, { status: 400 });
  const answer = await enterCode(request, read.data.code);
  if (answer.kind === 'signed-in') throw answer.response;
  const problem =
    answer.kind === 'wrong'
      ? { name: 'code', message: wrongWords(answer.triesLeft) }
      : { message: 'This code does not work any more. Ask for a new one.' };
  const back: FormAnswer = { values, problems: [problem] };
  return data(back, { status: 400 });
}

const wrongWords = (triesLeft: number) =>
  `This is not the code. Type the six digits of the newest mail. ${
    triesLeft === 1 ? 'One try is left.' : `${triesLeft} tries are left.`
  }`;

export default function Code({ loaderData, actionData: answer }: Route.ComponentProps) {
  const { email, to } = loaderData;
  return (
    <PageShell narrow>
      <h1>Type the code</h1>
      <p className="mt-3 mb-8">
        It goes to <strong className="break-words">{email}</strong>. It works once, for ten minutes,
        in this browser.
      </p>
      <Form method="post" className="form" noValidate>
        <FormErrors errors={answer?.problems ?? []} />
        <Field
          label="Code"
          name="code"
          hint="Six digits."
          inputMode="numeric"
          autoComplete="one-time-code"
          autoFocus={!answer}
          defaultValue={shownValue(answer, 'code')}
          error={problemOf(answer, 'code')}
        />
        <Button kind="main">Sign in</Button>
      </Form>
      <section className="hair mt-10 grid gap-4 pt-6">
        <h2>No mail?</h2>
        <p>
          Give it a minute and look among the junk. An address gets five codes an hour at most.
          After that none is sent: try again in an hour.
        </p>
        <Form method="post" action="/login" className="actions">
          <input type="hidden" name="email" value={email} />
          <input type="hidden" name="to" value={to} />
          <Button>Send another code</Button>
          <Link to={`/login?to=${encodeURIComponent(to)}`}>Use another address</Link>
        </Form>
      </section>
    </PageShell>
  );
}

export const meta: Route.MetaFunction = () => [{ title: 'Type the code · Valveside' }];
