import { data } from 'react-router';
import type { z } from 'zod';
import { log } from './log.server';
import { type FieldProblem, Refusal } from './refusal.server';

/** Milliseconds since the epoch by the server's clock; phones measure their offset by it. */
export const serverTimeHeader = 'X-Server-Time';

/** Makes refusals of a page's loader or action into answers that its boundary can show. */
export function pageAnswers<Args, Result>(handle: (args: Args) => Promise<Result>) {
  return async (args: Args): Promise<Result> => {
    try {
      return await handle(args);
    } catch (thrown) {
      if (!(thrown instanceof Refusal)) throw thrown;
      throw data(thrown.toProblem(), { status: thrown.status });
    }
  };
}

/** Makes the result of an API route into JSON, and refusals into problem details. */
export function apiAnswers<Args>(handle: (args: Args) => Promise<unknown>) {
  return async (args: Args): Promise<Response> => {
    try {
      const result = await handle(args);
      return result instanceof Response ? result : json(result, 200, 'application/json');
    } catch (thrown) {
      if (thrown instanceof Response) return thrown;
      if (thrown instanceof Refusal) {
        return json(thrown.toProblem(), thrown.status, 'application/problem+json');
      }
      log.error({ err: thrown }, 'API request failed');
      const fault = { type: 'about:blank', title: 'fault', status: 500, code: 'fault', errors: [] };
      return json(
        { ...fault, detail: 'Something went wrong here. Send it again.' },
        500,
        'application/problem+json',
      );
    }
  };
}

function json(body: unknown, status: number, type: string): Response {
  return new Response(JSON.stringify(body), {
    status,
    headers: {
      'Content-Type': `${type}; charset=utf-8`,
      'Cache-Control': 'no-store',
      [serverTimeHeader]: String(Date.now()),
    },
  });
}

/** Largest JSON body that is read, bytes: a batch of 500 events is below 200 kB. */
const largestBody = 1_000_000;

/** Reads a JSON body; refuses what is too large or is no JSON. */
export async function readJson(request: Request): Promise<unknown> {
  const text = await request.text();
  if (text.length > largestBody) {
    throw new Refusal('too-large', 'body-too-large', 'Send at most 1 MB at a time.');
  }
  try {
    return JSON.parse(text);
  } catch {
    throw new Refusal('bad-input', 'not-json', 'The body is not JSON.', [
      { field: 'body', value: text.slice(0, 40), expected: 'a JSON object' },
    ]);
  }
}

/** Parses with a schema, or refuses naming each field, its value and what is expected. */
export function parseOrRefuse<Schema extends z.ZodType>(
  schema: Schema,
  input: unknown,
): z.infer<Schema> {
  const parsed = schema.safeParse(input);
  if (parsed.success) return parsed.data;
  throw new Refusal(
    'bad-input',
    'bad-input',
    'Something in it cannot be used.',
    parsed.error.issues.map((issue) => fieldProblem(issue, input)),
  );
}

/** One issue of Zod as a field problem; a number in the path is the place in the batch. */
export function fieldProblem(
  issue: { path: PropertyKey[]; message: string },
  input: unknown,
): FieldProblem {
  const index = issue.path.find((part) => typeof part === 'number');
  const field = issue.path.filter((part) => typeof part !== 'number').join('.') || 'body';
  const value = issue.path.reduce<unknown>(
    (inside, part) => (inside as Record<PropertyKey, unknown> | undefined)?.[part],
    input,
  );
  return { ...(index === undefined ? {} : { index }), field, value, expected: issue.message };
}
