import { TOTPStrategy } from 'remix-auth-totp';
import { beforeEach, expect, test, vi } from 'vitest';
import { triesPerCode } from '~/commands/sign-in-count-try.server';
import { LoginSession } from '~/models/login-session.server';
import { User } from '~/models/user.server';
import { loader as codePage } from '~/routes/login/code';
import { readPending, writePending } from '~/services/sign-in-cookies.server';
import { keyFor } from '~/services/sign-in-keys.server';
import { createBrowser, createTools, newAddress, otherThan } from './factories/browser';
import { createUser } from './factories/user';

// The holes of the strategy package, each closed by the guard, and what else the guard promises.

vi.stubEnv('TRUSTED_PROXIES', '1');

let post: ReturnType<typeof createTools>;
beforeEach(() => {
  post = createTools();
});

async function browserThatAsked(email: string) {
  const browser = createBrowser(post.tools);
  await browser.ask(email);
  return { browser, code: post.codeFor(email) };
}

const setPending = async (
  browser: ReturnType<typeof createBrowser>,
  change: Parameters<typeof writePending>[0],
) => {
  const [pair = ''] = (await writePending(change)).split(';', 1);
  browser.jar.set('valveside-sign-in', pair.slice(pair.indexOf('=') + 1));
};

test('a cookie that was edited is no cookie', async () => {
  const { browser, code } = await browserThatAsked(newAddress());
  const value = browser.jar.get('valveside-sign-in') ?? '';
  const [content = '', signature = ''] = decodeURIComponent(value).split('.');
  const read = Buffer.from(content, 'base64').toString().replace('somebody', 'notebody');
  const edited = Buffer.from(read).toString('base64');
  browser.jar.set('valveside-sign-in', encodeURIComponent(`${edited}.${signature}`));
  expect(await browser.enter(code)).toEqual({ kind: 'ask-again' });
});

test('hole 1: an address edited inside the strategy’s cookie signs nobody in', async () => {
  const victim = await createUser();
  const mine = newAddress();
  const { browser, code } = await browserThatAsked(mine);
  const pending = await readPending(browser.request('/login/code'));
  if (!pending) throw new Error('no cookie');
  const strategy = withAddress(pending.strategy, victim.email);
  await setPending(browser, { ...pending, email: victim.email, strategy });
  expect((await browser.enter(code)).kind).toBe('wrong');
  expect(await LoginSession.count({ where: { userId: victim.id } })).toBe(0);
  // Written back the same way, but with its own address, the cookie is good: only that was refused.
  await setPending(browser, { ...pending, strategy: withAddress(pending.strategy, mine) });
  expect((await browser.enter(code)).kind).toBe('signed-in');
});

function withAddress(cookie: string, email: string): string {
  const content = new URLSearchParams(cookie);
  content.set('email', email);
  return content.toString();
}

test('hole 1: the strategy’s cookie of one code does not go with another challenge', async () => {
  const email = newAddress();
  const [one, two] = [await browserThatAsked(email), await browserThatAsked(email)];
  const first = await readPending(one.browser.request('/login/code'));
  const second = await readPending(two.browser.request('/login/code'));
  if (!first || !second) throw new Error('no cookie');
  await setPending(two.browser, { ...first, strategy: second.strategy });
  if (one.code !== two.code) expect((await two.browser.enter(two.code)).kind).toBe('wrong');
  expect((await one.browser.enter(one.code)).kind).toBe('signed-in');
});

test('hole 2: after five tries the right code is refused too', async () => {
  const { browser, code } = await browserThatAsked(newAddress());
  const answers = [];
  for (let time = 0; time < triesPerCode; time += 1) {
    answers.push(await browser.enter(otherThan(code)));
  }
  const wrong = (triesLeft: number) => ({ kind: 'wrong', triesLeft });
  expect(answers).toEqual([wrong(4), wrong(3), wrong(2), wrong(1), { kind: 'ask-again' }]);
  expect(await browser.enter(code)).toEqual({ kind: 'ask-again' });
});

