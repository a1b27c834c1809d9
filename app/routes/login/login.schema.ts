import { z } from 'zod';

/** Longest address that mail can be sent to, characters (RFC 5321, 4.5.3.1.3). */
const longestEmail = 254;

/** An address as it is stored: lower case, without blanks around it. */
export const askSchema = z.object({
  email: z
    .string('Type your e-mail address.')
    .trim()
    .toLowerCase()
    .min(1, 'Type your e-mail address.')
    .max(longestEmail, `Type an address of at most ${longestEmail} characters.`)
    .pipe(z.email('Type one e-mail address, for example name@mail.example.')),
  to: z.string().catch(''),
});

/** A code as people type it: with or without blanks. */
export const codeSchema = z.object({
  code: z
    .string('Type the code from the mail.')
    .transform((text) => text.replace(/\s/g, ''))
    .pipe(z.string().regex(/^[0-9]{6}$/, 'Type the six digits of the code.')),
});
