import { randomBytes } from 'node:crypto';
import { createContext, type MiddlewareFunction } from 'react-router';
import { isDevelopment, publicUrl } from '~/env.server';

/** The nonce of this answer's scripts; the page and its policy share it. */
export const nonceContext = createContext<string>('');

/**
 * Gives every answer the headers that keep other sites and scripts out.
 * Recharts writes style attributes, hence `style-src-attr`; Vite's dev server writes style elements.
 */
export const securityHeaders: MiddlewareFunction<Response> = async ({ context }, next) => {
  const nonce = randomBytes(16).toString('base64');
  context.set(nonceContext, nonce);
  const response = await next();
  const headers = response.headers;
  headers.set('Content-Security-Policy', contentPolicy(nonce));
  // Pages hold one person's figures: nothing between here and the browser may keep them.
  if (!headers.has('Cache-Control')) headers.set('Cache-Control', 'private, no-cache');
  headers.set('X-Content-Type-Options', 'nosniff');
  headers.set('Referrer-Policy', 'same-origin');
  headers.set('Permissions-Policy', 'camera=(self), geolocation=(), microphone=()');
  headers.set('X-Frame-Options', 'DENY');
  if (publicUrl().protocol === 'https:') {
    headers.set('Strict-Transport-Security', 'max-age=31536000; includeSubDomains');
  }
  return response;
};

function contentPolicy(nonce: string): string {
  const dev = isDevelopment();
  return [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}'`,
    `style-src 'self'${dev ? " 'unsafe-inline'" : ''}`,
    "style-src-attr 'unsafe-inline'",
    "img-src 'self' data: blob:",
    "font-src 'self'",
    `connect-src 'self'${dev ? ' ws:' : ''}`,
    "worker-src 'self'",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join('; ');
}
