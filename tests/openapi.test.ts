import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import * as openapi from '~/routes/api/openapi';
import { operations } from '~/services/openapi.server';
import { callApi } from './factories/api';

const read = async () => (await callApi(openapi, {})).json;

/** Paths and files of the API as the route table has them. */
const table = [
  ...readFileSync('app/routes.ts', 'utf8').matchAll(/route\('([^']+)', '(routes\/api\/[^']+)'\)/g),
].map(([, path = '', file = '']) => ({ path, file }));
const modules = import.meta.glob<object>('../app/routes/api/*.ts');
const described = table.filter(({ path }) => path !== 'openapi.json');

describe('the description of the API', () => {
  it('has every address of the route table and no other', async () => {
    const { paths } = await read();
    const expected = described.map(({ path }) => `/api/v1/${path.replace(/:(\w+)/g, '{$1}')}`);
    expect(Object.keys(paths).sort()).toEqual(expected.sort());
    expect(expected.length).toBe(6);
  });

  it.each(operations)(
    '$method $path is answered by its route, other methods are not',
    async ({ method, path }) => {
      const file = described.find((entry) => entry.path === path)?.file ?? '';
      const route = (await modules[`../app/${file}`]?.()) ?? {};
      // Nobody is signed in: the method is looked at before that.
      const answer = await callApi(route, { method: method.toUpperCase() });
      expect(answer.status).toBe(401);
      expect((await callApi(route, { method: 'DELETE' })).status).toBe(405);
    },
  );

  it('bounds what the routes bound: pressures, times and unknown fields', async () => {
    const { paths } = await read();
    const body = (path: string, method: string) =>
      paths[path][method].requestBody.content['application/json'].schema;
    const reading = body('/api/v1/rounds/{roundId}/readings/{readingId}', 'put');
    expect(reading.properties.kpa).toMatchObject({ minimum: 0, maximum: 1400 });
    expect(reading.additionalProperties).toBe(false);
    expect(reading.required).toContain('v');
    const events = body('/api/v1/runs/{runId}/events', 'post').properties.events;
    expect(events).toMatchObject({ minItems: 1, maxItems: 500 });
    const types = events.items.oneOf.map(
      (one: { properties: { type: { const: string } } }) => one.properties.type.const,
    );
    expect(types).toHaveLength(14);
    for (const one of events.items.oneOf) {
      expect(one.properties.atMs).toMatchObject({ minimum: 0, maximum: 86_400_000 });
    }
  });

  it('refers to nothing that is not there', async () => {
    const text = JSON.stringify(await read());
    const references = new Set([...text.matchAll(/"\$ref":"([^"]+)"/g)].map(([, ref]) => ref));
    expect([...references]).toEqual(['#/components/schemas/Problem']);
    expect(text).toContain('"Problem":{"type":"object"');
  });
});
