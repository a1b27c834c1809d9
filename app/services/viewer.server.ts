import { createContext, type RouterContextProvider, redirect } from 'react-router';
import { findViewer, type Viewer } from './login-session.server';
import { Refusal } from './refusal.server';

export type { Viewer };

type Lookup = () => Promise<Viewer | null>;
const viewerContext = createContext<Lookup>();

/** Looks the viewer up at most once a request, and only when somebody asks. */
export async function provideViewer(
  { request, context }: { request: Request; context: Readonly<RouterContextProvider> },
  next: () => Promise<Response>,
): Promise<Response> {
  let found: Promise<Viewer | null> | undefined;
  context.set(viewerContext, () => {
    found ??= findViewer(request);
    return found;
  });
  return next();
}

/** The viewer, or null when nobody is signed in. */
export const viewerOf = (context: Readonly<RouterContextProvider>) => context.get(viewerContext)();

/** The viewer of a page; sends to sign-in and back when nobody is signed in. */
export async function requireViewer(
  context: Readonly<RouterContextProvider>,
  request: Request,
): Promise<Viewer> {
  const viewer = await viewerOf(context);
  if (viewer) return viewer;
  // A request for a page's data alone has an address of its own; back leads to the page.
  const url = new URL(request.url);
  url.searchParams.delete('_routes');
  const back = url.pathname.replace(/(\/_)?\.data$/, (_, root) => (root ? '/' : '')) + url.search;
  throw redirect(`/login?to=${encodeURIComponent(back)}`);
}

/** The viewer of an API route; refuses with 401 when nobody is signed in. */
export async function requireApiViewer(context: Readonly<RouterContextProvider>): Promise<Viewer> {
  const viewer = await viewerOf(context);
  if (viewer) return viewer;
  throw new Refusal('not-signed-in', 'not-signed-in', 'Sign in and send it again.');
}
