import { beforeEach, expect, test, vi } from 'vitest';
import { codesPerAddress, codesPerClient } from '~/commands/sign-in-open-challenge.server';
import { SignInChallenge } from '~/models/sign-in-challenge.server';
import { loader as codePage } from '~/routes/login/code';
import { createBrowser, createTools, newAddress, otherThan } from './factories/browser';
import { createUser } from './factories/user';

vi.stubEnv('TRUSTED_PROXIES', '1');

let post: ReturnType<typeof createTools>;
beforeEach(() => {
  post = createTools();
});

async function fill(email: string): Promise<void> {
  for (let time = 0; time < codesPerAddress; time += 1) await createBrowser(post.tools).ask(email);
}

test('an address gets five codes an hour, from whichever clients', async () => {
  const email = newAddress();
  await fill(email);
  await createBrowser(post.tools).ask(email);
  expect(post.mailsTo(email)).toHaveLength(5);
  post.pass(3601);
  await createBrowser(post.tools).ask(email);
  expect(post.mailsTo(email)).toHaveLength(6);
});

test('asking at once gets an address no more than five codes', async () => {
  const email = newAddress();
  await Promise.all(Array.from({ length: 12 }, () => createBrowser(post.tools).ask(email)));
  expect(post.mailsTo(email)).toHaveLength(codesPerAddress);
});

test('codes that were refused do not keep an address locked', async () => {
  const email = newAddress();
  await fill(email);
  post.pass(1800);
  await createBrowser(post.tools).ask(email);
  post.pass(1801);
  await createBrowser(post.tools).ask(email);
  expect(post.mailsTo(email)).toHaveLength(codesPerAddress + 1);
});

/** Everything that a browser gets to see after asking, and after five wrong codes. */
async function whatIsSeen(email: string) {
  const browser = createBrowser(post.tools);
  const asked = await browser.ask(email);
  const cookie = asked.headers.getSetCookie().map((line) => line.replace(/=[^;]*/, ''));
  const length = decodeURIComponent(asked.headers.getSetCookie().join()).length;
  const request = browser.request('/login/code');
  const page = await codePage({ request } as Parameters<typeof codePage>[0]);
  const wrong = otherThan(post.codeFor(email));
  const tries = [];
  for (let time = 0; time < 6; time += 1) tries.push(await browser.enter(wrong));
  const names = [...asked.headers.keys()];
  return {
    status: asked.status,
    location: asked.headers.get('Location'),
    body: await asked.text(),
    names,
    cookie,
    length,
    page: { ...page, email: '' },
    tries,
  };
}

test('known, unknown and limited addresses are answered alike', async () => {
  const known = await createUser({ email: newAddress() });
  const limited = newAddress();
  await fill(limited);
  const unknown = await whatIsSeen(newAddress());
  expect(unknown.tries.map(({ kind }) => kind).slice(0, 4)).toEqual(Array(4).fill('wrong'));
  expect(await whatIsSeen(known.email)).toEqual(unknown);
  expect(await whatIsSeen(limited)).toEqual(unknown);
});

test('a client may ask twenty times an hour, for whatever addresses', async () => {
  const client = '203.0.113.7';
  const ask = () => createBrowser(post.tools, client).ask(newAddress());
  const asked = await Promise.allSettled(Array.from({ length: 25 }, ask));
  expect(asked.filter(({ status }) => status === 'fulfilled')).toHaveLength(codesPerClient);
  expect(post.mails).toHaveLength(codesPerClient);
  await expect(ask()).rejects.toMatchObject({
    status: 429,
    words: 'Too many codes were asked for from here. Try again in 60 min.',
  });
  await createBrowser(post.tools, '203.0.113.8').ask(newAddress());
  post.pass(3601);
  await ask();
});

test('codes that were not sent count for the client', async () => {
  const email = newAddress();
  const client = '203.0.113.9';
  for (let time = 0; time < codesPerClient; time += 1) {
    await createBrowser(post.tools, client).ask(email);
  }
  expect(post.mailsTo(email)).toHaveLength(codesPerAddress);
  await expect(createBrowser(post.tools, client).ask(email)).rejects.toMatchObject({
    code: 'too-many-codes',
  });
});

test('no address of a client is kept, and nothing of a challenge for longer than a day', async () => {
  const email = newAddress();
  await createBrowser(post.tools, '203.0.113.10').ask(email);
  const row = await SignInChallenge.findOne({ where: { email }, rejectOnEmpty: true });
  expect(row.client).toMatch(/^[0-9a-f]{64}$/);
  post.pass(86_401);
  await createBrowser(post.tools).ask(newAddress());
  expect(await SignInChallenge.count({ where: { email } })).toBe(0);
});
