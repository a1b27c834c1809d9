import { beforeEach, expect, test, vi } from 'vitest';
import { LoginSession } from '~/models/login-session.server';
import { SignInChallenge } from '~/models/sign-in-challenge.server';
import { User } from '~/models/user.server';
import { log } from '~/services/log.server';
import { findViewer } from '~/services/login-session.server';
import { sendMail } from '~/services/mail.server';
import { Refusal } from '~/services/refusal.server';
import { createBrowser, createTools, newAddress } from './factories/browser';
import { createUser } from './factories/user';
import { mailTo } from './setup/mailbox';

vi.stubEnv('TRUSTED_PROXIES', '1');

let post: ReturnType<typeof createTools>;
beforeEach(() => {
  post = createTools();
});

test('a code signs the address in and makes its account the first time', async () => {
  const email = newAddress();
  const browser = createBrowser(post.tools);
  const asked = await browser.ask(email);
  expect(asked.headers.get('Location')).toBe('/login/code');
  expect(await User.count({ where: { email } })).toBe(0);

  const answer = await browser.enter(post.codeFor(email));

  expect(answer.kind).toBe('signed-in');
  const viewer = await findViewer(browser.request('/coaches'));
  expect(viewer).toMatchObject({ email, name: '', pressureUnit: 'psi' });
  expect([...(viewer?.actor.roles ?? [])]).toEqual([]);
});

test('signing in again finds the same account', async () => {
  const known = await createUser({ pressureUnit: 'bar' });
  const browser = createBrowser(post.tools);
  await browser.ask(known.email);
  await browser.enter(post.codeFor(known.email));
  const viewer = await findViewer(browser.request('/'));
  expect(viewer?.actor.userId).toBe(known.id);
  expect(viewer?.pressureUnit).toBe('bar');
});

test('the code has six digits and its mail says how long it works', async () => {
  const email = newAddress();
  await createBrowser(post.tools).ask(email);
  const [mail] = post.mailsTo(email);
  expect(mail?.text).toMatch(/^Your code is \d{6}\.\n/);
  expect(mail?.text).toContain('within ten minutes');
  expect(mail?.subject).not.toMatch(/\d/);
});

test('neither the code nor the session token is kept as it is', async () => {
  const email = newAddress();
  const browser = createBrowser(post.tools);
  await browser.ask(email);
  const code = post.codeFor(email);
  const challenge = await SignInChallenge.findOne({ where: { email }, rejectOnEmpty: true });
  expect(challenge.codeHmac).toMatch(/^[0-9a-f]{64}$/);
  expect(JSON.stringify(challenge)).not.toContain(`"${code}"`);
  await browser.enter(code);
  const session = await LoginSession.findOne({
    order: [['createdAt', 'DESC']],
    rejectOnEmpty: true,
  });
  const cookie = Buffer.from(
    decodeURIComponent(browser.jar.get('valveside-session') ?? ''),
    'base64',
  );
  const token = JSON.parse(cookie.toString()) as string;
  expect(Buffer.from(token, 'base64url')).toHaveLength(32);
  expect(session.tokenHash).not.toContain(token);
});

test('after signing in one goes where one wanted to go', async () => {
  const email = newAddress();
  const browser = createBrowser(post.tools);
  await browser.ask(email, '/rounds/1?x=2');
  const answer = await browser.enter(post.codeFor(email));
  expect(answer.kind === 'signed-in' && answer.response.headers.get('Location')).toBe(
    '/rounds/1?x=2',
  );
});

test('a way to another site is left out', async () => {
  const email = newAddress();
  const browser = createBrowser(post.tools);
  await browser.ask(email, 'https://elsewhere.example/');
  const answer = await browser.enter(post.codeFor(email));
  expect(answer.kind === 'signed-in' && answer.response.headers.get('Location')).toBe('/coaches');
});

test('cookies are out of reach for scripts and other sites', async () => {
  const email = newAddress();
  const browser = createBrowser(post.tools);
  const asked = await browser.ask(email);
  const answer = await browser.enter(post.codeFor(email));
  const lines = [
    ...asked.headers.getSetCookie(),
    ...(answer.kind === 'signed-in' ? answer.response.headers.getSetCookie() : []),
  ];
  expect(lines).toHaveLength(3);
  for (const line of lines) {
    expect(line).toMatch(/; HttpOnly/);
    expect(line).toMatch(/; SameSite=Lax/);
    expect(line).toMatch(/; Path=\//);
  }
});

test('a mail that does not go out is said, and its code does not count', async () => {
  const email = newAddress();
  const logged = vi.spyOn(log, 'error').mockImplementation(() => undefined);
  const failing = { ...post.tools, sendMail: () => Promise.reject(new Error('no mail server')) };
  for (let time = 0; time < 6; time += 1) {
    const asked = createBrowser(failing).ask(email);
    await expect(asked).rejects.toMatchObject({ code: 'mail-failed', status: 503 });
    await expect(asked).rejects.toBeInstanceOf(Refusal);
  }
  expect(logged).toHaveBeenCalledTimes(6);
  logged.mockRestore();
  await createBrowser(post.tools).ask(email);
  expect(post.mailsTo(email)).toHaveLength(1);
});

test('a fault of the database is thrown, not taken for a wrong code', async () => {
  const email = newAddress();
  const browser = createBrowser(post.tools);
  await browser.ask(email);
  const broken = vi.spyOn(User, 'findOne').mockRejectedValueOnce(new Error('connection lost'));
  await expect(browser.enter(post.codeFor(email))).rejects.toThrow('connection lost');
  broken.mockRestore();
  expect((await browser.enter(post.codeFor(email))).kind).toBe('signed-in');
});

test('the code goes out by the mail server that is configured', async () => {
  const email = newAddress();
  const browser = createBrowser({ ...post.tools, sendMail });
  await browser.ask(email);
  const [mail] = await mailTo(email);
  expect(mail?.subject).toBe('Your Valveside code');
});
