import { useMemo } from 'react';
import { Link } from 'react-router';
import { OutboxStrip } from '~/components/outbox/outbox-strip';
import { sayWhatCounts } from '~/components/review/entry-use';
import { resultSentence } from '~/components/review/result-words';
import { ReviewFigure } from '~/components/review/review-figure';
import type { ReviewTrace } from '~/components/review/review-model';
import { ReviewNotes } from '~/components/review/review-notes';
import { ReviewOutcome } from '~/components/review/review-outcome';
import { dayOf, minuteOf } from '~/components/review/review-time';
import { ReviewWaiting } from '~/components/review/review-waiting';
import { PageShell } from '~/components/shell/page-shell';
import { positionName } from '~/loads';
import { loadReview, type Review } from '~/queries/review.server';
import { pageAnswers } from '~/services/answers.server';
import { requireViewer } from '~/services/viewer.server';
import type { Route } from './+types/review';

/** A page that would keep a person waiting for longer is shown without its trace, and asks again. */
const patienceMs = 1200;

export const loader = pageAnswers(async ({ params, context, request }: Route.LoaderArgs) => {
  const { actor, pressureUnit } = await requireViewer(context, request);
  const review = await loadReview(actor, params.fillId, patienceMs);
  return { review, unit: pressureUnit };
});

export default function ReviewRoute({ loaderData: { review, unit } }: Route.ComponentProps) {
  const trace = useMemo(() => traceOf(review), [review]);
  const isOpen = trace.entries.every(({ event }) => event.type !== 'ended');
  const { result, pending } = review;
  const summary = result ? resultSentence(result, unit) : 'The fill is still open.';
  return (
    <PageShell>
      <OutboxStrip />
      <div className="review">
        <ReviewHead review={review} />
        {result && <ReviewOutcome result={result} unit={unit} />}
        {!result && isOpen && <StillOpen fillId={review.id} />}
        {(pending || (!result && !isOpen)) && <ReviewWaiting />}
        <ReviewNotes entries={trace.entries} overlapping={review.overlapping} />
        {!pending && <ReviewFigure trace={trace} unit={unit} summary={summary} />}
      </div>
    </PageShell>
  );
}

function ReviewHead({ review }: { review: Review }) {
  const { coachId, coachName, roundId, position, place, startedAt, timeZone } = review;
  const when = `${dayOf(startedAt, timeZone)}, ${minuteOf(startedAt, timeZone)}`;
  return (
    <header>
      <nav className="review-ways" aria-label="Back">
        <Link to={`/coaches/${coachId}`}>{coachName}</Link>
        <Link to={`/rounds/${roundId}`}>The round</Link>
      </nav>
      <h1>{positionName(position)}</h1>
      <p className="quiet mt-1.5">{[when, place].filter(Boolean).join(' · ')}</p>
    </header>
  );
}

function StillOpen({ fillId }: { fillId: string }) {
  return (
    <p className="review-result">
      This fill is still open. <Link to={`/fills/${fillId}`}>Go on with it</Link>
    </p>
  );
}

function traceOf({ startedAt, timeZone, setup, samples, log }: Review): ReviewTrace {
  return {
    startedAt,
    timeZone,
    valve: setup.rig?.valve ?? false,
    targetKpa: setup.tire.targetKpa,
    samples,
    entries: sayWhatCounts(log),
  };
}

export const meta: Route.MetaFunction = ({ loaderData }) => {
  const review = (loaderData as { review: Review } | undefined)?.review;
  const title = review ? `${positionName(review.position)}, ${review.coachName}` : 'Review';
  return [{ title: `${title} · Valveside` }];
};
