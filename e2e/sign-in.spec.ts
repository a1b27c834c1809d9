import { randomUUID } from 'node:crypto';
import { AxeBuilder } from '@axe-core/playwright';
import { expect, type Page, test } from '@playwright/test';
import { createLoginSession, createUser } from '../tests/factories/user';
import { cookieOf } from './database';
import { codeFor, query } from './setup/server';

const newAddress = () => `walker-${randomUUID()}@mail.example`;

async function expectAccessible(page: Page): Promise<void> {
  const { violations } = await new AxeBuilder({ page }).analyze();
  expect(violations.map(({ id, nodes }) => `${id}: ${nodes[0]?.html}`)).toEqual([]);
}

/** Answers once React has taken over, so that what is typed is not lost to it. */
const whenAlive = (page: Page) =>
  page.waitForFunction(
    () => '__reactRouterDataRouter' in window && document.readyState === 'complete',
  );

async function askFor(page: Page, email: string): Promise<void> {
  await page.getByLabel('E-mail address').fill(email);
  await page.getByRole('button', { name: 'Send the code' }).click();
  await expect(page.getByRole('heading', { name: 'Type the code' })).toBeVisible();
}

test('somebody new signs in by mail, says how to be called and signs out', async ({ page }) => {
  const email = newAddress();
  await page.goto('/account');
  await expect(page).toHaveURL('/login?to=%2Faccount');
  await whenAlive(page);

  await page.getByLabel('E-mail address').fill('nobody@');
  await page.getByRole('button', { name: 'Send the code' }).click();
  const problem = 'Type one e-mail address, for example name@mail.example.';
  await expect(page.getByRole('alert')).toContainText(problem);
  await expect(page.getByLabel('E-mail address')).toHaveValue('nobody@');
  await expect(page.getByLabel('E-mail address')).toHaveAccessibleDescription(problem);
  await askFor(page, `  ${email.toUpperCase()} `);

  const code = await codeFor(email);
  await page.getByLabel('Code').fill('12345');
  await page.getByRole('button', { name: 'Sign in' }).click();
  await expect(page.getByRole('alert')).toContainText('Type the six digits of the code.');
  await page.getByLabel('Code').fill(code === '000000' ? '000001' : '000000');
  await page.getByRole('button', { name: 'Sign in' }).click();
  await expect(page.getByRole('alert')).toContainText('This is not the code.');
  await expect(page.getByRole('alert')).toContainText('4 tries are left.');
  await expect(page.getByLabel('Code')).not.toHaveValue('');
  await page.getByLabel('Code').fill(`${code.slice(0, 3)} ${code.slice(3)}`);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await expect(page).toHaveURL('/account');

  await page.getByLabel('Your name').fill('Wanda Walker');
  await page.getByLabel('bar').check();
  await page.getByRole('button', { name: 'Save' }).click();
  await expect(page.getByRole('status')).toHaveText('Saved.');
  await page.reload();
  await expect(page.getByLabel('Your name')).toHaveValue('Wanda Walker');
  await expect(page.getByLabel('bar')).toBeChecked();
  expect(await query('SELECT name, pressure_unit FROM users WHERE email = $1', [email])).toEqual([
    { name: 'Wanda Walker', pressure_unit: 'bar' },
  ]);

  await page.getByRole('button', { name: 'Sign out' }).click();
  await expect(page).toHaveURL('/');
  await page.goto('/account');
  await expect(page).toHaveURL('/login?to=%2Faccount');
});

test('the pages of sign-in and account break no rule of accessibility', async ({
  page,
  context,
}) => {
  await page.goto('/login');
  await whenAlive(page);
  await expectAccessible(page);
  await askFor(page, newAddress());
  await expectAccessible(page);
  const user = await createUser({ email: newAddress(), name: 'Wanda Walker' });
  const cookies = await Promise.all([1, 2].map(() => createLoginSession(user.id, 'There/1.0')));
  await context.addCookies([cookieOf(cookies[0] ?? '')]);
  await page.goto('/account');
  await expectAccessible(page);
  await page.goto('/logout');
  await expectAccessible(page);
});

test.describe('without script', () => {
  test.use({ javaScriptEnabled: false });

  test('signing in works, and keeps what was typed', async ({ page }) => {
    const email = newAddress();
    await page.goto('/login?to=/account');
    await page.getByLabel('E-mail address').fill('nobody');
    await page.getByRole('button', { name: 'Send the code' }).click();
    await expect(page.getByLabel('E-mail address')).toHaveValue('nobody');
    await askFor(page, email);
    await page.getByLabel('Code').fill(await codeFor(email));
    await page.getByRole('button', { name: 'Sign in' }).click();
    await expect(page).toHaveURL('/account');
    await expect(page.getByText(email)).toBeVisible();
  });
});

test('a browser is signed out from another one', async ({ page, context, browser, baseURL }) => {
  const user = await createUser({ email: newAddress() });
  const [here, there, third] = await Promise.all(
    ['Here/1.0 (Laptop)', 'There/1.0 (Phone)', 'Third/1.0 (Slate)'].map((agent) =>
      createLoginSession(user.id, agent),
    ),
  );
  await context.addCookies([cookieOf(here ?? '')]);
  const other = await browser.newContext({ baseURL: baseURL ?? '' });
  await other.addCookies([cookieOf(there ?? '')]);
  const otherPage = await other.newPage();
  await otherPage.goto('/account');
  await expect(otherPage).toHaveURL('/account');

  await page.goto('/account');
  await expect(page.getByRole('listitem')).toHaveCount(3);
  await page.getByRole('button', { name: 'Sign out There · Phone' }).click();
  await expect(page.getByRole('status')).toHaveText('Signed out there.');
  await expect(page.getByRole('listitem')).toHaveCount(2);
  await otherPage.goto('/account');
  await expect(otherPage).toHaveURL('/login?to=%2Faccount');

  await page.getByRole('button', { name: 'Sign out everywhere else' }).click();
  await expect(page.getByRole('listitem')).toHaveCount(1);
  expect(third).toBeTruthy();
  await other.close();
});
