import { expect, type Page, test } from '@playwright/test';
import { createFillFor, createOpenRound, runBodyOf } from '../tests/factories/run';
import { createLoginSession } from '../tests/factories/user';
import { cookieOf } from './database';
import { query } from './setup/server';

/** A fill that has just begun, on the phone of its owner, who is signed in. */
async function openFill(page: Page) {
  const place = await createFillFor(await createOpenRound());
  await page.context().addCookies([cookieOf(await createLoginSession(place.owner.id))]);
  // A page with unsent taps asks before it goes; here the person says yes.
  page.on('dialog', (dialog) => dialog.accept());
  await page.goto(`/fills/${place.runId}`);
  await expect(purged(page)).toBeVisible();
  return place;
}

const purged = (page: Page) => page.getByRole('button', { name: 'It purged', exact: true });

const typesOf = async (runId: string) => {
  const rows = await query<{ type: string }>(
    `SELECT type FROM run_events WHERE run_id = $1 AND type <> 'call-shown' ORDER BY seq`,
    [runId],
  );
  return rows.map(({ type }) => type);
};

test('a tap in the last moment before a reload is kept and counts once', async ({ page }) => {
  const { runId } = await openFill(page);
  await purged(page).click();
  await page.reload();
  await expect(purged(page)).toBeVisible();
  await expect.poll(() => typesOf(runId)).toEqual(['cut-out']);
});

test('without signal taps count at once, are shown as not sent, and go when it returns', async ({
  page,
  context,
}) => {
  const { runId } = await openFill(page);
  await context.setOffline(true);
  await purged(page).click();
  await purged(page).click();
  const strip = page.getByRole('region', { name: 'Not yet at the server' });
  await expect(strip).toContainText('not sent yet');
  expect(await typesOf(runId)).toEqual([]);
  await context.setOffline(false);
  await expect(strip).toHaveCount(0, { timeout: 40_000 });
  await expect.poll(() => typesOf(runId)).toEqual(['cut-out', 'cut-out']);
});

test('a signed-out phone keeps its taps and says so', async ({ page, context }) => {
  const { runId, owner } = await openFill(page);
  await context.clearCookies();
  await purged(page).click();
  const strip = page.getByRole('region', { name: 'Not yet at the server' });
  await expect(strip).toContainText('You are signed out.');
  await context.addCookies([cookieOf(await createLoginSession(owner.id))]);
  await strip.getByRole('button', { name: 'Send now' }).click();
  await expect(strip).toHaveCount(0);
  await expect.poll(() => typesOf(runId)).toEqual(['cut-out']);
});

test('what the server refuses is listed with its reason and can be sent again', async ({
  page,
}) => {
  const { runId } = await openFill(page);
  let refusing = true;
  await page.route('**/events', async (route) => {
    if (!refusing || route.request().method() !== 'POST') return route.continue();
    const errors = [{ index: 0, field: 'events.atMs', value: 1, expected: 'another time' }];
    await route.fulfill({
      status: 400,
      headers: { 'X-Server-Time': String(Date.now()) },
      json: { status: 400, code: 'bad-input', detail: 'It cannot be used.', errors },
    });
  });
  await purged(page).click();
  const strip = page.getByRole('region', { name: 'Not yet at the server' });
  await expect(strip).toContainText('refused');
  await strip.getByRole('button', { name: 'Show them' }).click();
  await expect(strip.getByRole('listitem').first()).toContainText('Expected as events.atMs');
  refusing = false;
  await strip.getByRole('button', { name: 'Send again' }).click();
  await expect(strip).toHaveCount(0);
  await expect.poll(() => typesOf(runId)).toEqual(['cut-out']);
});

test('a fill that has ended leads to its review, and its id takes no other set-up', async ({
  page,
}) => {
  const { runId, roundId, tires } = await openFill(page);
  const other = runBodyOf(roundId, tires['steer-right']);
  const answer = await page.request.put(`/api/v1/runs/${runId}`, { data: other });
  expect(answer.status()).toBe(409);
  await page.getByRole('button', { name: 'More' }).click();
  await page.getByRole('button', { name: 'End this fill' }).click();
  await page.getByRole('button', { name: 'Yes, end it' }).click();
  await expect(page).toHaveURL(`/fills/${runId}/review`);
  await page.goto(`/fills/${runId}`);
  await expect(page).toHaveURL(`/fills/${runId}/review`);
  expect(await typesOf(runId)).toEqual(['ended']);
});
