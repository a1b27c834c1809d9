import { RouterContextProvider } from 'react-router';
import { expect, test, vi } from 'vitest';
import { endLoginSessions } from '~/commands/account-end-sessions.server';
import { sequelize } from '~/models/database.server';
import { LoginSession } from '~/models/login-session.server';
import { findDevices } from '~/queries/account-devices.server';
import { action as logout } from '~/routes/login/logout';
import { findViewer } from '~/services/login-session.server';
import { provideViewer } from '~/services/viewer.server';
import { createLoginSession, createUser } from './factories/user';

const requestWith = (cookie?: string) =>
  new Request('http://localhost:3000/account', { headers: cookie ? { Cookie: cookie } : {} });

test('a request without a cookie asks the database nothing', async () => {
  const query = vi.spyOn(sequelize, 'query');
  expect(await findViewer(requestWith())).toBeNull();
  expect(await findViewer(requestWith('theme=dusk'))).toBeNull();
  expect(query).not.toHaveBeenCalled();
  query.mockRestore();
});

test('a made-up token is nobody', async () => {
  const made = Buffer.from(JSON.stringify('made-up')).toString('base64');
  expect(await findViewer(requestWith(`valveside-session=${made}`))).toBeNull();
  expect(await findViewer(requestWith('valveside-session=%%%'))).toBeNull();
});

test('a session ends after ninety days', async () => {
  const user = await createUser();
  const cookie = await createLoginSession(user.id);
  const after = (days: number) => new Date(Date.now() + days * 86_400_000);
  expect(await findViewer(requestWith(cookie), after(89))).not.toBeNull();
  expect(await findViewer(requestWith(cookie), after(91))).toBeNull();
});

test('when a browser was here is noted at most every five minutes', async () => {
  const user = await createUser();
  const cookie = await createLoginSession(user.id);
  const seen = async () =>
    (await LoginSession.findOne({ where: { userId: user.id }, rejectOnEmpty: true })).seenAt;
  const first = await seen();
  const later = (minutes: number) => new Date(first.getTime() + minutes * 60_000);
  await findViewer(requestWith(cookie), later(4));
  expect(await seen()).toEqual(first);
  await findViewer(requestWith(cookie), later(6));
  expect(await seen()).toEqual(later(6));
});

test('one browser can be signed out from another, and all others at once', async () => {
  const user = await createUser();
  const [here = '', there = '', third = ''] = await Promise.all(
    ['Here/1', 'There/1', 'Third/1'].map((agent) => createLoginSession(user.id, agent)),
  );
  const devices = await findDevices(user.id);
  expect(devices.map(({ userAgent }) => userAgent).sort()).toEqual([
    'Here/1',
    'There/1',
    'Third/1',
  ]);
  const idOf = (agent: string) => devices.find(({ userAgent }) => userAgent === agent)?.id ?? '';

  expect(await endLoginSessions(user.id, { only: idOf('There/1') })).toBe(1);
  expect(await findViewer(requestWith(there))).toBeNull();
  expect(await findViewer(requestWith(third))).not.toBeNull();

  expect(await endLoginSessions(user.id, { allBut: idOf('Here/1') })).toBe(1);
  expect(await findViewer(requestWith(third))).toBeNull();
  expect(await findViewer(requestWith(here))).not.toBeNull();
  expect(await findDevices(user.id)).toHaveLength(1);
});

test('nobody ends the session of somebody else', async () => {
  const [mine, other] = await Promise.all([createUser(), createUser()]);
  const cookie = await createLoginSession(other.id);
  const [device] = await findDevices(other.id);
  expect(await endLoginSessions(mine.id, { only: device?.id ?? '' })).toBe(0);
  expect(await findViewer(requestWith(cookie))).not.toBeNull();
});

test('signing out ends the row and takes the cookie away', async () => {
  const user = await createUser();
  const cookie = await createLoginSession(user.id);
  const context = new RouterContextProvider();
  const request = requestWith(cookie);
  await provideViewer({ request, context }, async () => new Response());
  const url = new URL(request.url);
  const answer = await logout({ request, context, url, params: {}, pattern: '/logout' });
  expect(answer.headers.get('Set-Cookie')).toMatch(/^valveside-session=[^;]*; Max-Age=0/);
  expect(await findViewer(requestWith(cookie))).toBeNull();
});
