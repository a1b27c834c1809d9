import { expect, test } from '@playwright/test';
import {
  type Expected,
  type Outcome,
  type Role,
  reads,
  roles,
  writes,
} from './access-expectations';
import { requests } from './access-requests';
import { listRoutes, type RouteRow } from './access-routes';
import { addressOf, createWorld, type World } from './access-world';
import { server } from './setup/server';

// Every address of the route table × everybody who may ask, by the server's answers alone.

const routes = await listRoutes();

/** `POST /coaches/:coachId/air rig` */
const partsOf = (key: string) => {
  const [method = '', path = '', what = ''] = key.split(' ');
  return { method, path, what };
};

test('every route has its expectations, and every expectation has its route', () => {
  const pathsOf = (keys: string[]) => [...new Set(keys.map((key) => partsOf(key).path))].sort();
  const readable = routes.filter((route) => route.reads).map(({ path }) => path);
  const writable = routes.filter((route) => route.writes).map(({ path }) => path);
  expect(Object.keys(reads).sort()).toEqual(readable.sort());
  expect(pathsOf(Object.keys(writes))).toEqual(writable.sort());
  expect(Object.keys(requests).sort()).toEqual(Object.keys(writes).sort());
});

const resting = new Map<Role, Promise<World>>();
function worldToRead(role: Role): Promise<World> {
  const known = resting.get(role) ?? createWorld(role, { fill: true });
  resting.set(role, known);
  return known;
}

for (const [path, expected] of Object.entries(reads)) {
  test(`GET ${path}`, async () => {
    expect(await outcomes((role) => read(path, role))).toEqual(expected);
  });
}

async function read(path: string, role: Role): Promise<Response> {
  const world = await worldToRead(role);
  return ask(addressOf(path, world), world);
}

// A browser may ask for the data of one module alone, past the page's frame and its guard.
for (const { path, ids } of routes.filter(isGuardedPage)) {
  for (const id of ids) {
    test(`data of ${id} alone`, async () => {
      const found = await outcomes(async (role) => {
        const world = await worldToRead(role);
        return ask(`${addressOf(path, world)}.data?_routes=${encodeURIComponent(id)}`, world);
      });
      expect(found).toEqual(expectedOf(path, id));
    });
  }
}

function isGuardedPage({ path, isPage, reads: readable }: RouteRow): boolean {
  return isPage && readable && path.includes(':');
}

/** The frame of a coach's pages shows less than some of the pages in it. */
function expectedOf(path: string, id: string): Expected {
  const frame = reads['/coaches/:coachId'];
  const own = id === 'routes/coaches/coach' ? frame : reads[path];
  if (!own) throw new Error(`${path} has no expectation`);
  return own;
}

for (const [key, expected] of Object.entries(writes)) {
  test(key, async () => {
    expect(await outcomes((role) => write(key, role))).toEqual(expected);
  });
}

async function write(key: string, role: Role): Promise<Response> {
  const request = requests[key];
  if (!request) throw new Error(`${key} has no request`);
  const { method, path } = partsOf(key);
  // What is asked for decides what must be there, so the request is made for nothing first.
  const fill = request(nowhere).onFill ?? false;
  const world = await createWorld(role, { fill });
  const { form, json, ids } = request(world);
  const body = json ? JSON.stringify(json) : new URLSearchParams(form?.map(([...pair]) => pair));
  return ask(addressOf(path, { ...world, ...ids }), world, {
    method,
    body,
    headers: { Origin: server.url, ...(json ? { 'Content-Type': 'application/json' } : {}) },
  });
}

const nowhere: World = { coachId: '', coachName: '', roundId: '', runId: '', tireId: '' };

function ask(address: string, { cookie }: World, init: RequestInit = {}): Promise<Response> {
  const headers = { ...init.headers, ...(cookie ? { Cookie: cookie } : {}) };
  return fetch(new URL(address, server.url), { ...init, headers, redirect: 'manual' });
}

/** Asks as everybody, one after another, and reads what each answer comes to. */
async function outcomes(asked: (role: Role) => Promise<Response>) {
  const found: Partial<Record<Role, Outcome | string>> = {};
  for (const role of roles) found[role] = await outcomeOf(await asked(role));
  return found;
}

const byStatus: Record<number, Outcome> = {
  400: 'invalid',
  401: 'unauthorized',
  403: 'forbidden',
  404: 'hidden',
  405: 'wrong method',
};

async function outcomeOf(answer: Response): Promise<Outcome | string> {
  const { status } = answer;
  const text = await answer.text();
  // The data of a page answers a redirect as 202 with the way inside.
  const way = answer.headers.get('Location') ?? (status === 202 ? text : undefined);
  if (way !== undefined) return /(^|")\/login/.test(way) ? 'sign-in' : 'goes on';
  if (answer.ok) return 'ok';
  return byStatus[status] ?? `${status} ${text.slice(0, 200)}`;
}
