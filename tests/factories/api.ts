import { type ActionFunctionArgs, RouterContextProvider } from 'react-router';
import { provideViewer } from '~/services/viewer.server';

/** A resource route, as the router calls it. */
interface ApiRoute {
  loader?: (args: ActionFunctionArgs) => Promise<Response>;
  action?: (args: ActionFunctionArgs) => Promise<Response>;
}

export interface ApiCall {
  method?: string;
  params?: Record<string, string>;
  /** The value of the Cookie header of somebody who is signed in. */
  cookie?: string;
  /** Sent as JSON, or as it is when it is a text. */
  body?: unknown;
  contentType?: string;
  query?: string;
}

/** Calls a route of the API as a request over the wire would, sign-in included. */
export async function callApi(route: object, call: ApiCall) {
  const { method = 'GET', params = {}, cookie, body, query = '' } = call;
  const { contentType = 'application/json' } = call;
  const request = new Request(`http://localhost:3000/api/v1/test${query}`, {
    method,
    headers: {
      ...(cookie ? { Cookie: cookie } : {}),
      ...(body === undefined ? {} : { 'Content-Type': contentType }),
    },
    ...(body === undefined ? {} : { body: typeof body === 'string' ? body : JSON.stringify(body) }),
  });
  const context = new RouterContextProvider();
  const { loader, action } = route as ApiRoute;
  const handle = method === 'GET' ? loader : action;
  if (!handle) throw new Error(`this route answers no ${method}`);
  const args = { request, params, context } as Partial<ActionFunctionArgs> as ActionFunctionArgs;
  const answer = await provideViewer({ request, context }, () => handle(args));
  return { status: answer.status, headers: answer.headers, json: await answer.json() };
}
