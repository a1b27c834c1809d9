import { randomUUID } from 'node:crypto';
import { expect, type Page, test } from '@playwright/test';
import { kpaPerPsi } from '../app/units';
import { Driver } from './driver';
import { holdClock, stopClock } from './page-clock';
import { codeFor, query } from './setup/server';

/** Pressures of the cold check, psi, in the order of the walk. */
const found = ['103', '90', '90', '90.5', '90', '106.5'];
const target = { steer: 106, drive: 90 };

test.setTimeout(240_000);

test('a driver signs in, makes a coach, checks it cold, fills a tire and reviews the fill', async ({
  page,
}) => {
  await signIn(page);
  const coachId = await makeCoach(page);
  await describeAir(page, coachId);
  await holdClock(page);
  const roundId = await checkCold(page, coachId);
  const fillId = await fillSteerLeft(page);
  await review(page, fillId);
  await closeRound(page, roundId);
});

async function signIn(page: Page): Promise<void> {
  const email = `walker-${randomUUID()}@mail.example`;
  await page.goto('/coaches');
  await alive(page);
  await page.getByLabel('E-mail address').fill(email);
  await page.getByRole('button', { name: 'Send the code' }).click();
  await page.getByLabel('Code').fill(await codeFor(email));
  await page.getByRole('button', { name: 'Sign in' }).click();
  await expect(page).toHaveURL('/coaches');
}

async function makeCoach(page: Page): Promise<string> {
  await page.goto('/coaches/new');
  await alive(page);
  await page.getByLabel('Name').fill('Quiet Badger');
  for (const axle of ['Steer', 'Drive'] as const) {
    const group = page.getByRole('group', { name: `${axle} axle` });
    const psi = axle === 'Steer' ? target.steer : target.drive;
    await group.getByLabel('Target, cold').fill(String(psi));
    await group.getByLabel('Tire size').fill('275/80R22.5');
    await group.getByLabel('Sidewall limit').fill('120');
    await group.getByLabel('Wheel limit').fill('125');
  }
  await page.getByRole('button', { name: 'Make the coach' }).click();
  await expect(page.getByRole('heading', { name: 'Quiet Badger' })).toBeVisible();
  return new URL(page.url()).pathname.split('/')[2] ?? '';
}

async function describeAir(page: Page, coachId: string): Promise<void> {
  await page.goto(`/coaches/${coachId}/air`);
  await alive(page);
  await page.getByRole('textbox', { name: 'Hose' }).fill('Blue hose, 12 m');
  await page.getByRole('textbox', { name: 'Chuck' }).fill('Clip-on');
  await page.getByRole('textbox', { name: 'Gauge', exact: true }).fill('Tee gauge');
  await page.getByLabel('At the chuck, or on a hose without a valve').check();
  await page.getByRole('radio', { name: 'No', exact: true }).check();
  await page.getByRole('button', { name: 'Keep the rig' }).click();
  await expect(page.getByText('The rig is kept.')).toBeVisible();
  await page.getByLabel('The supply tank’s drain').check();
  await page.getByRole('button', { name: 'Keep the ways' }).click();
  await expect(page.getByText('The ways are kept.')).toBeVisible();
  await page.getByLabel('It fell with the supply').check();
  await page.getByRole('button', { name: 'Keep the outcome' }).click();
  await expect(page.getByText('The outcome is kept.')).toBeVisible();
}

async function checkCold(page: Page, coachId: string): Promise<string> {
  await page.goto(`/coaches/${coachId}/rounds/new`);
  await alive(page);
  await page.getByLabel('Place').fill('Gravel pit lay-by');
  await page.getByLabel('Altitude').fill('820');
  await page.getByLabel('Air temperature').fill('52');
  await page.getByLabel('Yes').check();
  await page.getByRole('button', { name: 'Start at Quiet Badger' }).click();
  await page.getByRole('button', { name: 'I have read this' }).click();
  for (const reading of found) {
    await page.clock.runFor(30_000);
    await page.getByLabel('Tire gauge reads, psi').fill(reading);
    await page.getByRole('button', { name: 'Enter' }).click();
  }
  await expect(page.getByRole('heading', { name: 'What to do' })).toBeVisible();
  await expect(page.getByRole('main')).toContainText('Steer left needs 3 psi');
  return new URL(page.url()).pathname.split('/')[2] ?? '';
}