test('hole 2: an old copy of the cookie brings no tries back', async () => {
  const { browser, code } = await browserThatAsked(newAddress());
  const before = browser.jar.get('valveside-sign-in') ?? '';
  for (let time = 0; time < triesPerCode; time += 1) {
    await browser.enter(otherThan(code));
    browser.jar.set('valveside-sign-in', before);
  }
  expect(await browser.enter(code)).toEqual({ kind: 'ask-again' });
});

test('hole 3: a code works once', async () => {
  const { browser, code } = await browserThatAsked(newAddress());
  const cookie = browser.jar.get('valveside-sign-in') ?? '';
  expect((await browser.enter(code)).kind).toBe('signed-in');
  expect(browser.jar.has('valveside-sign-in')).toBe(false);
  browser.jar.set('valveside-sign-in', cookie);
  expect(await browser.enter(code)).toEqual({ kind: 'ask-again' });
});

test('hole 4: a forged Host header gets no link into the mail', async () => {
  const email = newAddress();
  const host = { Host: 'elsewhere.example', 'X-Forwarded-Host': 'elsewhere.example' };
  await createBrowser(post.tools).ask(email, '', host);
  const [mail] = post.mailsTo(email);
  expect(mail?.text).toMatch(/\d{6}/);
  expect(JSON.stringify(mail)).not.toMatch(/:\/\/|elsewhere|[?&]t=/);
});

test('hole 4: a magic link of the package’s own making opens nothing', async () => {
  const email = newAddress();
  const { browser } = await browserThatAsked(email);
  const pending = await readPending(browser.request('/login/code'));
  const link = await magicLinkFor(email);
  const request = browser.request(`/login/code${link.search}`, {
    Cookie: `valveside-sign-in=${browser.jar.get('valveside-sign-in')}; _totp=${pending?.strategy}`,
  });
  const page = await codePage({ request } as Parameters<typeof codePage>[0]);
  expect(page).toEqual({ email, to: '/coaches' });
  expect(await User.count({ where: { email } })).toBe(0);
});

async function magicLinkFor(email: string): Promise<URL> {
  let made = '';
  const strategy = new TOTPStrategy<never>(
    {
      secret: keyFor('sign-in strategy'),
      magicLinkPath: '/login/code',
      emailSentRedirect: '/',
      successRedirect: '/',
      failureRedirect: '/',
      sendTOTP: async ({ magicLink }) => {
        made = magicLink;
      },
    },
    () => Promise.reject(new Error('not reached')),
  );
  const body = new URLSearchParams({ email });
  const request = new Request('http://localhost:3000/login', { method: 'POST', body });
  await strategy.authenticate(request).catch(() => undefined);
  return new URL(made);
}

test('a code works only in the browser that asked for it', async () => {
  const email = newAddress();
  const { code } = await browserThatAsked(email);
  expect(await createBrowser(post.tools).enter(code)).toEqual({ kind: 'ask-again' });
  const other = await browserThatAsked(email);
  if (other.code !== code) expect((await other.browser.enter(code)).kind).toBe('wrong');
  expect((await other.browser.enter(other.code)).kind).toBe('signed-in');
});

test('a code works for ten minutes', async () => {
  const late = await browserThatAsked(newAddress());
  post.pass(600);
  expect(await late.browser.enter(late.code)).toEqual({ kind: 'ask-again' });
  const early = await browserThatAsked(newAddress());
  post.pass(599);
  expect((await early.browser.enter(early.code)).kind).toBe('signed-in');
});

test('of one code used many times at once, one succeeds', async () => {
  const email = newAddress();
  const { browser, code } = await browserThatAsked(email);
  const answers = await Promise.all(Array.from({ length: 12 }, () => browser.enter(code)));
  expect(answers.filter(({ kind }) => kind === 'signed-in')).toHaveLength(1);
  const user = await User.findOne({ where: { email }, rejectOnEmpty: true });
  expect(await LoginSession.count({ where: { userId: user.id } })).toBe(1);
});

test('of wrong codes sent at once no more than five are looked at', async () => {
  const { browser, code } = await browserThatAsked(newAddress());
  const wrong = otherThan(code);
  const answers = await Promise.all(Array.from({ length: 20 }, () => browser.enter(wrong)));
  expect(answers.filter(({ kind }) => kind === 'wrong')).toHaveLength(triesPerCode - 1);
  expect(await browser.enter(code)).toEqual({ kind: 'ask-again' });
});
