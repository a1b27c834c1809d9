import { redirect, useSearchParams } from 'react-router';
import type { Actor } from '~/access/can';
import { recordFittingTest } from '~/commands/record-fitting-test.server';
import { updateCoach } from '~/commands/update-coach.server';
import { updateRig } from '~/commands/update-rig.server';
import { loadLearnedAir } from '~/queries/air-profile.server';
import { loadCoach } from '~/queries/coach.server';
import { requireCoach } from '~/queries/coach-access.server';
import { pageAnswers } from '~/services/answers.server';
import { requireViewer } from '~/services/viewer.server';
import type { PressureUnit } from '~/units';
import type { Route } from './+types/coach-air';
import { fittingSchema, lowerSchema, rigSchema } from './air-schema';
import { FittingTest } from './fitting-test';
import { sendBack } from './form/answer-form.server';
import { type FormValues, formValues, readForm } from './form/read-form';
import { LearnedAirWords } from './learned-air';
import { LowerForm } from './lower-form';
import { RigForm } from './rig-form';

export const loader = pageAnswers(async ({ context, request, params }: Route.LoaderArgs) => {
  const { actor, pressureUnit } = await requireViewer(context, request);
  const coach = await loadCoach(actor, params.coachId);
  const learned = coach.maySeeLog ? await loadLearnedAir(coach.id) : null;
  return { coach, learned, unit: pressureUnit, now: new Date() };
});

export const action = pageAnswers(async ({ context, request, params }: Route.ActionArgs) => {
  const { actor, pressureUnit } = await requireViewer(context, request);
  await requireCoach(actor, 'records:edit', params.coachId);
  const values = formValues(await request.formData(), ['lowerBy']);
  const read = await keep(actor, params.coachId, values, pressureUnit);
  return read.ok ? redirect(`?saved=${values.intent}#${values.intent}`) : sendBack(read.answer);
});

/** Keeps the form that was sent; each section of the page is one. */
async function keep(actor: Actor, coachId: string, values: FormValues, unit: PressureUnit) {
  if (values.intent === 'fitting') {
    const read = readForm(fittingSchema, values);
    if (read.ok) await recordFittingTest(actor, { coachId, ...read.data });
    return read;
  }
  if (values.intent === 'lowering') {
    const read = readForm(lowerSchema, values);
    if (read.ok) await updateCoach(actor, { coachId, ...read.data });
    return read;
  }
  const read = readForm(rigSchema(unit), values);
  if (read.ok) await updateRig(actor, { coachId, ...read.data });
  return read;
}

export default function CoachAir({ loaderData, actionData: answer }: Route.ComponentProps) {
  const { coach, learned, unit, now } = loaderData;
  const [search] = useSearchParams();
  const section = (intent: string) => ({
    coach,
    unit,
    now,
    answer: answer?.values.intent === intent ? answer : undefined,
    saved: search.get('saved') === intent && !answer,
  });
  return (
    <>
      <h1>Air</h1>
      <p className="mt-3 mb-8 max-w-[34rem]">
        What stands between the supply and the tire, and what has been learned about it.
      </p>
      <div className="grid items-start gap-x-18 gap-y-14 lg:grid-cols-2">
        <RigForm {...section('rig')} />
        <div className="grid gap-14">
          <LowerForm {...section('lowering')} />
          <FittingTest {...section('fitting')} />
          <LearnedAirWords learned={learned} unit={unit} now={now} />
        </div>
      </div>
    </>
  );
}

export const meta: Route.MetaFunction = () => [{ title: 'Air · Valveside' }];
