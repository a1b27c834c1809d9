import { type Browser, expect, type Page, test } from '@playwright/test';
import { kpaPerPsi } from '../app/units';
import { addMember, createCoach, type NewCoachFacts } from '../tests/factories/coach';
import { createRound } from '../tests/factories/round';
import { createUser } from '../tests/factories/user';
import { expectAccessible, open, signIn } from './pages';
import { query } from './setup/server';

// Two cores may be shared with a build.
test.setTimeout(120_000);

async function ownCoach(page: Page, facts: NewCoachFacts = {}) {
  const owner = await createUser();
  await signIn(page, owner.id);
  return { owner, ...(await createCoach(owner.id, facts)) };
}

/** Types a reading on the large keypad; one that is far off is asked about and entered again. */
async function enter(page: Page, tire: string, text: string, far = false): Promise<void> {
  await expect(page.getByRole('heading', { level: 1, name: tire })).toBeVisible();
  for (const key of text) await page.getByRole('button', { name: key, exact: true }).click();
  await page.getByRole('button', { name: 'Enter' }).click();
  if (!far) return;
  await expect(page.getByRole('alert')).toContainText('is far from its target.');
  await page.getByRole('button', { name: 'Enter' }).click();
}

const lineOf = (page: Page, tire: string) =>
  page.getByRole('listitem').filter({ has: page.getByRole('heading', { name: tire }) });

async function storedReadings(roundId: string) {
  const rows = await query<{ position: string; psi: number }>(
    `SELECT position, round((pressure_kpa / ${kpaPerPsi})::numeric, 2)::float AS psi
     FROM cold_readings WHERE round_id = $1 ORDER BY read_at`,
    [roundId],
  );
  return rows.map(({ position, psi }) => `${position} ${psi}`);
}

const roundIdOf = (page: Page) => new URL(page.url()).pathname.split('/')[2] ?? '';

test('a cold check sorts every tire and says why and what to do', async ({ page }) => {
  const { coachId } = await ownCoach(page, { layout: 'with-tag' });
  await open(page, `/coaches/${coachId}`);
  await page.getByRole('link', { name: 'Start a round' }).click();
  await page.getByLabel('Altitude').fill('5,280');
  await page.getByRole('button', { name: /^Start at/ }).click();
  await expect(page.getByRole('alert')).toContainText('Type the temperature of the air');
  await page.getByLabel('Air temperature').fill('-4');
  await page.getByRole('button', { name: /^Start at/ }).click();
  await expect(page.getByRole('heading', { name: 'Before the first tire' })).toBeVisible();
  await expectAccessible(page);
  await page.getByRole('button', { name: 'I have read this' }).click();

  // The keys of the large keypad are 72 px or more, whatever the window.
  const key = await page.getByRole('button', { name: '5', exact: true }).boundingBox();
  expect(key?.height).toBeGreaterThanOrEqual(72);
  await enter(page, 'Steer left', '106');
  await expect(page.getByRole('status').first()).toContainText('Steer left: 106 psi, needs air.');
  await enter(page, 'Drive left outer', '73.6', true);
  await enter(page, 'Drive left inner', '90.5');
  await enter(page, 'Tag left', '88');
  await page.getByRole('checkbox', { name: /^Warm/ }).check();
  await enter(page, 'Tag right', '95');
  await expect(page.getByRole('checkbox', { name: /^Warm/ })).toBeChecked();
  await page.getByRole('checkbox', { name: /^Warm/ }).uncheck();
  await enter(page, 'Drive right outer', '97.5');
  await enter(page, 'Drive right inner', '92');
  await page.getByRole('checkbox', { name: /^Warm/ }).check();
  await enter(page, 'Steer right', '107');

  await expect(page.getByRole('heading', { name: 'What to do' })).toBeVisible();
  await expect(lineOf(page, 'Steer left')).toContainText('Needs 4 psi. Fill it to 110 psi.');
  // 29 CFR 1910.177(f)(2)(i), 80 % of recommended, taken over as trade practice (memory).
  await expect(lineOf(page, 'Drive left outer')).toContainText('At or below 80 % of its target');
  await expect(lineOf(page, 'Drive left outer')).toContainText('looked at by a technician');
  await expect(lineOf(page, 'Drive left inner')).toContainText('carried both loads');
  await expect(lineOf(page, 'Tag left')).toContainText('holds');
  await expect(lineOf(page, 'Tag right')).toContainText('Never bleed it now.');
  await expect(lineOf(page, 'Drive right outer')).toContainText(
    '5.5 psi over. Let it down to 92 psi while it is cold.',
  );
  await expect(lineOf(page, 'Steer right')).toContainText(
    'Warm and still 3 psi below its cold target. Fill it to 110 psi. Check it again cold.',
  );
  await expect(page.getByRole('main')).toContainText(
    'Drive right outer is 5.5 psi above drive right inner, its dual.',
  );
  const fillable = page.getByRole('button', { name: /^Fill it/ });
  await expect(fillable).toHaveText([/Steer left/, /Steer right/]);
  await expectAccessible(page);

  await expect.poll(() => storedReadings(roundIdOf(page))).toHaveLength(8);
  const [round] = await query<{ altitude_m: number; ambient_c: number; read: Date | null }>(
    'SELECT altitude_m, ambient_c, cautions_at AS read FROM rounds WHERE id = $1',
    [roundIdOf(page)],
  );
  expect(round?.altitude_m).toBeCloseTo(5280 * 0.3048, 6);
  expect(round?.ambient_c).toBeCloseTo(-20, 6);
  expect(round?.read).toBeInstanceOf(Date);
});

