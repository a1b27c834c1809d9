import AxeBuilder from '@axe-core/playwright';
import { type BrowserContext, expect, type Page, test } from '@playwright/test';
import type { FillResult } from '~/fill/replay';
import { kpaPerPsi } from '~/units';
import { simulateFill } from '../db/seed/simulated-fill';
import {
  createFillFor,
  createOpenRound,
  eventOf,
  eventsOf,
  usualSetup,
} from '../tests/factories/run';
import { createLoginSession } from '../tests/factories/user';
import { cookieOf } from './database';
import { query, server } from './setup/server';

// What one person did at a simulated coach, once for all tests of this file.
const done = simulateFill(usualSetup, {
  seed: 12,
  tire: { startKpa: usualSetup.tire.startKpa, volumeL: usualSetup.tire.volumeL },
  governor: { cutInKpa: 650, cutOutKpa: 820 },
  fitting: 'service',
});
const endMs = Math.round(done.endedAt * 1000);

/** A fill whose taps the server has; its owner is signed in on this browser. */
async function recordFill(context: BrowserContext, { ended }: { ended: boolean }) {
  const place = await createOpenRound();
  const startedAt = new Date(Date.now() - 45 * 60_000);
  const { runId, owner, body } = await createFillFor(place, { startedAt });
  await context.addCookies([cookieOf(await createLoginSession(owner.id))]);
  const send = async (events: unknown[]) => {
    const answer = await context.request.post(`${server.url}/api/v1/runs/${runId}/events`, {
      headers: { Origin: server.url },
      data: { v: 1, deviceId: body.deviceId, events },
    });
    expect(answer.status(), await answer.text()).toBe(200);
  };
  const taps = eventsOf(done.events);
  await send(ended ? [...taps, eventOf({ type: 'ended', how: done.how }, endMs)] : taps);
  return { address: `${server.url}/fills/${runId}/review`, runId, send, count: taps.length + 1 };
}

const rowsOf = (page: Page) => page.locator('.review-details tbody tr');

test('a fill is looked back at as figures, a chart and the same as a table', async ({
  page,
  context,
}) => {
  const { address, runId, count } = await recordFill(context, { ended: true });
  await page.goto(address);
  await expect(page.getByRole('heading', { level: 1 })).toHaveText('Steer left');
  const sentence = page.locator('.review-result');
  await expect(sentence).toContainText('From 100.0 to ', { timeout: 30_000 });
  const [row] = await query<{ result: FillResult; last_seq: number }>(
    'SELECT result, last_seq FROM run_results WHERE run_id = $1',
    [runId],
  );
  expect(row?.last_seq).toBe(count);
  const endPsi = ((row?.result.endKpa ?? 0) / kpaPerPsi).toFixed(1);
  await expect(sentence).toContainText(`From 100.0 to ${endPsi} psi, target 105.0.`);
  const chart = page.getByRole('img', { name: /^Chart\. From 100\.0 to / });
  await expect(chart.locator('svg .review-tire')).not.toHaveCount(0);
  await page.getByText('The same as a table').click();
  await expect(rowsOf(page)).toHaveCount(count);
  const width = await page.evaluate(() => document.documentElement.scrollWidth);
  expect(width).toBeLessThanOrEqual(page.viewportSize()?.width ?? 0);
  const { violations } = await new AxeBuilder({ page }).withTags(['wcag2a', 'wcag2aa']).analyze();
  expect(violations.map(({ id, nodes }) => [id, nodes[0]?.html])).toEqual([]);
});

test('the words of the calls do not stand on one another', async ({ page, context }) => {
  const { address } = await recordFill(context, { ended: true });
  await page.goto(address);
  const words = page.locator('.review-calls text');
  await expect(words.first()).toBeVisible({ timeout: 30_000 });
  const boxes = await words.evaluateAll((all) => all.map((each) => each.getBoundingClientRect()));
  const meeting = boxes.flatMap((a, index) =>
    boxes
      .slice(index + 1)
      .filter(
        (b) => a.left < b.right && b.left < a.right && a.top + 3 < b.bottom && b.top + 3 < a.bottom,
      ),
  );
  expect(meeting).toEqual([]);
});

test('what came after the end is shown and said to be not used', async ({ page, context }) => {
  const { address, send } = await recordFill(context, { ended: true });
  await send([
    eventOf({ type: 'chuck', on: true }, endMs + 9000),
    eventOf({ type: 'ended', how: 'stopped' }, endMs + 12_000),
  ]);
  await page.goto(address);
  const notes = page.getByRole('list', { name: 'Not used' });
  await expect(notes).toContainText('It had already ended when it was ended again.');
  await expect(notes).toContainText('One event came after the end.');
  await page.getByText('The same as a table').click({ timeout: 30_000 });
  await expect(rowsOf(page).filter({ hasText: 'after the end, not used' })).toHaveCount(1);
  await expect(rowsOf(page).filter({ hasText: 'already ended, not used' })).toHaveCount(1);
});

test('a fill that is open leads back to its screen', async ({ page, context }) => {
  const { address, runId } = await recordFill(context, { ended: false });
  await page.goto(address);
  await expect(page.locator('.review-result')).toContainText('This fill is still open.');
  const way = page.getByRole('link', { name: 'Go on with it' });
  await expect(way).toHaveAttribute('href', `/fills/${runId}`);
});

test('the chart library comes with this page and with no other', async ({ page, context }) => {
  const { address } = await recordFill(context, { ended: true });
  const scripts = new Map<string, Promise<string>>();
  page.on('response', (response) => {
    if (response.url().endsWith('.js')) scripts.set(response.url(), response.text());
  });
  const bringsCharts = async () => {
    const texts = await Promise.all(scripts.values());
    return texts.some((text) => text.includes('recharts-'));
  };
  await page.goto(`${server.url}/coaches`, { waitUntil: 'networkidle' });
  expect(scripts.size).toBeGreaterThan(0);
  expect(await bringsCharts()).toBe(false);
  await page.goto(address);
  await expect(page.locator('.review-chart')).toBeVisible({ timeout: 30_000 });
  expect(await bringsCharts()).toBe(true);
});

test('without script the table stands in the place of the chart', async ({ browser }) => {
  const context = await browser.newContext({ javaScriptEnabled: false });
  const { address, count } = await recordFill(context, { ended: true });
  const page = await context.newPage();
  // Without script nothing asks again, so the person does.
  await expect(async () => {
    await page.goto(address);
    await expect(page.getByRole('region', { name: 'The record' })).toBeVisible({ timeout: 1000 });
  }).toPass({ timeout: 40_000 });
  await expect(page.locator('.review-space-table tbody tr')).toHaveCount(count);
  await context.close();
});
