import type { Page } from '@playwright/test';

/** Behind the real clock by this much at the start, so that the page never gets ahead of it. */
const headStartMs = 45 * 60_000;

/**
 * Puts a page's clock into the test's hands, and the server's as that page sees it: the server's
 * time in an answer is replaced by the page's own, as if both had waited.
 */
export async function holdClock(page: Page): Promise<void> {
  let now = Date.now() - headStartMs;
  await page.clock.install({ time: now });
  await page.route('**/api/v1/**', async (route) => {
    // A page that is going away can't be asked; it doesn't read the answer either.
    now = await page.evaluate(() => Date.now()).catch(() => now);
    // The server may close an idle connection at the very moment that it is used again.
    const answer = await route.fetch({ maxRetries: 3 });
    await route.fulfill({
      response: answer,
      headers: { ...answer.headers(), 'x-server-time': String(now) },
    });
  });
}

/** From now on the page's clock stands still, and goes on only when the test says so. */
export async function stopClock(page: Page): Promise<void> {
  const now = await page.evaluate(() => Date.now());
  await page.clock.pauseAt(now + 1000);
}