test('a paused round goes on after a reload and on another phone', async ({ page, browser }) => {
  const { coachId, owner } = await ownCoach(page);
  const round = await createRound(coachId, { readings: { 'steer-left': 110 } });
  await open(page, `/coaches/${coachId}`);
  await page.getByRole('link', { name: /^Continue the round of/ }).click();
  await enter(page, 'Drive left outer', '92');
  await expect.poll(() => storedReadings(round.id)).toHaveLength(2);
  await page.reload();
  await page.waitForFunction(() => '__reactRouterDataRouter' in window);
  await enter(page, 'Drive left inner', '91');
  await expect.poll(() => storedReadings(round.id)).toHaveLength(3);

  const other = await otherPhone(browser, owner.id);
  await open(other, `/rounds/${round.id}`);
  await enter(other, 'Drive right outer', '92');
  // A reading is corrected by entering it again; both are kept, the newer one counts.
  await other.getByRole('link', { name: 'Correct it' }).click();
  await expect(other.getByRole('main')).toContainText('It read 92 psi.');
  await enter(other, 'Drive right outer', '90.5');
  await expect(other.getByRole('heading', { level: 1, name: 'Drive right inner' })).toBeVisible();
  await expect
    .poll(() => storedReadings(round.id))
    .toEqual([
      'steer-left 110',
      'drive-left-outer 92',
      'drive-left-inner 91',
      'drive-right-outer 92',
      'drive-right-outer 90.5',
    ]);
  await other.context().close();
});

async function otherPhone(browser: Browser, userId: string): Promise<Page> {
  const context = await browser.newContext();
  const page = await context.newPage();
  await signIn(page, userId);
  return page;
}

test('what is no pressure is refused beside the keypad and nothing is stored', async ({ page }) => {
  const { coachId } = await ownCoach(page);
  const round = await createRound(coachId);
  await open(page, `/rounds/${round.id}`);
  await enter(page, 'Steer left', '12..5');
  await expect(page.getByRole('alert')).toContainText('“12..5” is not a number.');
  await expect(page.getByRole('heading', { level: 1, name: 'Steer left' })).toBeVisible();
  expect(await storedReadings(round.id)).toEqual([]);
});

const allRead = {
  'steer-left': 110,
  'steer-right': 106,
  'drive-left-outer': 92,
  'drive-left-inner': 92,
  'drive-right-inner': 92,
  'drive-right-outer': 92,
};

