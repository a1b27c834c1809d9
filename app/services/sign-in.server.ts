import { randomUUID } from 'node:crypto';
import { redirect } from 'react-router';
import { countTry } from '~/commands/sign-in-count-try.server';
import { markNotSent, openChallenge } from '~/commands/sign-in-open-challenge.server';
import { redeemCode } from '~/commands/sign-in-redeem-code.server';
import { clientAddress } from './client-address.server';
import { localPath } from './local-path.server';
import { log } from './log.server';
import { sendMail } from './mail.server';
import { Refusal } from './refusal.server';
import {
  clearPending,
  type PendingSignIn,
  readPending,
  writePending,
  writeSessionToken,
} from './sign-in-cookies.server';
import { clientHmac, codeHmac } from './sign-in-keys.server';
import { runStrategy } from './sign-in-strategy.server';

/** Where people go who wanted nothing in particular. */
export const firstPage = '/coaches';

/** What sign-in reaches outside for; tests bring their own. */
export interface SignInTools {
  sendMail: typeof sendMail;
  now: () => Date;
}
const standing: SignInTools = { sendMail, now: () => new Date() };

/**
 * Sends a code to `email` and answers with the way to the page that takes it. The answer is the
 * same for an address with an account, one without, and one that has had its codes for this hour.
 * @param to where to go afterwards; anything but a path of this site is left out
 * @throws Refusal `too-many-codes` (429) for a client that asks too often, `mail-failed` (503)
 */
export async function askForCode(
  request: Request,
  { email, to }: { email: string; to: string },
  tools: SignInTools = standing,
): Promise<Response> {
  const id = randomUUID();
  const client = clientHmac(clientAddress(request));
  const outcome = await runStrategy({
    fields: { email },
    send: async (code) => {
      const challenge = { id, email, client, codeHmac: codeHmac(id, code), now: tools.now() };
      const { send } = await openChallenge(challenge);
      if (send) await mailCode({ id, email, code }, tools);
    },
  });
  if (outcome.kind !== 'sent') throw new Error('The sign-in strategy sent no code');
  const pending = { id, email, to: localPath(to, firstPage), strategy: outcome.cookie };
  return redirect('/login/code', { headers: { 'Set-Cookie': await writePending(pending) } });
}

async function mailCode(
  { id, email, code }: { id: string; email: string; code: string },
  tools: SignInTools,
): Promise<void> {
  const text = [
    `Your code is ${code}.`,
    'Type it on the page where you asked for it. It works once, within ten minutes.',
    'If you did not ask for it, do nothing. Give it to nobody.',
  ];
  try {
    await tools.sendMail({
      to: email,
      subject: 'Your Valveside code',
      text: `${text.join('\n\n')}\n`,
    });
  } catch (error) {
    log.error({ err: error }, 'A sign-in code could not be sent');
    await markNotSent(id);
    throw new Refusal('unavailable', 'mail-failed', 'The mail did not go out. Try again in 1 min.');
  }
}

/** What became of a code that was typed. */
export type CodeAnswer =
  | { kind: 'signed-in'; response: Response }
  /** It is not the code; so many tries are left. */
  | { kind: 'wrong'; triesLeft: number }
  /** This browser has not asked, or what it asked for is used, used up or has run out. */
  | { kind: 'ask-again' };

/** Takes a code of six digits that was typed in the browser that asked for it. */
export async function enterCode(
  request: Request,
  code: string,
  tools: SignInTools = standing,
): Promise<CodeAnswer> {
  const pending = await readPending(request);
  if (!pending) return { kind: 'ask-again' };
  // Counted before the strategy sees it, and counted whatever comes of it.
  const triesLeft = await countTry(pending.id, tools.now());
  if (triesLeft === null) return { kind: 'ask-again' };
  const userAgent = request.headers.get('User-Agent') ?? '';
  const outcome = await runStrategy({
    fields: { code },
    cookie: pending.strategy,
    verify: (email) => signIn(pending, { email, code, userAgent }, tools.now()),
  });
  if (outcome.kind === 'verified') return { kind: 'signed-in', response: outcome.response };
  return triesLeft === 0 ? { kind: 'ask-again' } : { kind: 'wrong', triesLeft };
}

async function signIn(
  pending: PendingSignIn,
  typed: { email: string; code: string; userAgent: string },
  now: Date,
): Promise<Response | null> {
  const { email, code, userAgent } = typed;
  const hmac = codeHmac(pending.id, code);
  const token = await redeemCode({
    challengeId: pending.id,
    email,
    codeHmac: hmac,
    userAgent,
    now,
  });
  if (!token) return null;
  const headers = new Headers();
  headers.append('Set-Cookie', await writeSessionToken(token));
  headers.append('Set-Cookie', await clearPending());
  return redirect(localPath(pending.to, firstPage), { headers });
}
