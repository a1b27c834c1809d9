import { z } from 'zod';

/**
 * The small pieces that bodies of the API are made of. Every message is what would have been
 * accepted, in words with its unit: it goes into a refusal's `expected` as it stands.
 */

/** The version of every body; another one is refused. */
export const wireVersion = 1;

/** The engine's own range of gauge pressures. */
export const mostKpa = 1400;

/** A fill lasts at most a day. */
export const longestRunMs = 24 * 3_600_000;

/** End of 2199: a clock that was never set, not a time. */
const farthest = Date.UTC(2200, 0);

export const version = z.literal(wireVersion, { error: `${wireVersion}, the version of the body` });

/** An id made on the phone. PostgreSQL keeps UUIDs in lower case, so they are compared in it. */
export const idField = z
  .uuid({ error: 'a UUID, such as 3f0c8a52-6b1e-4d0f-9a7c-2e5d8b914c66' })
  .toLowerCase();

/** @param words what is expected, with the unit */
export const between = (least: number, most: number, words: string) =>
  z.number({ error: words }).min(least, { error: words }).max(most, { error: words });

/** Above `least`, which itself is refused. */
export const above = (least: number, most: number, words: string) =>
  z.number({ error: words }).gt(least, { error: words }).max(most, { error: words });

export const whole = (least: number, most: number, words: string) =>
  between(least, most, words).int({ error: words });

export const gaugePressure = between(0, mostKpa, `a gauge pressure of 0 to ${mostKpa} kPa`);

/** Distance of two marks of a gauge. */
export const stepKpa = above(0, mostKpa, `a step above 0 and up to ${mostKpa} kPa`);

export const yesNo = z.boolean({ error: 'true or false' });

const momentWords = 'a time in UTC after 1970, such as 2026-05-04T09:30:00.000Z';

/** A time in UTC, always with milliseconds: what is stored comes back as the same text. */
export const moment = z.iso
  .datetime({ error: momentWords })
  .refine((text) => !(Date.parse(text) < 0 || Date.parse(text) > farthest), { error: momentWords })
  .overwrite((text) => (Number.isNaN(Date.parse(text)) ? text : new Date(text).toISOString()));

export const text = (least: number, most: number, words: string) =>
  z.string({ error: words }).trim().min(least, { error: words }).max(most, { error: words });

export function oneOf<const Values extends readonly [string, ...string[]]>(values: Values) {
  return z.enum(values, { error: `one of ${values.join(', ')}` });
}

interface ObjectIssue {
  code?: string;
  keys?: string[];
}

/** An object that refuses fields that it doesn't know: a typing mistake must not be lost. */
export function exactly<Shape extends z.ZodRawShape>(what: string, shape: Shape) {
  return z.strictObject(shape, {
    error: (issue) => {
      const { code, keys = [] } = issue as ObjectIssue;
      return code === 'unrecognized_keys'
        ? `${what} without ${keys.map((key) => `"${key}"`).join(', ')}`
        : what;
    },
  });
}
