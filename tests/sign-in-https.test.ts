import { createRequestHandler, type ServerBuild } from 'react-router';
import { expect, test, vi } from 'vitest';
import { sameOrigin } from '~/services/same-origin.server';
import { writePending, writeSessionToken } from '~/services/sign-in-cookies.server';
import config from '../react-router.config';

// Behind a TLS proxy: people open https, the server itself sees http and a host of its own.
vi.stubEnv('PUBLIC_URL', 'https://valveside.example');

test('over https cookies are secure and belong to this host alone', async () => {
  const pending = { id: crypto.randomUUID(), email: 'a@mail.example', to: '/', strategy: '' };
  const lines = [await writeSessionToken('token'), await writePending(pending)];
  for (const line of lines) {
    expect(line).toMatch(/^__Host-valveside-/);
    expect(line).toMatch(/; Secure/);
    expect(line).toMatch(/; Path=\//);
    expect(line).not.toMatch(/domain/i);
  }
});

const written: string[] = [];

/** A server of three routes with the project's own settings and the real check. */
function server(allowedActionOrigins = config.allowedActionOrigins) {
  const route = (id: string, path: string | undefined, module: object) => ({
    [id]: { id, path, parentId: id === 'root' ? undefined : 'root', module },
  });
  const write = (name: string) => async () => {
    written.push(name);
    return Response.json({ name });
  };
  const build = {
    entry: {
      module: { default: async (_: Request, status: number) => new Response('', { status }) },
    },
    routes: {
      ...route('root', undefined, { middleware: [sameOrigin], default: () => null }),
      ...route('form', 'form', { action: write('form'), default: () => null }),
      ...route('api', 'api/v1/thing', { action: write('api'), loader: write('read') }),
    },
    assets: { routes: {}, entry: { imports: [], module: '' }, url: '', version: '' },
    allowedActionOrigins,
    basename: '/',
    future: config.future,
    isSpaMode: false,
    ssr: true,
    routeDiscovery: { mode: 'initial', manifestPath: '/__manifest' },
    prerender: [],
    publicPath: '/',
    assetsBuildDirectory: '',
  };
  return createRequestHandler(build as unknown as ServerBuild, 'test');
}

const post = (path: string, headers: Record<string, string>, method = 'POST') =>
  new Request(`http://10.0.0.5:8080${path}`, { method, headers });

const home = { Origin: 'https://valveside.example' };
const strangers: Record<string, Record<string, string>> = {
  'another site': { Origin: 'https://elsewhere.example' },
  'the same host without TLS': { Origin: 'http://valveside.example' },
  'the address that the server sees': { Origin: 'http://10.0.0.5:8080' },
  'a page without an origin': { Origin: 'null' },
  'another site whose name is hidden': { 'Sec-Fetch-Site': 'cross-site' },
};

test('a form of the public address arrives though the server sees another', async () => {
  written.length = 0;
  const answer = await server()(post('/form', home));
  expect(answer.status).toBe(200);
  expect((await server()(post('/api/v1/thing', home, 'PUT'))).status).toBe(200);
  expect(written).toEqual(['form', 'api']);
});

test('the framework’s own check alone would refuse that form', async () => {
  written.length = 0;
  const logged = vi.spyOn(console, 'error').mockImplementation(() => undefined);
  expect((await server([])(post('/form', home))).status).toBe(400);
  expect(written).toEqual([]);
  logged.mockRestore();
});

test.each(Object.entries(strangers))('a write from %s is refused', async (_, headers) => {
  written.length = 0;
  expect((await server()(post('/form', headers))).status).toBe(403);
  const api = await server()(post('/api/v1/thing', headers, 'PUT'));
  expect(api.status).toBe(403);
  expect(await api.json()).toMatchObject({ code: 'other-origin', status: 403 });
  expect(written).toEqual([]);
});

test('an origin that is no address at all is refused, in a form by the framework', async () => {
  written.length = 0;
  const logged = vi.spyOn(console, 'error').mockImplementation(() => undefined);
  expect((await server()(post('/form', { Origin: 'valveside' }))).status).toBe(400);
  logged.mockRestore();
  expect((await server()(post('/api/v1/thing', { Origin: 'valveside' }))).status).toBe(403);
  expect(written).toEqual([]);
});

test('a program that names no origin may write, and anybody may read', async () => {
  written.length = 0;
  expect((await server()(post('/api/v1/thing', {}, 'POST'))).status).toBe(200);
  const elsewhere = { Origin: 'https://elsewhere.example' };
  expect((await server()(post('/api/v1/thing', elsewhere, 'GET'))).status).toBe(200);
  expect(written).toEqual(['api', 'read']);
});
