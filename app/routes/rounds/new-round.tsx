import { useState } from 'react';
import { Form, Link, redirect, useNavigate } from 'react-router';
import { startRound as startRoundCommand } from '~/commands/start-round.server';
import { Button } from '~/components/button';
import { FormErrors } from '~/components/form/form-errors';
import { startRound } from '~/fill/commands';
import { newId } from '~/fill/ids';
import { thisPhone } from '~/fill/phone';
import { versioned } from '~/fill/wire';
import { loadCoach, loadRoundHeads } from '~/queries/coach.server';
import { requireCoach } from '~/queries/coach-access.server';
import { loadCoachBasis } from '~/queries/coach-basis.server';
import { pageAnswers } from '~/services/answers.server';
import { requireViewer } from '~/services/viewer.server';
import { dayWords } from '../coaches/coach-words';
import { runForForm, sendBack } from '../coaches/form/answer-form.server';
import { type FormAnswer, formValues, readForm } from '../coaches/form/read-form';
import type { Route } from './+types/new-round';
import { keepRound } from './kept-rounds';
import { newRoundSchema } from './new-round-schema';
import { RoundFields } from './round-fields';

export const loader = pageAnswers(async ({ context, request, params }: Route.LoaderArgs) => {
  const { actor, pressureUnit } = await requireViewer(context, request);
  await requireCoach(actor, 'round:run', params.coachId);
  const { fitting, mayEdit } = await loadCoach(actor, params.coachId);
  const [coach, rounds] = await Promise.all([
    loadCoachBasis(params.coachId),
    loadRoundHeads(params.coachId),
  ]);
  return { coach, fitting, mayEdit, rounds, unit: pressureUnit, now: new Date() };
});

// Without script. With it, the phone starts the round itself and needs no signal.
export const action = pageAnswers(async ({ context, request, params }: Route.ActionArgs) => {
  const { actor, pressureUnit, sessionId } = await requireViewer(context, request);
  const { coachId } = params;
  await requireCoach(actor, 'round:run', coachId);
  const values = formValues(await request.formData());
  const read = readForm(newRoundSchema(pressureUnit), values);
  if (!read.ok) return sendBack(read.answer);
  const roundId = newId();
  const body = { ...read.data, coachId, startedAt: new Date().toISOString(), deviceId: sessionId };
  const done = await runForForm(values, () => startRoundCommand(actor, roundId, versioned(body)));
  return done.ok ? redirect(`/rounds/${roundId}`) : sendBack(done.answer);
});

export default function NewRound({ loaderData, actionData }: Route.ComponentProps) {
  const { coach, rounds, unit, now } = loaderData;
  const [ownAnswer, setOwnAnswer] = useState<FormAnswer>();
  const answer = ownAnswer ?? actionData;
  const navigate = useNavigate();
  const start = (form: FormData) => {
    const read = readForm(newRoundSchema(unit), formValues(form));
    if (!read.ok) return setOwnAnswer(read.answer);
    void navigate(`/rounds/${startHere(loaderData, read.data)}`);
  };
  return (
    <>
      <h1 className="mb-8">A new round</h1>
      {rounds.open && (
        <p className="form-done mb-8">
          The round of {dayWords(rounds.open.startedAt, now, rounds.open.timeZone)} is still open.{' '}
          <Link to={`/rounds/${rounds.open.id}`}>Continue it</Link>
        </p>
      )}
      <Form
        method="post"
        className="form"
        noValidate
        onSubmit={(event) => {
          event.preventDefault();
          start(new FormData(event.currentTarget));
        }}
      >
        <FormErrors errors={answer?.problems ?? []} />
        <RoundFields unit={unit} last={rounds.last} answer={answer} />
        <Button kind="main">Start at {coach.name}</Button>
      </Form>
    </>
  );
}

type Started = ReturnType<typeof newRoundSchema>['_output'];

/** Starts the round on this phone and keeps what its page needs; returns its id. */
function startHere(data: Route.ComponentProps['loaderData'], started: Started): string {
  const { coach, fitting, mayEdit, unit } = data;
  const id = startRound({ coachId: coach.id, ...started });
  const round = thisPhone().store.getState().rounds[id];
  if (round) {
    const none = { fills: [], newestFill: null };
    keepRound({ round, coach, fitting, mayEdit, mayRun: true, unit, ...none });
  }
  return id;
}

export const meta: Route.MetaFunction = () => [{ title: 'A new round · Valveside' }];
