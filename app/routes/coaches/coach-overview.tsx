import { AxleDrawing } from '~/components/tire/axle-drawing';
import { nextCheckDue } from '~/loads';
import { loadCoach, loadRoundHeads } from '~/queries/coach.server';
import { loadTireStates, type TireState } from '~/queries/coach-overview.server';
import { pageAnswers } from '~/services/answers.server';
import { requireViewer } from '~/services/viewer.server';
import { celsius, formatTemperature } from '~/units';
import { drawnAxles } from '../rounds/drawn-axles';
import { placeUnits } from '../rounds/place-units';
import { checkOf } from '../rounds/tire-check';
import { lacksAir, verdictWord, wantsAction } from '../rounds/verdict-words';
import type { Route } from './+types/coach-overview';
import { dayWords, dueWords, layoutWords, needWords } from './coach-words';
import { FirstFill } from './first-fill';
import { RoundActions } from './round-actions';
import { TireTable } from './tire-table';

export const loader = pageAnswers(async ({ context, request, params }: Route.LoaderArgs) => {
  const { actor, pressureUnit } = await requireViewer(context, request);
  const now = new Date();
  const coach = await loadCoach(actor, params.coachId);
  const [tires, rounds] = await Promise.all([loadTireStates(coach, now), loadRoundHeads(coach.id)]);
  return { coach, tires, rounds, now, unit: pressureUnit };
});

type OverviewData = Route.ComponentProps['loaderData'];

export default function CoachOverview({ loaderData }: Route.ComponentProps) {
  const { coach, tires, rounds, now, unit } = loaderData;
  const check = checkOf(tires, coach.toleranceKpa);
  const due = dueWords(nextCheckDue(earliestCheck(tires)), now);
  const placed = check.tires.map(({ position, verdict }, index) => ({
    position,
    pressureKpa: tires[index]?.kpa ?? undefined,
    targetKpa: tires[index]?.targetKpa ?? 0,
    needsAir: lacksAir(verdict),
    note: wantsAction(verdict) ? verdictWord(verdict) : undefined,
  }));
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-x-18 gap-y-9 lg:grid-cols-[470px_minmax(0,1fr)] lg:grid-rows-[auto_1fr]">
      <header className="grid gap-6 lg:col-start-2">
        <div>
          <h1>{coach.name}</h1>
          <p className="quiet mt-1.5">{aboutWords(loaderData)}</p>
        </div>
        <p className="max-w-[24em] text-[25px] leading-tight">
          {needWords(check, unit)} {due}
        </p>
        <RoundActions coach={coach} rounds={rounds} now={now} />
        <FirstFill coach={coach} />
      </header>
      <div className="lg:col-start-1 lg:row-span-2 lg:row-start-1">
        <AxleDrawing unit={unit} axles={drawnAxles(coach.layout, placed)} />
      </div>
      <TireTable tires={tires} check={check} unit={unit} />
    </div>
  );
}

/** "Three axles · 295/80R22.5 · last round 14 November, 6 °C" */
function aboutWords({ coach, tires, rounds: { last }, now, unit }: OverviewData): string {
  const sizes = [...new Set(tires.map(({ size }) => size))];
  const round = last
    ? `last round ${dayWords(last.startedAt, now, last.timeZone)}, ${formatTemperature(celsius(last.ambientC), placeUnits(unit).temperature)}`
    : 'no round yet';
  return [layoutWords(coach.layout), ...sizes, round].join(' · ');
}

/** The tire that has waited longest decides; null while one has never been read. */
function earliestCheck(tires: readonly TireState[]): Date | null {
  const times = tires.map(({ checkedAt }) => checkedAt?.getTime() ?? null);
  if (times.length === 0 || times.includes(null)) return null;
  return new Date(Math.min(...times.filter((time) => time !== null)));
}

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${(loaderData as OverviewData | undefined)?.coach.name ?? 'Coach'} · Valveside` },
];
