import { randomInt, randomUUID } from 'node:crypto';
import type { Mail } from '~/services/mail.server';
import { askForCode, enterCode, type SignInTools } from '~/services/sign-in.server';

/** A mailbox and a clock in place of the real ones. */
export function createTools() {
  const mails: Mail[] = [];
  let now = new Date();
  const tools: SignInTools = {
    sendMail: async (mail) => {
      mails.push(mail);
    },
    now: () => now,
  };
  return {
    tools,
    mails,
    mailsTo: (address: string) => mails.filter(({ to }) => to === address),
    /** The code in the newest mail to an address. */
    codeFor: (address: string) =>
      /\d{6}/.exec(mails.findLast(({ to }) => to === address)?.text ?? '')?.[0] ?? 'no code came',
    pass: (seconds: number) => {
      now = new Date(now.getTime() + seconds * 1000);
    },
  };
}

export const newAddress = () => `somebody-${randomUUID()}@mail.example`;

/** Six digits that are not `code`. */
export const otherThan = (code: string) => (code === '000000' ? '000001' : '000000');

/**
 * A browser that keeps its cookies, at an address of its own as the trusted proxy tells it
 * (the test file sets `TRUSTED_PROXIES` to 1).
 */
export function createBrowser(tools: SignInTools, client = newClient()) {
  const jar = new Map<string, string>();
  const request = (path: string, headers: Record<string, string> = {}) =>
    new Request(`http://localhost:3000${path}`, {
      headers: {
        'X-Forwarded-For': client,
        Cookie: [...jar].map((pair) => pair.join('=')).join('; '),
        ...headers,
      },
    });
  const keep = (response: Response) => {
    for (const line of response.headers.getSetCookie()) {
      const [pair = ''] = line.split(';', 1);
      const at = pair.indexOf('=');
      if (/max-age=0/i.test(line)) jar.delete(pair.slice(0, at));
      else jar.set(pair.slice(0, at), pair.slice(at + 1));
    }
    return response;
  };
  return {
    jar,
    request,
    ask: async (email: string, to = '', headers: Record<string, string> = {}) =>
      keep(await askForCode(request('/login', headers), { email, to }, tools)),
    enter: async (code: string) => {
      const answer = await enterCode(request('/login/code'), code, tools);
      if (answer.kind === 'signed-in') keep(answer.response);
      return answer;
    },
  };
}

const newClient = () => `198.51.${randomInt(256)}.${randomInt(256)}`;
