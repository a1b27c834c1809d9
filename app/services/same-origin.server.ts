import type { MiddlewareFunction } from 'react-router';
import { publicUrl } from '~/env.server';
import { apiAnswers, pageAnswers } from './answers.server';
import { Refusal } from './refusal.server';

/**
 * Refuses every write that another site makes a browser send. It goes by the public address, since
 * behind a TLS proxy the server itself sees another scheme and often another host; the framework's
 * own check goes by those and is therefore opened (`allowedActionOrigins`). It covers API routes
 * too, which the framework's check does not.
 */
export const sameOrigin: MiddlewareFunction<Response> = async ({ request }, next) => {
  if (isRead(request.method) || comesFromHere(request, publicUrl())) return next();
  const isApi = new URL(request.url).pathname.startsWith('/api/');
  return (isApi ? apiAnswers(refuse) : pageAnswers(refuse))(request);
};

const isRead = (method: string) => ['GET', 'HEAD', 'OPTIONS'].includes(method);

async function refuse(): Promise<never> {
  const words = `This came from another address. Open ${publicUrl().origin} and do it there.`;
  throw new Refusal('not-allowed', 'other-origin', words);
}

/**
 * Browsers name the page that a write came from. What names none is no page: a program, which holds
 * nobody's cookies; but a browser that hides the name still says whether the site is another.
 */
export function comesFromHere(request: Request, site: URL): boolean {
  const origin = request.headers.get('Origin');
  if (origin !== null) return isSite(origin, site);
  const fetchSite = request.headers.get('Sec-Fetch-Site');
  return fetchSite === null || fetchSite === 'same-origin' || fetchSite === 'none';
}

function isSite(origin: string, site: URL): boolean {
  if (origin === site.origin) return true;
  // On loopback the machine has several names, and people type any of them.
  const from = URL.parse(origin);
  if (!from || !isLoopback(from) || !isLoopback(site)) return false;
  return from.protocol === site.protocol && from.port === site.port;
}

const isLoopback = ({ hostname }: URL) => ['localhost', '127.0.0.1', '[::1]'].includes(hostname);
