import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { type ParsedMail, simpleParser } from 'mailparser';
import { wait } from './run';

/** The first run of exactly six digits in a text: a sign-in code. */
export function findCode(text: string): string | undefined {
  return /(?<!\d)\d{6}(?!\d)/.exec(text)?.[0];
}

/** Everything that the mail fake kept for an address, oldest first. */
export async function mailTo(folder: string, address: string): Promise<ParsedMail[]> {
  if (!existsSync(folder)) return [];
  const files = readdirSync(folder).filter((file) => file.endsWith('.eml'));
  const mails = await Promise.all(
    files.sort().map((file) => simpleParser(readFileSync(join(folder, file)))),
  );
  return mails.filter((mail) => recipients(mail).includes(address.toLowerCase()));
}

/**
 * Waits for mail to an address and answers the code in the newest.
 * @param count how many messages to that address there must be by now
 * @throws Error when none comes within ten seconds
 */
export async function codeFor(folder: string, address: string, count = 1): Promise<string> {
  const until = Date.now() + 10_000;
  while (Date.now() < until) {
    const mails = await mailTo(folder, address);
    const code = mails.length >= count && findCode(mails.at(-1)?.text ?? '');
    if (code) return code;
    await wait(50);
  }
  throw new Error(`No mail number ${count} with a code came to ${address} within ten seconds.`);
}

function recipients(mail: ParsedMail): string[] {
  const to = mail.to ?? [];
  return (Array.isArray(to) ? to : [to])
    .flatMap(({ value }) => value)
    .map(({ address }) => (address ?? '').toLowerCase());
}
