import nodemailer, { type Transporter } from 'nodemailer';
import { env } from '~/env.server';

export interface Mail {
  readonly to: string;
  readonly subject: string;
  readonly text: string;
  readonly html?: string;
}

/** A mail server that hangs must not hold a request for minutes, as the package's defaults would. */
const TIMEOUT_MS = 10_000;

let kept: Transporter | undefined;

function transport(): Transporter {
  kept ??= nodemailer.createTransport({
    url: env.SMTP_URL,
    connectionTimeout: TIMEOUT_MS,
    greetingTimeout: TIMEOUT_MS,
    socketTimeout: TIMEOUT_MS,
  });
  return kept;
}

/**
 * Hands one message to the mail server.
 * @throws Error when the server cannot be reached or refuses it
 */
export async function sendMail({ to, subject, text, html }: Mail): Promise<void> {
  await transport().sendMail({ from: env.MAIL_FROM, to, subject, text, html });
}
