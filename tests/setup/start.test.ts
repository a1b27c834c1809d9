import { type ChildProcess, spawn } from 'node:child_process';
import { existsSync, readdirSync, readFileSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { projectRoot } from '../../db/setup/paths';
import { freePort } from '../../db/setup/ports';
import { isAlive } from '../../db/setup/processes';
import { wait } from '../../db/setup/run';
import { testBuild } from '../../db/setup/test-build';
import { makeTestFolder, removeTestFolder } from '../../db/setup/test-folder';

/** The real `npm start`, on a data folder, a build and a port of its own. */
let folder: string;
let build: string;
let port: number;
const started: Start[] = [];

class Start {
  output = '';
  readonly ended: Promise<number | null>;
  readonly child: ChildProcess;

  constructor(env: Record<string, string | undefined> = {}) {
    this.child = spawn(process.execPath, ['--import', 'tsx', 'db/setup/start.ts'], {
      cwd: projectRoot,
      stdio: ['ignore', 'pipe', 'pipe'],
      env: {
        PATH: process.env.PATH,
        PORT: String(port),
        VALVESIDE_DATA_DIR: folder,
        VALVESIDE_BUILD_DIR: build,
        ...env,
      },
    });
    const keep = (chunk: Buffer) => {
      this.output += chunk;
    };
    this.child.stdout?.on('data', keep);
    this.child.stderr?.on('data', keep);
    this.ended = new Promise((resolve) => {
      this.child.on('close', resolve);
    });
    started.push(this);
  }

  async said(words: string): Promise<void> {
    const until = Date.now() + 150_000;
    while (!this.output.includes(words)) {
      if (Date.now() > until || this.child.exitCode !== null) throw new Error(this.output);
      await wait(50);
    }
  }
}

const address = (path: string) => `http://127.0.0.1:${port}${path}`;
const postmaster = () =>
  Number(readFileSync(join(folder, 'postgres/data/postmaster.pid'), 'utf8').split('\n')[0]);

beforeAll(async () => {
  folder = await makeTestFolder();
  build = await testBuild();
  port = await freePort();
}, 180_000);

afterAll(async () => {
  for (const { child, ended } of started) {
    if (child.exitCode !== null || child.signalCode !== null) continue;
    child.kill('SIGTERM');
    await ended;
  }
  await removeTestFolder(folder, 'postgres');
}, 60_000);

test('in production what is missing is named and nothing is made up', async () => {
  const start = new Start({ NODE_ENV: 'production', PUBLIC_URL: 'https://valveside.example' });
  expect(await start.ended).toBe(1);
  for (const name of ['DATABASE_URL', 'SMTP_URL', 'MAIL_FROM', 'SESSION_SECRET']) {
    expect(start.output).toContain(`${name}: missing, expected `);
  }
  expect(start.output).not.toContain('PUBLIC_URL:');
  expect(readdirSync(folder)).toEqual([]);
});

test('the built server, run without its settings, ends with their names', async () => {
  const child = spawn(
    process.execPath,
    ['node_modules/@react-router/serve/bin.js', join(build, 'server/index.js')],
    {
      cwd: projectRoot,
      env: { PATH: process.env.PATH, HOST: '127.0.0.1', PORT: String(await freePort()) },
    },
  );
  let output = '';
  child.stderr.on('data', (chunk) => {
    output += chunk;
  });
  const deadline = setTimeout(() => child.kill('SIGKILL'), 25_000);
  const code = await new Promise((resolve) => {
    child.on('close', resolve);
  });
  clearTimeout(deadline);
  expect(code).toBe(1);
  expect(output).toContain('SESSION_SECRET: missing, expected ');
});

test('it starts, refuses a second start, survives a kill, starts again and stops all at Ctrl-C', {
  timeout: 400_000,
}, async () => {
  const first = new Start();
  await first.said('Valveside is ready');
  expect((await fetch(address('/readyz'))).status).toBe(200);
  const secret = readFileSync(join(folder, 'session-secret'), 'utf8');
  expect(statSync(join(folder, 'session-secret')).mode & 0o777).toBe(0o600);

  const second = new Start({ PORT: String(await freePort()) });
  expect(await second.ended).toBe(1);
  expect(second.output).toContain(`already runs from this folder: http://localhost:${port}`);
  expect((await fetch(address('/readyz'))).status).toBe(200);

  // As the power cut that hits everything at once.
  const server = postmaster();
  first.child.kill('SIGKILL');
  process.kill(server, 'SIGKILL');
  await first.ended;

  const third = new Start();
  await third.said('Valveside is ready');
  expect(third.output).not.toContain('Filling in the demo');
  expect(readFileSync(join(folder, 'session-secret'), 'utf8')).toBe(secret);

  await signInBy(third);
  const running = postmaster();
  third.child.kill('SIGINT');
  third.child.kill('SIGTERM');
  expect(await third.ended).toBe(0);
  await expect(fetch(address('/healthz'))).rejects.toThrow();
  expect(isAlive(running)).toBe(false);
  expect(existsSync(join(folder, 'postgres/data/postmaster.pid'))).toBe(false);
});

/** The code comes to the terminal, and its mail to the folder. */
async function signInBy(start: Start): Promise<void> {
  const answer = await fetch(address('/login'), {
    method: 'POST',
    redirect: 'manual',
    body: new URLSearchParams({ email: 'owner@valveside.example', to: '/coaches' }),
  });
  expect(answer.status).toBeLessThan(400);
  await start.said('Sign-in code for owner@valveside.example: ');
  const code = /owner@valveside\.example: (\d{6})\n/.exec(start.output)?.[1];
  const [file = ''] = readdirSync(join(folder, 'mail'));
  expect(file).toMatch(/\.eml$/);
  expect(readFileSync(join(folder, 'mail', file), 'utf8')).toContain(code);
}
