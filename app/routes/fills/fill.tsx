import { redirect, useRouteLoaderData } from 'react-router';
import { ENGINE_VERSION } from '~/air';
import { reloadForEngine } from '~/fill/engine-match';
import { endOf } from '~/fill/log';
import { thisPhone } from '~/fill/phone';
import { putRun } from '~/fill/store';
import { loadFill } from '~/queries/fill.server';
import type { loader as rootLoader } from '~/root';
import { pageAnswers } from '~/services/answers.server';
import { requireViewer } from '~/services/viewer.server';
import type { Route } from './+types/fill';
import { RunningFill } from './running-fill';

export const loader = pageAnswers(async ({ params, context, request }: Route.LoaderArgs) => {
  const { actor } = await requireViewer(context, request);
  const { run, mayTap, maySeeLog } = await loadFill(actor, params.fillId);
  const after = maySeeLog ? `/fills/${run.id}/review` : `/rounds/${run.roundId}`;
  if (endOf(run.log) || !mayTap) throw redirect(after);
  return { run, after, engineVersion: ENGINE_VERSION };
});

/** The phone's own store first: a fill that it knows opens without signal. */
export async function clientLoader({ params, serverLoader }: Route.ClientLoaderArgs) {
  const { store } = thisPhone();
  const known = store.getState().runs[params.fillId];
  if (known) {
    const { id, roundId, mayEnd } = known;
    return { runId: id, after: mayEnd ? `/fills/${id}/review` : `/rounds/${roundId}` };
  }
  const { run, after, engineVersion } = await serverLoader();
  if (reloadForEngine(engineVersion, window)) await new Promise(() => {});
  putRun(store, run);
  return { runId: run.id, after };
}
clientLoader.hydrate = true as const;

/** What stands until the phone has taken over, and where scripts don't run. */
export function HydrateFallback() {
  return (
    <main className="page">
      <h1>One moment</h1>
      <p>The screen is starting.</p>
      <noscript>
        <p>A fill needs scripts: the phone itself says when to put the chuck on.</p>
      </noscript>
    </main>
  );
}

export default function FillRoute({ loaderData }: Route.ComponentProps) {
  const unit = useRouteLoaderData<typeof rootLoader>('root')?.viewer?.pressureUnit ?? 'psi';
  const { runId, after } = loaderData;
  return <RunningFill key={runId} runId={runId} after={after} unit={unit} />;
}

export const meta: Route.MetaFunction = () => [{ title: 'Fill · Valveside' }];
