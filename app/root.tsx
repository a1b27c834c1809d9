import {
  isRouteErrorResponse,
  Links,
  Meta,
  Outlet,
  Scripts,
  ScrollRestoration,
  useRouteLoaderData,
} from 'react-router';
import type { Route } from './+types/root';
import './app.css';
import { sameOrigin } from '~/services/same-origin.server';
import { nonceContext, securityHeaders } from '~/services/security-headers.server';
import { readTheme } from '~/services/theme.server';
import { provideViewer, viewerOf } from '~/services/viewer.server';

export const middleware: Route.MiddlewareFunction[] = [securityHeaders, sameOrigin, provideViewer];

export async function loader({ request, context }: Route.LoaderArgs) {
  const viewer = await viewerOf(context);
  return {
    nonce: context.get(nonceContext),
    theme: readTheme(request),
    viewer: viewer && {
      email: viewer.email,
      name: viewer.name,
      pressureUnit: viewer.pressureUnit,
    },
  };
}

export function Layout({ children }: { children: React.ReactNode }) {
  const root = useRouteLoaderData<typeof loader>('root');
  // The browser hides the nonce of a script once it has run, so the page reads it from there.
  const nonce =
    typeof document === 'undefined'
      ? root?.nonce
      : document.querySelector<HTMLScriptElement>('script[nonce]')?.nonce;
  return (
    <html lang="en" data-theme={root?.theme ?? undefined}>
      <head>
        <meta charSet="utf-8" />
        <meta name="viewport" content="width=device-width, initial-scale=1, viewport-fit=cover" />
        <link rel="icon" href="/favicon.svg" type="image/svg+xml" />
        <Meta />
        <Links nonce={nonce} />
      </head>
      <body>
        {children}
        <ScrollRestoration nonce={nonce} />
        <Scripts nonce={nonce} />
      </body>
    </html>
  );
}

export default function Root() {
  return <Outlet />;
}

export function ErrorBoundary({ error }: Route.ErrorBoundaryProps) {
  const { title, words } = describeError(error);
  return (
    <main className="page">
      <title>{`${title} · Valveside`}</title>
      <h1>{title}</h1>
      <p>{words}</p>
      <p>
        <a href="/">Go to the first page</a>
      </p>
    </main>
  );
}

/** What a person may read of an error; the text of a fault is never shown. */
function describeError(error: unknown): { title: string; words: string } {
  const fault = {
    title: 'This did not work',
    words: 'The fault is ours. Try it again in a minute.',
  };
  if (!isRouteErrorResponse(error)) return fault;
  if (error.status === 404) {
    return {
      title: 'Not here',
      words: detailOf(error.data) ?? 'There is no page at this address.',
    };
  }
  const words = detailOf(error.data);
  return words ? { title: error.status === 403 ? 'Not allowed' : 'Refused', words } : fault;
}

function detailOf(body: unknown): string | undefined {
  const detail = (body as { detail?: unknown } | null)?.detail;
  return typeof detail === 'string' ? detail : undefined;
}