async function fillSteerLeft(page: Page): Promise<string> {
  await page.getByRole('button', { name: 'Fill it Steer left' }).click();
  await expect(page).toHaveURL(/\/fills\//);
  const fillId = new URL(page.url()).pathname.split('/')[2] ?? '';
  const driver = new Driver(page, {
    seed: 20,
    tire: { startKpa: 103 * kpaPerPsi, volumeL: 130 },
    governor: { cutInKpa: 96 * kpaPerPsi, cutOutKpa: 121 * kpaPerPsi },
    fitting: 'service',
    engine: 'idle',
    supplyKpa: 108 * kpaPerPsi,
  });
  await expect(page.locator('main.live[data-call]')).toBeVisible();
  await stopClock(page);
  await driver.follow('done', 20 * 60);
  await page.clock.resume();
  expect(driver.calls).toEqual(
    expect.arrayContaining(['read-supply', 'chuck-on', 'chuck-off', 'done']),
  );
  expect(Math.abs(driver.coach.settledKpa() / kpaPerPsi - target.steer)).toBeLessThan(1.5);

  await reloadKeepsTheAdvice(page);
  await page.getByRole('button', { name: 'Finish this tire' }).click();
  await expect(page).toHaveURL(`/fills/${fillId}/review`);
  return fillId;
}

/** Nothing is lost by a reload: the call stands again, from the log that the server kept. */
async function reloadKeepsTheAdvice(page: Page): Promise<void> {
  const panel = page.getByRole('region', { name: 'Call' });
  await expect(panel.getByRole('heading')).toHaveText('Done');
  await expect(page.getByText(/not yet sent/i)).toHaveCount(0);
  await page.reload();
  await expect(panel.getByRole('heading')).toHaveText('Done');
}

interface Stored {
  result: {
    startKpa: number;
    endKpa: number;
    targetKpa: number;
    timesOn: number;
    secondsOn: number;
  };
  last_seq: number;
  events: number;
}

async function review(page: Page, fillId: string): Promise<void> {
  await expect(page.getByRole('heading', { level: 1 })).toContainText('Steer left');
  const [stored] = await query<Stored>(
    `SELECT result, runs.last_seq, (SELECT count(*)::int FROM run_events WHERE run_id = runs.id) AS events
     FROM runs JOIN run_results ON run_id = runs.id AND run_results.last_seq = runs.last_seq
     WHERE runs.id = $1`,
    [fillId],
  );
  if (!stored) throw new Error('no result is stored');
  expect(stored.events).toBe(stored.last_seq);
  expect(stored.result.startKpa).toBeCloseTo(103 * kpaPerPsi, 6);
  const end = stored.result.endKpa / kpaPerPsi;
  expect(Math.abs(end - target.steer)).toBeLessThanOrEqual(1);
  const shown = page.getByRole('main');
  await expect(shown).toContainText(`to ${end.toFixed(1)} psi`);
  await expect(shown).toContainText(String(stored.result.timesOn));
}

async function closeRound(page: Page, roundId: string): Promise<void> {
  await page.goto(`/rounds/${roundId}`);
  await alive(page);
  await expect(page.getByRole('main')).toContainText('Filled to its target.');
  await page.getByRole('button', { name: 'Close the round' }).click();
  await expect(page.getByRole('alert').first()).toBeVisible();
  for (const box of await page.getByRole('checkbox').all()) await box.check();
  await page.getByRole('button', { name: 'Close the round' }).click();
  await expect(page.getByRole('heading', { name: 'What the round found' })).toBeVisible();
  await expect
    .poll(async () => (await query('SELECT closed_at FROM rounds WHERE id = $1', [roundId]))[0])
    .toMatchObject({ closed_at: expect.any(Date) });
  const readings = await query<{ psi: number }>(
    `SELECT round((pressure_kpa / ${kpaPerPsi})::numeric, 2)::float AS psi FROM cold_readings
     WHERE round_id = $1 ORDER BY read_at`,
    [roundId],
  );
  expect(readings.map(({ psi }) => String(psi))).toEqual(found);
}

/** Answers once React has taken over, so that what is typed is not lost to it. */
const alive = (page: Page) =>
  expect
    .poll(() =>
      page.evaluate(
        () => '__reactRouterDataRouter' in window && document.readyState === 'complete',
      ),
    )
    .toBe(true);
