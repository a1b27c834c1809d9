import { Authenticator } from 'remix-auth';
import { TOTPStrategy } from 'remix-auth-totp';
import { codeSeconds } from '~/commands/sign-in-open-challenge.server';
import { keyFor } from './sign-in-keys.server';

/** Six digits by mail, ten minutes. */
const codes = {
  algorithm: 'SHA-256',
  charSet: '0123456789',
  digits: 6,
  period: codeSeconds,
} as const;

/** Where the strategy says to go on; read only to tell its outcomes apart. */
const sentPath = '/sent';
const failedPath = '/failed';

const cookieName = '_totp';

export interface StrategyWork {
  /** What the form holds: an address to send a code to, or a code that was typed. */
  fields: { email: string } | { code: string };
  /** What the strategy's own cookie held, empty at first. */
  cookie?: string;
  send?: (code: string) => Promise<void>;
  /** The code fits the cookie. Returns where to go with which cookies, or null to refuse. */
  verify?: (email: string) => Promise<Response | null>;
}

export type StrategyOutcome =
  | { kind: 'sent'; cookie: string }
  | { kind: 'verified'; response: Response }
  | { kind: 'failed' };

/**
 * Runs the package's flow once. It gets a request of our own making that holds the form's one field
 * and its cookie, no more: a body with both an address and a code, a forged Host header or a magic
 * link never reach it. What it throws comes back as an outcome; faults of ours go on being thrown,
 * since it would make any error look like a wrong code.
 */
export async function runStrategy(work: StrategyWork): Promise<StrategyOutcome> {
  let fault: { error: unknown } | undefined;
  let verified = false;
  const guarded = async <Result>(step: () => Promise<Result>): Promise<Result> => {
    try {
      return await step();
    } catch (error) {
      if (!(error instanceof Response)) fault = { error };
      throw error;
    }
  };
  const strategy = new TOTPStrategy<never>(
    {
      secret: keyFor('sign-in strategy'),
      totpGeneration: codes,
      emailSentRedirect: sentPath,
      successRedirect: failedPath,
      failureRedirect: failedPath,
      // The form's schema has checked the address already.
      validateEmail: async () => true,
      sendTOTP: ({ code }) => guarded(async () => work.send?.(code)),
    },
    ({ email }) =>
      guarded(async () => {
        const response = await work.verify?.(email);
        verified = Boolean(response);
        throw response ?? new Response(null, { status: 302, headers: { Location: failedPath } });
      }),
  );
  const response = await thrownBy(new Authenticator().use(strategy, 'code'), ownRequest(work));
  if (fault) throw fault.error;
  if (verified) return { kind: 'verified', response: withoutCookie(response) };
  if (response.headers.get('Location') !== sentPath) return { kind: 'failed' };
  return { kind: 'sent', cookie: cookieOf(response) };
}

function ownRequest({ fields, cookie }: StrategyWork): Request {
  return new Request('http://sign-in.invalid/', {
    method: 'POST',
    body: new URLSearchParams(fields),
    headers: cookie ? { Cookie: `${cookieName}=${cookie}` } : {},
  });
}

async function thrownBy(authenticator: Authenticator, request: Request): Promise<Response> {
  try {
    await authenticator.authenticate('code', request);
  } catch (thrown) {
    if (thrown instanceof Response) return thrown;
    throw thrown;
  }
  throw new Error('The sign-in strategy answered nothing');
}

const isOwnCookie = (line: string) => line.startsWith(`${cookieName}=`);

function cookieOf(response: Response): string {
  const line = response.headers.getSetCookie().find(isOwnCookie) ?? '';
  return line.slice(cookieName.length + 1).split(';', 1)[0] ?? '';
}

/** The response as it was thrown into the strategy, which adds its cookie to everything. */
function withoutCookie(response: Response): Response {
  const cookies = response.headers.getSetCookie().filter((line) => !isOwnCookie(line));
  const headers = new Headers(response.headers);
  headers.delete('Set-Cookie');
  for (const cookie of cookies) headers.append('Set-Cookie', cookie);
  return new Response(response.body, { status: response.status, headers });
}
