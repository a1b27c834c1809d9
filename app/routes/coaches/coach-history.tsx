import { Link } from 'react-router';
import { ButtonLink } from '~/components/button';
import { EmptyState } from '~/components/empty-state';
import { loadCoach } from '~/queries/coach.server';
import { loadHistory } from '~/queries/history.server';
import { pageAnswers } from '~/services/answers.server';
import { requireViewer } from '~/services/viewer.server';
import type { Route } from './+types/coach-history';
import { PastRoundSection } from './past-round';

export const loader = pageAnswers(async ({ context, request, params }: Route.LoaderArgs) => {
  const { actor, pressureUnit } = await requireViewer(context, request);
  const page = Number(new URL(request.url).searchParams.get('page') ?? '1');
  const history = await loadHistory(actor, params.coachId, Number.isInteger(page) ? page : 1);
  const { id, mayRun } = await loadCoach(actor, params.coachId);
  return { ...history, coach: { id, mayRun }, unit: pressureUnit, now: new Date() };
});

export default function CoachHistory({ loaderData }: Route.ComponentProps) {
  const { rounds, page, pages, coach, unit, now } = loaderData;
  const start = coach.mayRun && (
    <ButtonLink to={`/coaches/${coach.id}/rounds/new`}>Start a round</ButtonLink>
  );
  return (
    <>
      <h1 className="mb-8">History</h1>
      {rounds.length === 0 ? (
        <EmptyState title="No round yet" actions={start}>
          A round is one walk round the coach: the cold check and the fills that follow.
        </EmptyState>
      ) : (
        <div className="grid grid-cols-[minmax(0,1fr)] gap-12">
          {rounds.map((round) => (
            <PastRoundSection key={round.id} round={round} unit={unit} now={now} />
          ))}
        </div>
      )}
      <Pages page={page} pages={pages} />
    </>
  );
}

function Pages({ page, pages }: { page: number; pages: number }) {
  if (pages === 1) return null;
  return (
    <nav className="actions mt-12" aria-label="Pages of the history">
      {page > 1 && <Link to={`?page=${page - 1}`}>Newer</Link>}
      <span>
        Page {page} of {pages}
      </span>
      {page < pages && <Link to={`?page=${page + 1}`}>Older</Link>}
    </nav>
  );
}

export const meta: Route.MetaFunction = () => [{ title: 'History · Valveside' }];
