import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect, inject, test } from 'vitest';
import { sendMail } from '~/services/mail.server';
import { type ReceivedMail, startMailFake } from '../../db/setup/mail-fake';
import { findCode, mailTo as mailIn } from '../../db/setup/mail-folder';
import { codeFor, mailTo } from './mailbox';

test('mail that the app sends is kept, and its code is found', async () => {
  const to = 'kept@valveside.example';
  await sendMail({ to, subject: 'Your code', text: 'Your code is 042317. It holds ten minutes.' });
  expect(await codeFor(to)).toBe('042317');
  const [mail] = await mailTo(to);
  expect(mail?.subject).toBe('Your code');
  expect(mail?.from?.text).toContain('no-reply@valveside.example');
  expect(await mailTo('somebody-else@valveside.example')).toEqual([]);
});

test('every message is an .eml file, and the fake tells its code', async () => {
  const folder = join(inject('mailFolder'), 'of-its-own');
  const seen: ReceivedMail[] = [];
  const fake = await startMailFake({ folder, onMail: (mail) => seen.push(mail) });
  const { createTransport } = await import('nodemailer');
  await createTransport({ url: fake.url }).sendMail({
    from: 'a@valveside.example',
    to: 'strange/name@valveside.example',
    subject: 'Round',
    text: 'Code: 900001',
  });
  await fake.stop();
  expect(seen).toMatchObject([{ subject: 'Round', code: '900001' }]);
  const file = seen[0]?.file ?? '';
  expect(file.startsWith(`${folder}/`)).toBe(true);
  expect(file.slice(folder.length + 1)).toMatch(/^[^/]+\.eml$/);
  expect(readFileSync(file, 'utf8')).toContain('Code: 900001');
  expect(await mailIn(folder, 'nobody@valveside.example')).toEqual([]);
});

test.each([
  ['Your code is 123456.', '123456'],
  ['Call 5551234567 or type 000042', '000042'],
  ['There is none: 12345 and 1234567', undefined],
])('finds the code in "%s"', (text, code) => {
  expect(findCode(text)).toBe(code);
});
