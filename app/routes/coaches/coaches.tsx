import { Link } from 'react-router';
import { ButtonLink } from '~/components/button';
import { EmptyState } from '~/components/empty-state';
import { OutboxStrip } from '~/components/outbox/outbox-strip';
import { PageShell } from '~/components/shell/page-shell';
import { type CoachInList, listCoaches } from '~/queries/coaches.server';
import { pageAnswers } from '~/services/answers.server';
import { requireViewer } from '~/services/viewer.server';
import type { Route } from './+types/coaches';
import { dayWords, layoutWords } from './coach-words';

export const loader = pageAnswers(async ({ context, request }: Route.LoaderArgs) => {
  const { actor } = await requireViewer(context, request);
  return { coaches: await listCoaches(actor), now: new Date() };
});

export default function Coaches({ loaderData: { coaches, now } }: Route.ComponentProps) {
  const make = <ButtonLink to="/coaches/new">Make a coach</ButtonLink>;
  return (
    <PageShell narrow>
      <OutboxStrip />
      <h1 className="mb-8">Coaches</h1>
      {coaches.length === 0 ? (
        <EmptyState title="No coach yet" actions={make}>
          Make your coach: its name, its axles, what its tires may hold. Or ask an owner to let you
          in.
        </EmptyState>
      ) : (
        <>
          <ul className="hair mb-8">
            {coaches.map((coach) => (
              <CoachLine key={coach.id} coach={coach} now={now} />
            ))}
          </ul>
          {make}
        </>
      )}
    </PageShell>
  );
}

function CoachLine({ coach, now }: { coach: CoachInList; now: Date }) {
  const { lastRoundAt, roundOpen } = coach;
  const round = !lastRoundAt
    ? 'No round yet.'
    : `${roundOpen ? 'A round is under way, since' : 'Last round'} ${dayWords(lastRoundAt, now)}.`;
  return (
    <li className="border-b border-rule">
      <Link className="block py-4 no-underline hover:underline" to={`/coaches/${coach.id}`}>
        <b className="text-[25px] leading-tight">{coach.name}</b>
        <span className="quiet block">
          {layoutWords(coach.layout)}. {round}
        </span>
      </Link>
    </li>
  );
}

export const meta: Route.MetaFunction = () => [{ title: 'Coaches · Valveside' }];
