import { useState } from 'react';
import { Form } from 'react-router';
import { Button } from '~/components/button';
import { ChoiceField } from '~/components/form/choice-field';
import { FormErrors } from '~/components/form/form-errors';
import { closeRound } from '~/fill/commands';
import { afterwardsKeys } from '~/fill/wire';
import { type FormAnswer, formValues, problemOf, readForm } from '../coaches/form/read-form';
import { afterwardsWords } from './afterwards-words';
import type { RoundView } from './round-data';
import { closingSchema } from './round-schema';

export interface AfterwardsProps {
  view: RoundView;
  answer: FormAnswer | undefined;
}

/** The list without which no round closes. */
export function Afterwards({ view, answer: told }: AfterwardsProps) {
  const { round, openFill } = view;
  const [own, setOwn] = useState<FormAnswer>();
  const answer = own ?? told;
  const close = (form: FormData) => {
    const read = readForm(closingSchema, formValues(form, ['afterwards']));
    if (!read.ok) return setOwn(read.answer);
    closeRound(round.id, read.data.afterwards);
    window.scrollTo(0, 0);
  };
  return (
    <section className="mt-8 grid gap-4">
      <h2>Afterwards</h2>
      {openFill ? (
        <p>End the open fill first.</p>
      ) : (
        <Form
          method="post"
          className="form"
          noValidate
          onSubmit={(event) => {
            event.preventDefault();
            close(new FormData(event.currentTarget));
          }}
        >
          <FormErrors errors={answer?.problems.filter(({ name }) => name === 'afterwards') ?? []} />
          <ChoiceField
            label="Tick each when it is so"
            name="afterwards"
            pick="many"
            choices={afterwardsKeys.map((key) => ({ value: key, label: afterwardsWords[key] }))}
            defaultValue={answer?.values.afterwards}
            error={problemOf(answer, 'afterwards')}
          />
          <Button kind="main" name="intent" value="close">
            Close the round
          </Button>
        </Form>
      )}
    </section>
  );
}
