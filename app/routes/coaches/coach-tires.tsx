import { redirect, useSearchParams } from 'react-router';
import { correctTire, replaceTire, swapTires } from '~/commands/update-tires.server';
import { DataTable } from '~/components/data-table';
import { positionsOf } from '~/loads';
import { loadCoach } from '~/queries/coach.server';
import { requireCoach } from '~/queries/coach-access.server';
import { loadFittedTires } from '~/queries/fitted-tires.server';
import { pageAnswers } from '~/services/answers.server';
import { requireViewer } from '~/services/viewer.server';
import type { Route } from './+types/coach-tires';
import { ChangeTire } from './change-tire';
import { runForForm, sendBack } from './form/answer-form.server';
import { formValues, readForm } from './form/read-form';
import { Saved } from './form/saved';
import { tireColumns } from './tire-columns';
import { moveSchema, tireChangeSchema } from './tire-schema';

export const loader = pageAnswers(async ({ context, request, params }: Route.LoaderArgs) => {
  const { actor, pressureUnit } = await requireViewer(context, request);
  const coach = await loadCoach(actor, params.coachId);
  const fitted = await loadFittedTires(coach.id);
  const tires = positionsOf(coach.layout).flatMap(
    (position) => fitted.find((tire) => tire.position === position) ?? [],
  );
  return { coach, tires, unit: pressureUnit, now: new Date() };
});

export const action = pageAnswers(async ({ context, request, params }: Route.ActionArgs) => {
  const { actor, pressureUnit: unit } = await requireViewer(context, request);
  const { coachId } = params;
  await requireCoach(actor, 'records:edit', coachId);
  const values = formValues(await request.formData());
  const move = values.intent === 'move';
  const read = move
    ? readForm(moveSchema, values)
    : readForm(tireChangeSchema(unit, values), values);
  if (!read.ok) return sendBack(read.answer);
  const done = await runForForm(values, () => {
    if ('with' in read.data) return swapTires(actor, { coachId, unit, ...read.data });
    const change = read.data.what === 'replaced' ? replaceTire : correctTire;
    return change(actor, { coachId, unit, position: read.data.position, tire: read.data.tire });
  });
  return done.ok ? redirect('?saved=yes') : sendBack(done.answer);
});

export default function CoachTires({ loaderData, actionData: answer }: Route.ComponentProps) {
  const { coach, tires, unit, now } = loaderData;
  const [search] = useSearchParams();
  const chosen = answer?.values.position ?? search.get('tire') ?? '';
  const tire = tires.find(({ position }) => position === chosen);
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-8">
      <div>
        <h1>Tires</h1>
        <p className="mt-3 max-w-[34rem]">
          What is fitted now. A tire that goes keeps its readings and fills.
        </p>
      </div>
      <Saved when={search.get('saved') === 'yes' && !answer}>The tires are kept.</Saved>
      {coach.mayEdit && tire && (
        <ChangeTire key={tire.tireId} tire={tire} tires={tires} unit={unit} answer={answer} />
      )}
      <DataTable
        columns={tireColumns({ unit, now, mayEdit: coach.mayEdit })}
        rows={tires}
        rowKey={({ tireId }) => tireId}
      />
    </div>
  );
}

export const meta: Route.MetaFunction = () => [{ title: 'Tires · Valveside' }];
