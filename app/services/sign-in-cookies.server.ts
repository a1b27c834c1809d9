import { type Cookie, createCookie } from 'react-router';
import { z } from 'zod';
import { publicUrl } from '~/env.server';
import { keyFor } from './sign-in-keys.server';

/** Days that a browser stays signed in. */
export const sessionDays = 90;
/** Long enough to tell somebody who comes late that the code has run out. */
const challengeSeconds = 3600;

const pendingSchema = z.object({
  id: z.uuid(),
  email: z.string(),
  /** Where the person wanted to go. */
  to: z.string(),
  /** The strategy's own cookie, kept inside this one: alone it is neither signed nor bound. */
  strategy: z.string(),
});

/** A code that this browser has asked for. */
export type PendingSignIn = z.infer<typeof pendingSchema>;

/** A browser keeps a `__Host-` cookie only when it is secure, for one host and for every path. */
function named(name: string, maxAge: number, secrets: string[]): Cookie {
  const secure = publicUrl().protocol === 'https:';
  return createCookie(secure ? `__Host-${name}` : name, {
    httpOnly: true,
    sameSite: 'lax',
    path: '/',
    secure,
    maxAge,
    secrets,
  });
}

const pendingCookie = () =>
  named('valveside-sign-in', challengeSeconds, [keyFor('sign-in cookie')]);
const sessionCookie = () => named('valveside-session', sessionDays * 86_400, []);

/** What this browser has asked for, or null when its cookie is missing or was changed. */
export async function readPending(request: Request): Promise<PendingSignIn | null> {
  const value: unknown = await pendingCookie().parse(request.headers.get('Cookie'));
  const parsed = pendingSchema.safeParse(value);
  return parsed.success ? parsed.data : null;
}

export const writePending = (pending: PendingSignIn) => pendingCookie().serialize(pending);
export const clearPending = () => pendingCookie().serialize('', { maxAge: 0 });

/** The token of the session cookie, or null. */
export async function readSessionToken(request: Request): Promise<string | null> {
  const value: unknown = await sessionCookie().parse(request.headers.get('Cookie'));
  return typeof value === 'string' && value !== '' ? value : null;
}

export const writeSessionToken = (token: string) => sessionCookie().serialize(token);
export const clearSessionToken = () => sessionCookie().serialize('', { maxAge: 0 });
