import { inject } from 'vitest';
import * as folder from '../../db/setup/mail-folder';

/** Mail that the app sent to an address in this run, oldest first. Give every test its own address. */
export const mailTo = (address: string) => folder.mailTo(inject('mailFolder'), address);

/** Waits for the sign-in code in the newest mail to an address. */
export const codeFor = (address: string, count = 1) =>
  folder.codeFor(inject('mailFolder'), address, count);
