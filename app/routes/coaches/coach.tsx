import { Outlet } from 'react-router';
import { OutboxStrip } from '~/components/outbox/outbox-strip';
import { CoachNav, type CoachPage } from '~/components/shell/coach-nav';
import { PageShell } from '~/components/shell/page-shell';
import { loadCoach } from '~/queries/coach.server';
import { pageAnswers } from '~/services/answers.server';
import { requireViewer } from '~/services/viewer.server';
import type { Route } from './+types/coach';

export const loader = pageAnswers(async ({ context, request, params }: Route.LoaderArgs) => {
  const { actor } = await requireViewer(context, request);
  const { id, name, maySeeLog } = await loadCoach(actor, params.coachId);
  return { id, name, maySeeLog };
});

/** The frame of all pages of one coach. */
export default function CoachFrame({ loaderData: { id, maySeeLog } }: Route.ComponentProps) {
  return (
    <PageShell nav={<CoachNav coachId={id} pages={pagesFor(maySeeLog)} />}>
      <OutboxStrip />
      <Outlet />
    </PageShell>
  );
}

const pagesFor = (maySeeLog: boolean): CoachPage[] => [
  { path: '', name: 'Coach' },
  ...(maySeeLog
    ? [
        { path: 'history', name: 'History' },
        { path: 'tires', name: 'Tires' },
        { path: 'targets', name: 'Targets' },
        { path: 'air', name: 'Air' },
        { path: 'settings', name: 'Settings' },
      ]
    : []),
];