test('a round closes only with the whole list of afterwards', async ({ page }) => {
  const { coachId } = await ownCoach(page);
  const round = await createRound(coachId, { readings: allRead });
  await open(page, `/rounds/${round.id}`);
  await page.getByRole('checkbox', { name: 'Chuck off' }).check();
  await page.getByRole('button', { name: 'Close the round' }).click();
  await expect(page.getByRole('alert')).toContainText('Still open: Caps on, Hose off and stowed');
  for (const box of await page.getByRole('checkbox').all()) await box.check();
  await page.getByRole('button', { name: 'Close the round' }).click();
  await expect(page.getByRole('heading', { name: 'What the round found' })).toBeVisible();
  await expect
    .poll(async () => (await query('SELECT closed_at FROM rounds WHERE id = $1', [round.id]))[0])
    .toMatchObject({ closed_at: expect.any(Date) });
  await open(page, `/coaches/${coachId}/history`);
  await expect(page.getByRole('row', { name: /Steer right/ })).toContainText('106.0');
  await expectAccessible(page);
});

test('no fill starts before the rig is described and the fitting gives air', async ({ page }) => {
  const { coachId, owner } = await ownCoach(page, { rig: null, outcome: 'no-air' });
  const round = await createRound(coachId, { readings: allRead });
  await open(page, `/rounds/${round.id}`);
  await expect(page.getByRole('button', { name: /^Fill it/ })).toHaveCount(0);
  await expect(page.getByRole('link', { name: 'Describe them' })).toBeVisible();
  await expect(page.getByRole('link', { name: 'Find another and test it' })).toBeVisible();
  const driver = await createUser();
  await addMember(coachId, driver.id, 'driver');
  await page.context().clearCookies();
  await signIn(page, driver.id);
  await open(page, `/rounds/${round.id}`);
  await expect(page.getByRole('main')).toContainText('The owner does that.');
  expect(await query('SELECT 1 FROM runs WHERE coach_id = $1', [coachId])).toEqual([]);
  expect(owner.id).not.toBe(driver.id);
});

test('a viewer sees what a round found and can run nothing of it', async ({ page }) => {
  const { coachId } = await createCoach((await createUser()).id);
  const round = await createRound(coachId, { readings: allRead });
  const viewer = await createUser();
  await addMember(coachId, viewer.id, 'viewer');
  await signIn(page, viewer.id);
  await open(page, `/rounds/${round.id}`);
  await expect(lineOf(page, 'Steer right')).toContainText('Needs 4 psi.');
  await expect(page.getByRole('main').getByRole('button')).toHaveCount(0);
});

test.describe('without script', () => {
  test.use({ javaScriptEnabled: false });

  test('a round is started, read and begun to be filled by plain forms', async ({ page }) => {
    const { coachId } = await ownCoach(page);
    await page.goto(`/coaches/${coachId}/rounds/new`);
    await page.getByLabel('Altitude').fill('300 m');
    await page.getByLabel('Air temperature').fill('12 C');
    await page.getByLabel('Time zone').fill('Nowhere/Town');
    await page.getByRole('button', { name: /^Start at/ }).click();
    await expect(page.getByRole('alert')).toContainText('Type a time zone');
    await page.getByLabel('Time zone').fill('Europe/Vienna');
    await page.getByRole('button', { name: /^Start at/ }).click();
    await page.getByRole('button', { name: 'I have read this' }).click();
    await page.getByLabel('Tire gauge reads').fill('1O6');
    await page.getByRole('button', { name: 'Enter' }).click();
    await expect(page.getByRole('alert')).toContainText('“1O6” is not a figure.');
    for (const reading of ['106', '92', '92', '92', '92', '110']) {
      await page.getByLabel('Tire gauge reads').fill(reading);
      await page.getByRole('button', { name: 'Enter' }).click();
    }
    await page.getByRole('button', { name: 'Fill it Steer left' }).click();
    await expect(page).toHaveURL(/\/fills\//);
    const runs = await query<{ position: string; psi: number }>(
      `SELECT position, ((setup #>> '{tire,startKpa}')::float / ${kpaPerPsi})::float AS psi
       FROM runs WHERE coach_id = $1`,
      [coachId],
    );
    expect(runs.map(({ position, psi }) => [position, psi.toFixed(1)])).toEqual([
      ['steer-left', '106.0'],
    ]);
  });
});
