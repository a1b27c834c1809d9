import { z } from 'zod';
import {
  cautionsBody,
  closingBody,
  eventsBody,
  eventsQuery,
  readingBody,
  roundBody,
  runBody,
} from '~/fill/wire';
import {
  appendAnswer,
  cautionsAnswer,
  closingAnswer,
  eventsAnswer,
  problemBody,
  readingAnswer,
  roundAnswer,
  runAnswer,
} from '~/fill/wire-answers';
import { idField, wireVersion } from '~/fill/wire-fields';

/** One method of one address of the API. */
interface Operation {
  method: 'get' | 'put' | 'post';
  /** As the route table has it, below `/api/v1/`. */
  path: string;
  summary: string;
  query?: z.ZodObject;
  body?: z.ZodType;
  answer: z.ZodType;
  refusals: readonly number[];
}

/** Every address under `/api/v1` but this description itself. */
export const operations: readonly Operation[] = [
  {
    method: 'put',
    path: 'rounds/:roundId',
    summary: 'Start a round under an id made on the phone',
    body: roundBody,
    answer: roundAnswer,
    refusals: [400, 401, 403, 404, 409, 413, 415],
  },
  {
    method: 'put',
    path: 'rounds/:roundId/cautions',
    summary: 'The cautions of a round have been read; the first time stands',
    body: cautionsBody,
    answer: cautionsAnswer,
    refusals: [400, 401, 403, 404, 413, 415],
  },
  {
    method: 'put',
    path: 'rounds/:roundId/readings/:readingId',
    summary: 'What a gauge showed on a cold tire',
    body: readingBody,
    answer: readingAnswer,
    refusals: [400, 401, 403, 404, 409, 413, 415],
  },
  {
    method: 'put',
    path: 'rounds/:roundId/closing',
    summary: 'Close a round with its list of afterwards; the first closing stands',
    body: closingBody,
    answer: closingAnswer,
    refusals: [400, 401, 403, 404, 409, 413, 415],
  },
  {
    method: 'put',
    path: 'runs/:runId',
    summary: 'Start a fill and freeze what the engine starts from',
    body: runBody,
    answer: runAnswer,
    refusals: [400, 401, 403, 404, 409, 413, 415],
  },
  {
    method: 'post',
    path: 'runs/:runId/events',
    summary: 'Add events to the log of a fill: all of a batch or none of it',
    body: eventsBody,
    answer: appendAnswer,
    refusals: [400, 401, 403, 404, 409, 413, 415],
  },
  {
    method: 'get',
    path: 'runs/:runId/events',
    summary: 'Events of a fill after a number',
    query: eventsQuery,
    answer: eventsAnswer,
    refusals: [400, 401, 403, 404],
  },
];

/** The API's description after OpenAPI 3.1, made from the schemas that the routes parse with. */
export function describeApi() {
  const paths: Record<string, Record<string, unknown>> = {};
  for (const operation of operations) {
    const path = `/api/v1/${operation.path.replace(/:(\w+)/g, '{$1}')}`;
    paths[path] = { ...paths[path], [operation.method]: describeOperation(operation) };
  }
  return {
    openapi: '3.1.0',
    info: {
      title: 'Valveside',
      version: String(wireVersion),
      description:
        'Pressures are gauge kPa, temperatures °C, altitudes m, times UTC. Everything that is written has an id made by the sender: sent twice it is stored once, and the same id with another body is refused with 409.',
    },
    security: [{ session: [] }],
    paths,
    components: {
      schemas: { Problem: jsonSchema(problemBody) },
      securitySchemes: { session },
    },
  };
}

const session = {
  type: 'apiKey',
  in: 'cookie',
  name: 'valveside-session',
  description: 'From sign-in. Its name begins with __Host- where the public address is https.',
};

function describeOperation({ path, summary, query, body, answer, refusals }: Operation) {
  const refused = refusals.map((status) => [
    status,
    { description: words[status], content: problem },
  ]);
  return {
    summary,
    parameters: [...pathParameters(path), ...queryParameters(query)],
    ...(body ? { requestBody: { required: true, content: jsonOf(body) } } : {}),
    responses: {
      200: { description: 'Stored, now or before', content: jsonOf(answer) },
      ...Object.fromEntries(refused),
    },
  };
}

const words: Record<number, string> = {
  400: 'Something in it cannot be used; every field and every place in a batch is named',
  401: 'Nobody is signed in',
  403: 'Your role on this coach does not allow it',
  404: 'There is no such thing, or it is not yours',
  409: 'It contradicts what is stored',
  413: 'The body is above 1 MB',
  415: 'The body is not application/json',
};

const problem = {
  'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } },
};

const jsonOf = (schema: z.ZodType) => ({ 'application/json': { schema: jsonSchema(schema) } });

/** What is to be sent, not what it becomes when it has been read. */
function jsonSchema(schema: z.ZodType): Record<string, unknown> {
  const { $schema, ...rest } = z.toJSONSchema(schema, { io: 'input' });
  return rest;
}

function pathParameters(path: string) {
  return [...path.matchAll(/:(\w+)/g)].map(([, name]) => ({
    name,
    in: 'path',
    required: true,
    schema: jsonSchema(idField),
  }));
}

function queryParameters(query: z.ZodObject | undefined) {
  return Object.keys(query?.shape ?? {}).map((name) => ({
    name,
    in: 'query',
    required: false,
    schema: { type: 'integer', minimum: 0, default: 0 },
  }));
}
