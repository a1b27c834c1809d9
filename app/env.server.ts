import { z } from 'zod';

/**
 * What the server is told from outside. This file is the only reader of `process.env` in `app/`;
 * nothing here has a default that would let a deployment run without its own secret or address.
 */
const schema = z.object({
  /** `local` and `test` are set by the set-up commands only; a deployment leaves it out. */
  VALVESIDE_MODE: z.enum(['local', 'test', 'production']).default('production'),
  NODE_ENV: z.string().default('production'),
  DATABASE_URL: urlOf(['postgres:', 'postgresql:'], 'a PostgreSQL address, postgres://…'),
  SMTP_URL: urlOf(['smtp:', 'smtps:'], 'a mail server address, smtp://… or smtps://…'),
  MAIL_FROM: required('the sender of mail, such as Valveside <no-reply@your.domain>').refine(
    (text) => /^[^<>]*<[^<>@\s]+@[^<>@\s]+>$|^[^<>@\s]+@[^<>@\s]+$/.test(text),
    'expected the sender of mail, such as Valveside <no-reply@your.domain>',
  ),
  SESSION_SECRET: required('at least 32 random characters').min(
    32,
    'expected at least 32 random characters',
  ),
  PUBLIC_URL: urlOf(
    ['http:', 'https:'],
    'the address that people open, https://… without a path',
  ).refine(
    (text) => new URL(text).pathname === '/' && !/[?#]/.test(text),
    'expected the address that people open, https://… without a path',
  ),
  PORT: z
    .string()
    .default('3000')
    .refine((text) => isPort(text), 'expected a port number between 1 and 65535')
    .transform(Number),
  HOST: z.string().min(1, 'expected an address to listen on').default('127.0.0.1'),
  /** Proxies in front whose `X-Forwarded-For` is believed; 0 when people reach the server itself. */
  TRUSTED_PROXIES: z
    .string()
    .default('0')
    .refine((text) => /^\d$/.test(text), 'expected how many proxies stand in front, 0 to 9')
    .transform(Number),
  LOG_LEVEL: z
    .enum(['fatal', 'error', 'warn', 'info', 'debug', 'trace', 'silent'], {
      error: 'expected one of fatal, error, warn, info, debug, trace, silent',
    })
    .default('info'),
});

type Raw = z.output<typeof schema>;

export interface Env extends Omit<Raw, 'PUBLIC_URL' | 'VALVESIDE_MODE'> {
  readonly PUBLIC_URL: URL;
  readonly mode: Raw['VALVESIDE_MODE'];
}

/** Names every variable that is missing or wrong, and what is expected of it. */
export class EnvError extends Error {
  override readonly name = 'EnvError';
  constructor(readonly problems: readonly string[]) {
    super(`The environment is not complete:\n${problems.map((line) => `  ${line}`).join('\n')}`);
  }
}

/**
 * Reads settings from a set of variables. An empty variable counts as missing.
 * @throws {EnvError} naming each variable that is missing or wrong; values are never repeated,
 * since they can be secrets.
 */
export function parseEnv(source: Readonly<Record<string, string | undefined>>): Env {
  const given = Object.entries(source).filter(([, value]) => value !== undefined && value !== '');
  const parsed = schema.safeParse(Object.fromEntries(given));
  if (!parsed.success) {
    throw new EnvError(
      parsed.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`),
    );
  }
  const { VALVESIDE_MODE: mode, PUBLIC_URL, ...rest } = parsed.data;
  return { ...rest, mode, PUBLIC_URL: new URL(PUBLIC_URL) };
}

let parsedOnce: Env | undefined;

function read(): Env {
  parsedOnce ??= parseEnv(process.env);
  return parsedOnce;
}

/**
 * Reads the settings now, so that a server with incomplete ones ends at once.
 * @throws {EnvError}
 */
export function requireEnv(): void {
  read();
}

/** The settings, parsed at the first use and then kept, so that importing this never throws. */
export const env: Env = new Proxy({} as Env, {
  get: (_, key) => Reflect.get(read(), key),
  has: (_, key) => Reflect.has(read(), key),
});

/** The address that people open: decides links, QR codes, cookies and the Origin check. */
export function publicUrl(): URL {
  return env.PUBLIC_URL;
}

/**
 * How much the log says. Read alone and not kept: the log is made when a module is loaded, and the
 * other settings may not be there yet. A wrong level is told by the full reading at the start.
 */
export function logLevel(): Env['LOG_LEVEL'] {
  const told = schema.shape.LOG_LEVEL.safeParse(process.env.LOG_LEVEL || undefined);
  return told.success ? told.data : 'info';
}

/** True under Vite's dev server only. */
export function isDevelopment(): boolean {
  return env.NODE_ENV === 'development';
}

function required(what: string) {
  return z.string({ error: `missing, expected ${what}` });
}

function urlOf(protocols: readonly string[], what: string) {
  return required(what).refine((text) => {
    const url = URL.parse(text);
    return url !== null && protocols.includes(url.protocol) && url.hostname !== '';
  }, `expected ${what}`);
}

function isPort(text: string): boolean {
  return /^\d{1,5}$/.test(text) && Number(text) >= 1 && Number(text) <= 65_535;
}
