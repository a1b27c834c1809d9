import { Form, redirect, useSearchParams } from 'react-router';
import { setTargets } from '~/commands/set-targets.server';
import { Button } from '~/components/button';
import { PressureField } from '~/components/form/field';
import { FormErrors } from '~/components/form/form-errors';
import { axleName, axleOf, axlesOf } from '~/loads';
import { loadAxleTargets } from '~/queries/axle-targets.server';
import { loadCoach } from '~/queries/coach.server';
import { requireCoach } from '~/queries/coach-access.server';
import { loadFittedTires } from '~/queries/fitted-tires.server';
import { pageAnswers } from '~/services/answers.server';
import { requireViewer } from '~/services/viewer.server';
import { formatPressure, gaugeKpa } from '~/units';
import { shownPressure } from '../rounds/verdict-words';
import type { Route } from './+types/coach-targets';
import { dayWords } from './coach-words';
import { runForForm, sendBack } from './form/answer-form.server';
import { formValues, problemOf, readForm, shownValue } from './form/read-form';
import { Saved } from './form/saved';
import { targetsSchema } from './targets-schema';

export const loader = pageAnswers(async ({ context, request, params }: Route.LoaderArgs) => {
  const { actor, pressureUnit } = await requireViewer(context, request);
  const coach = await loadCoach(actor, params.coachId);
  const [targets, tires] = await Promise.all([
    loadAxleTargets(coach.id),
    loadFittedTires(coach.id),
  ]);
  return { coach, targets, tires, unit: pressureUnit, now: new Date() };
});

export const action = pageAnswers(async ({ context, request, params }: Route.ActionArgs) => {
  const { actor, pressureUnit: unit } = await requireViewer(context, request);
  const { coachId } = params;
  await requireCoach(actor, 'records:edit', coachId);
  const { layout } = await loadCoach(actor, coachId);
  const values = formValues(await request.formData());
  const read = readForm(targetsSchema(layout, unit), values);
  if (!read.ok) return sendBack(read.answer);
  const done = await runForForm(values, () =>
    setTargets(actor, { coachId, targets: read.data, unit }),
  );
  return done.ok ? redirect('?saved=yes') : sendBack(done.answer);
});

type TargetsData = Route.ComponentProps['loaderData'];

export default function CoachTargets({ loaderData, actionData: answer }: Route.ComponentProps) {
  const { coach, unit } = loaderData;
  const [search] = useSearchParams();
  return (
    <>
      <h1>Targets</h1>
      <p className="mt-3 mb-8 max-w-[34rem]">
        The cold pressure of each axle, by the tire maker’s load table for its heavier end. A target
        never moves with the day’s temperature. Readings keep the target of their day.
      </p>
      <Form method="post" className="form" noValidate>
        <FormErrors errors={answer?.problems ?? []} />
        <Saved when={search.get('saved') === 'yes' && !answer}>The targets are kept.</Saved>
        {axlesOf(coach.layout).map((axle) => (
          <PressureField
            key={axle}
            label={`${axleName(axle)} axle`}
            name={axle}
            unit={unit}
            readOnly={!coach.mayEdit}
            hint={limitWords(loaderData, axle)}
            defaultValue={shownValue(answer, axle, storedTarget(loaderData, axle))}
            error={problemOf(answer, axle)}
          />
        ))}
        {coach.mayEdit && <Button kind="main">Keep the targets</Button>}
      </Form>
    </>
  );
}

function storedTarget({ targets, unit }: TargetsData, axle: string): string | undefined {
  const kpa = targets.find((target) => target.axle === axle)?.targetKpa;
  if (kpa === undefined) return undefined;
  return formatPressure(gaugeKpa(kpa), unit, { withUnit: false, trim: true });
}

/** "At most 120 psi: the tire’s limit. Set 3 March." */
function limitWords({ tires, targets, unit, now }: TargetsData, axle: string): string {
  const onAxle = tires.filter((tire) => axleOf(tire.position) === axle);
  const sidewall = Math.min(...onAxle.map((tire) => tire.sidewallLimitKpa));
  const wheel = Math.min(...onAxle.map((tire) => tire.wheelLimitKpa));
  const whose = sidewall <= wheel ? 'sidewall' : 'wheel';
  const set = targets.find((target) => target.axle === axle)?.setAt;
  const since = set ? ` Set ${dayWords(set, now)}.` : '';
  return `At most ${shownPressure(Math.min(sidewall, wheel), unit)}, by the ${whose}.${since}`;
}

export const meta: Route.MetaFunction = () => [{ title: 'Targets · Valveside' }];
