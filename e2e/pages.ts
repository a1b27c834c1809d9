import { AxeBuilder } from '@axe-core/playwright';
import { expect, type Page } from '@playwright/test';
import { createLoginSession } from '../tests/factories/user';
import { cookieOf } from './database';

export async function signIn(page: Page, userId: string): Promise<void> {
  await page.context().addCookies([cookieOf(await createLoginSession(userId))]);
}

/** Opens a page and waits until React has taken over, so that what is typed is not lost to it. */
export async function open(page: Page, path: string): Promise<void> {
  await page.goto(path);
  await page.waitForFunction(
    () => '__reactRouterDataRouter' in window && document.readyState === 'complete',
  );
}

export async function expectAccessible(page: Page): Promise<void> {
  const { violations } = await new AxeBuilder({ page }).analyze();
  expect(violations.map(({ id, nodes }) => `${id}: ${nodes[0]?.html}`)).toEqual([]);
}
