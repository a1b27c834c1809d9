import { Form, redirect } from 'react-router';
import { endLoginSessions } from '~/commands/account-end-sessions.server';
import { Button } from '~/components/button';
import { PageShell } from '~/components/shell/page-shell';
import { clearSessionToken } from '~/services/sign-in-cookies.server';
import { viewerOf } from '~/services/viewer.server';
import type { Route } from './+types/logout';

export async function loader({ context }: Route.LoaderArgs) {
  const viewer = await viewerOf(context);
  if (!viewer) throw redirect('/');
  return { email: viewer.email };
}

export async function action({ context }: Route.ActionArgs) {
  const viewer = await viewerOf(context);
  if (viewer) await endLoginSessions(viewer.actor.userId, { only: viewer.sessionId });
  return redirect('/', { headers: { 'Set-Cookie': await clearSessionToken() } });
}

export default function Logout({ loaderData }: Route.ComponentProps) {
  return (
    <PageShell narrow>
      <h1>Sign out</h1>
      <p className="mt-3 mb-8">
        You are signed in as <strong className="break-words">{loaderData.email}</strong>. Signing
        out ends it in this browser only.
      </p>
      {/* A whole new page, so that nothing of this person stays in the browser's memory. */}
      <Form method="post" className="form" reloadDocument>
        <Button kind="main">Sign out</Button>
      </Form>
    </PageShell>
  );
}

export const meta: Route.MetaFunction = () => [{ title: 'Sign out · Valveside' }];
