import type { RouterContextProvider } from 'react-router';
import { z } from 'zod';
import type { Actor } from '~/access/can';
import { idField } from '~/fill/wire-fields';
import { apiAnswers, parseOrRefuse, readJson } from './answers.server';
import { Refusal } from './refusal.server';
import { requireApiViewer } from './viewer.server';

/** What React Router gives a loader or an action of the API. */
interface ApiArgs {
  request: Request;
  params: Readonly<Record<string, string | undefined>>;
  context: Readonly<RouterContextProvider>;
}

interface Received<Body, Ids extends string> {
  actor: Actor;
  /** From the address, in lower case. */
  ids: Record<Ids, string>;
  body: Body;
}

/**
 * A route that takes one JSON body by one method. Checks, in this order: method, sign-in, the ids
 * of the address, the kind of body, the body.
 */
export function apiWrite<Schema extends z.ZodType, Ids extends string>(
  method: 'PUT' | 'POST',
  idNames: readonly Ids[],
  schema: Schema,
  handle: (received: Received<z.infer<Schema>, Ids>) => Promise<unknown>,
) {
  return apiAnswers(async ({ request, params, context }: ApiArgs) => {
    if (request.method !== method) throw wrongMethod(request.method, method);
    const { actor } = await requireApiViewer(context);
    const ids = idsOf(idNames, params);
    requireJson(request);
    return handle({ actor, ids, body: parseOrRefuse(schema, await readJson(request)) });
  });
}

/** A route that answers reading; `schema` is that of the query after the question mark. */
export function apiRead<Schema extends z.ZodType, Ids extends string>(
  idNames: readonly Ids[],
  schema: Schema,
  handle: (received: Received<z.infer<Schema>, Ids>) => Promise<unknown>,
) {
  return apiAnswers(async ({ request, params, context }: ApiArgs) => {
    const { actor } = await requireApiViewer(context);
    const ids = idsOf(idNames, params);
    const query = Object.fromEntries(new URL(request.url).searchParams);
    return handle({ actor, ids, body: parseOrRefuse(schema, query) });
  });
}

/** The answer to reading what can only be written. */
export const noReading = (method: 'PUT' | 'POST') =>
  apiAnswers(async ({ request }: ApiArgs): Promise<never> => {
    throw wrongMethod(request.method, method);
  });

function wrongMethod(sent: string, expected: string): Refusal {
  return new Refusal('wrong-method', 'wrong-method', `Send it with ${expected}.`, [
    { field: 'method', value: sent, expected },
  ]);
}

function idsOf<Ids extends string>(names: readonly Ids[], params: ApiArgs['params']) {
  const shape = Object.fromEntries(names.map((name) => [name, idField]));
  return parseOrRefuse(z.object(shape), params) as Record<Ids, string>;
}

/**
 * A page of another site can make a browser send a form or plain text without asking, JSON not:
 * this stands beside the check of the Origin.
 */
function requireJson(request: Request): void {
  const type = request.headers.get('Content-Type') ?? '';
  if (/^application\/json\s*(;|$)/i.test(type)) return;
  throw new Refusal('wrong-type', 'wrong-type', 'Send the body as application/json.', [
    { field: 'Content-Type', value: type, expected: 'application/json' },
  ]);
}
