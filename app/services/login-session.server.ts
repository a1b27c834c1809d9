import { randomBytes, randomUUID } from 'node:crypto';
import type { Transaction } from 'sequelize';
import type { Actor } from '~/access/can';
import { LoginSession } from '~/models/login-session.server';
import { User } from '~/models/user.server';
import { loadActor } from '~/queries/coach-access.server';
import type { PressureUnit } from '~/units';
import { readSessionToken, sessionDays } from './sign-in-cookies.server';
import { tokenHash } from './sign-in-keys.server';

/** Who is signed in on the browser that asks. */
export interface Viewer {
  readonly sessionId: string;
  readonly email: string;
  readonly name: string;
  readonly pressureUnit: PressureUnit;
  readonly actor: Actor;
}

/** Milliseconds between two notes of when a browser was last here: not a write for each request. */
const seenEvery = 5 * 60_000;

/** The person whose session the request carries, or null. No cookie, no question to the database. */
export async function findViewer(request: Request, now = new Date()): Promise<Viewer | null> {
  const token = await readSessionToken(request);
  if (!token) return null;
  const session = await LoginSession.findOne({ where: { tokenHash: tokenHash(token) } });
  if (!session || session.endedAt || session.expiresAt <= now) return null;
  const user = await User.findByPk(session.userId);
  if (!user) return null;
  if (now.getTime() - session.seenAt.getTime() >= seenEvery) await session.update({ seenAt: now });
  const { email, name, pressureUnit } = user;
  return { sessionId: session.id, email, name, pressureUnit, actor: await loadActor(user.id) };
}

/**
 * Adds a session row for a browser and returns its token, 256 random bits that are kept nowhere:
 * the row holds their hash.
 */
export async function startLoginSession(
  userId: string,
  userAgent: string,
  now: Date,
  transaction?: Transaction,
): Promise<string> {
  const token = randomBytes(32).toString('base64url');
  await LoginSession.create(
    {
      id: randomUUID(),
      tokenHash: tokenHash(token),
      userId,
      userAgent: userAgent.slice(0, 300),
      createdAt: now,
      seenAt: now,
      expiresAt: new Date(now.getTime() + sessionDays * 86_400_000),
    },
    transaction ? { transaction } : {},
  );
  return token;
}
