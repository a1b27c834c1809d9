import { Link, type ShouldRevalidateFunctionArgs, useSearchParams } from 'react-router';
import { OutboxStrip } from '~/components/outbox/outbox-strip';
import { PageShell } from '~/components/shell/page-shell';
import { usePhoneState } from '~/fill/use-phone-state';
import { pageAnswers } from '~/services/answers.server';
import { requireViewer } from '~/services/viewer.server';
import { celsius, formatTemperature } from '~/units';
import { dayWords } from '../coaches/coach-words';
import { type FormAnswer, formValues } from '../coaches/form/read-form';
import type { Route } from './+types/round';
import { CautionStep } from './caution-step';
import { ColdCheckStep } from './cold-check-step';
import { keepRound, keptRound, useKeptRound } from './kept-rounds';
import { placeUnits } from './place-units';
import { type RoundView, viewRound } from './round-data';
import { answerRoundForm } from './round-intents.server';
import { loadRoundPage } from './round-page.server';
import { RoundResult } from './round-result';

export const loader = pageAnswers(async ({ context, request, params }: Route.LoaderArgs) => {
  const viewer = await requireViewer(context, request);
  return loadRoundPage(viewer, params.roundId);
});

/** A round that this phone knows opens at once, without signal too; the server's word follows. */
export async function clientLoader({ params, serverLoader }: Route.ClientLoaderArgs) {
  const known = keptRound(params.roundId);
  if (!known) return keepRound(await serverLoader());
  void serverLoader().then(keepRound, () => undefined);
  return known;
}
clientLoader.hydrate = true as const;

// Without script. With it, the phone records all of this itself and needs no signal.
export const action = pageAnswers(async ({ context, request, params }: Route.ActionArgs) => {
  const viewer = await requireViewer(context, request);
  const values = formValues(await request.formData(), ['afterwards']);
  return answerRoundForm({ viewer, roundId: params.roundId, values });
});

/** Another tire of the same round is no reason to ask the server. */
export function shouldRevalidate(args: ShouldRevalidateFunctionArgs): boolean {
  if (args.formMethod && args.formMethod !== 'GET') return args.defaultShouldRevalidate;
  return args.currentUrl.pathname !== args.nextUrl.pathname;
}

export default function RoundRoute({ loaderData, actionData }: Route.ComponentProps) {
  const page = useKeptRound(loaderData);
  const phone = usePhoneState((state) => state);
  const view = viewRound(page, phone);
  const { coach, unit } = view;
  return (
    <PageShell>
      <OutboxStrip />
      <p className="quiet -mt-4 mb-4">
        <Link className="inline-flex min-h-11 items-center" to={`/coaches/${coach.id}`}>
          {coach.name}
        </Link>
        {` · ${whereWords(view, unit)}`}
      </p>
      <Step view={view} answer={actionData as FormAnswer | undefined} />
    </PageShell>
  );
}

/** What there is to do now: read the cautions, read a tire, or see what came of it. */
function Step({ view, answer }: { view: RoundView; answer: FormAnswer | undefined }) {
  const [search] = useSearchParams();
  const { round, mayRun, tires, next } = view;
  if (!mayRun || round.closedAt) return <RoundResult view={view} answer={answer} />;
  if (!round.cautionsAt) return <CautionStep view={view} />;
  const asked = tires.find(({ position }) => position === search.get('tire'));
  const tire = asked ?? (search.has('end') ? undefined : next);
  if (tire) return <ColdCheckStep key={tire.position} view={view} tire={tire} answer={answer} />;
  return <RoundResult view={view} answer={answer} />;
}

/** "Round of 14 November · Larch Hollow · 6 °C" */
function whereWords({ round }: RoundView, unit: RoundView['unit']): string {
  const day = dayWords(new Date(round.startedAt), new Date(round.startedAt), round.timeZone);
  const warmth = formatTemperature(celsius(round.ambientC), placeUnits(unit).temperature);
  return [`Round of ${day}`, round.place, warmth].filter(Boolean).join(' · ');
}

export const meta: Route.MetaFunction = () => [{ title: 'Round · Valveside' }];
