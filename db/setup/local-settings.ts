import { join } from 'node:path';
import { openLocalDatabase } from './local-database';
import { localSecret } from './local-secret';
import { type ReceivedMail, startMailFake } from './mail-fake';
import { dataFolder, makePassable } from './paths';
import { seed } from './seed';
import type { Stopping } from './stopping';

export type Variables = Readonly<Record<string, string | undefined>>;

/**
 * Completes the settings of a start on one's own machine: what is given is used, and what is missing
 * gets a stand-in that this starts and `stopping` ends.
 * @param given the environment as it is
 * @param port where the app will listen
 */
export async function localSettings(
  given: Variables,
  port: number,
  stopping: Stopping,
): Promise<Variables> {
  makePassable(dataFolder);
  const settings = {
    ...given,
    VALVESIDE_MODE: 'local',
    SESSION_SECRET: given.SESSION_SECRET || localSecret(dataFolder),
    PUBLIC_URL: given.PUBLIC_URL || `http://localhost:${port}`,
    MAIL_FROM: given.MAIL_FROM || 'Valveside <no-reply@valveside.example>',
    SMTP_URL: given.SMTP_URL || (await standInForMail(stopping)),
  };
  if (given.DATABASE_URL) return settings;
  console.log('Opening the database …');
  const databaseUrl = await openLocalDatabase(stopping, (url) => {
    console.log('Filling in the demo …');
    return seed({ ...settings, DATABASE_URL: url });
  });
  return { ...settings, DATABASE_URL: databaseUrl };
}

async function standInForMail(stopping: Stopping): Promise<string> {
  const fake = await startMailFake({ folder: join(dataFolder, 'mail'), onMail: showMail });
  stopping.add('mail fake', () => fake.stop());
  return fake.url;
}

function showMail({ to, subject, code }: ReceivedMail): void {
  console.log(code ? `Sign-in code for ${to.join(', ')}: ${code}` : `Mail to ${to}: ${subject}`);
}
