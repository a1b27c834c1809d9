import { expect, type Page, test } from '@playwright/test';
import { kpaPerPsi } from '../app/units';
import { addMember, createCoach } from '../tests/factories/coach';
import { createUser } from '../tests/factories/user';
import { expectAccessible, open, signIn } from './pages';
import { query } from './setup/server';

// Two cores may be shared with a build.
test.setTimeout(120_000);

async function typeAxle(page: Page, name: string, target: string): Promise<void> {
  const axle = page.getByRole('group', { name: `${name} axle` });
  await axle.getByLabel('Target, cold').fill(target);
  await axle.getByLabel('Tire size').fill('295/75 r 22,5');
  await axle.getByLabel('Sidewall limit').fill('120');
  await axle.getByLabel('Wheel limit').fill('115');
}

const coachIdOf = (page: Page) => new URL(page.url()).pathname.split('/')[2] ?? '';

test('somebody new is told what to do and makes a coach with a tag axle', async ({ page }) => {
  await signIn(page, (await createUser()).id);
  await open(page, '/coaches');
  await expect(page.getByRole('heading', { name: 'No coach yet' })).toBeVisible();
  await page.getByRole('link', { name: 'Make a coach' }).click();
  await expect(page.getByRole('group', { name: 'Tag axle' })).toBeHidden();
  await page.getByRole('radio', { name: /Three/ }).check();
  await page.getByLabel('Name', { exact: true }).fill('Late Heron');
  await typeAxle(page, 'Steer', '110');
  await typeAxle(page, 'Drive', '92');
  await typeAxle(page, 'Tag', '88');
  const steer = page.getByRole('group', { name: 'Steer axle' });
  await expect(steer.getByText(/About \d+ L by its size/)).toBeVisible();
  await expectAccessible(page);
  await page.getByRole('button', { name: 'Make the coach' }).click();

  await expect(page.getByRole('heading', { name: 'Late Heron' })).toBeVisible();
  await expect(page.getByRole('main')).toContainText('No tire has been read yet.');
  await expect(page.getByRole('link', { name: 'Describe them' })).toBeVisible();
  await expect(page.getByRole('link', { name: 'Test the fitting' })).toBeVisible();
  await expectAccessible(page);
  const tires = await query<{ size: string; source: string; volume: number }>(
    `SELECT size, volume_source AS source, volume_l AS volume FROM tires WHERE coach_id = $1`,
    [coachIdOf(page)],
  );
  expect(tires).toHaveLength(8);
  for (const tire of tires) {
    expect(tire).toMatchObject({ size: '295/75R22.5', source: 'estimated' });
    // TRA Design Guide 3-24R2 (2004), 70 to 85 % of the outer envelope (share from memory):
    // 3.14 · (8.71 + 22.5) · (11.61 · 8.71) in³ is 162 L.
    expect(tire.volume).toBeGreaterThan(162 * 0.7 - 1);
    expect(tire.volume).toBeLessThan(162 * 0.85 + 1);
  }
});

test('what cannot be used comes back beside its field, with what was typed', async ({ page }) => {
  const { id } = await createUser();
  await signIn(page, id);
  await open(page, '/coaches/new');
  await typeAxle(page, 'Steer', '11o');
  await typeAxle(page, 'Drive', '92');
  const drive = page.getByRole('group', { name: 'Drive axle' });
  await drive.getByLabel('Tire size').fill('37x12.50R17');
  await page.getByRole('button', { name: 'Make the coach' }).click();
  const summary = page.getByRole('alert');
  await expect(summary).toContainText('Type a name for the coach.');
  await expect(summary).toContainText('“11o” is not a figure.');
  await expect(summary).toContainText('gives no volume. Type the volume of air too.');
  await expect(page.getByLabel('Target, cold').first()).toHaveValue('11o');
  await expect(page.getByLabel('Target, cold').first()).toHaveAttribute('aria-invalid', 'true');

  await page.getByLabel('Name', { exact: true }).fill('Late Heron');
  await page.getByLabel('Target, cold').first().fill('118');
  await drive.getByLabel('Volume of air').fill('150');
  await page.getByRole('button', { name: 'Make the coach' }).click();
  await expect(page.getByRole('alert')).toContainText(
    '118 psi is above what the wheel allows, 115 psi. Type 115 psi or less.',
  );
  expect(await query('SELECT 1 FROM memberships WHERE user_id = $1', [id])).toEqual([]);

  await page.getByLabel('Target, cold').first().fill('115');
  await page.getByRole('button', { name: 'Make the coach' }).click();
  await expect(page.getByRole('heading', { name: 'Late Heron' })).toBeVisible();
});

test('an owner describes the air, and the coach is ready for its first fill', async ({ page }) => {
  const owner = await createUser();
  const { coachId } = await createCoach(owner.id, { rig: null, outcome: null });
  await signIn(page, owner.id);
  await open(page, `/coaches/${coachId}/air`);
  await page.getByLabel('Hose', { exact: true }).fill('Grey hose, 15 m');
  await page.getByLabel('Chuck', { exact: true }).fill('Closed clip-on');
  await page.getByLabel('Gauge', { exact: true }).fill('Tee gauge');
  await page.getByRole('radio', { name: /On the hose, before the ball valve/ }).check();
  await page.getByRole('radio', { name: 'No', exact: true }).check();
  await page.getByRole('button', { name: 'Keep the rig' }).click();
  await expect(page.getByRole('alert')).toContainText('This place speaks of a valve.');
  await page.getByRole('radio', { name: /^Yes/ }).check();
  await page.getByRole('button', { name: 'Keep the rig' }).click();
  await expect(page.getByText('The rig is kept.')).toBeVisible();
  await page.getByRole('radio', { name: /It fell with the supply/ }).check();
  await page.getByRole('button', { name: 'Keep the outcome' }).click();
  await expect(page.getByText('The outcome is kept.')).toBeVisible();
  await expectAccessible(page);
  await open(page, `/coaches/${coachId}`);
  await expect(page.getByRole('heading', { name: 'Before the first fill' })).toHaveCount(0);
});

test('an owner replaces a tire, moves one and sets targets', async ({ page }) => {
  const owner = await createUser();
  const { coachId, tires } = await createCoach(owner.id);
  await signIn(page, owner.id);
  await open(page, `/coaches/${coachId}/tires`);
  await page.getByRole('link', { name: 'Change Steer left' }).click();
  await page.getByRole('radio', { name: /Another tire was fitted/ }).check();
  await page.getByLabel('Tire size').fill('11R22.5');
  await page.getByRole('button', { name: 'Keep it' }).click();
  await expect(page.getByText('The tires are kept.')).toBeVisible();
  await page.getByRole('link', { name: 'Change Steer right' }).click();
  await page.getByLabel('Changes places with').selectOption('Drive left inner');
  await page.getByRole('button', { name: 'Move both' }).click();
  await expect(page.getByText('The tires are kept.')).toBeVisible();
  await expectAccessible(page);
  const now = await query<{ position: string; tire_id: string }>(
    'SELECT position, tire_id FROM fittings WHERE coach_id = $1 AND fitted_until IS NULL',
    [coachId],
  );
  const at = (position: string) => now.find((row) => row.position === position)?.tire_id;
  expect(at('steer-left')).not.toBe(tires['steer-left']);
  expect(at('drive-left-inner')).toBe(tires['steer-right']);
  expect(at('steer-right')).toBe(tires['drive-left-inner']);

  await open(page, `/coaches/${coachId}/targets`);
  await page.getByLabel('Steer axle').fill('130');
  await page.getByRole('button', { name: 'Keep the targets' }).click();
  await expect(page.getByRole('alert')).toContainText('130 psi is above what the tire allows');
  await page.getByLabel('Steer axle').fill('108.5');
  await page.getByRole('button', { name: 'Keep the targets' }).click();
  await expect(page.getByText('The targets are kept.')).toBeVisible();
  const [newest] = await query<{ kpa: number }>(
    `SELECT target_kpa AS kpa FROM axle_targets JOIN axles ON axles.id = axle_id
     WHERE coach_id = $1 AND kind = 'steer' ORDER BY set_at DESC LIMIT 1`,
    [coachId],
  );
  expect(newest?.kpa).toBeCloseTo(108.5 * kpaPerPsi, 6);
});

test('a driver reads everything and finds no way to change it', async ({ page }) => {
  const { coachId } = await createCoach((await createUser()).id);
  const driver = await createUser();
  await addMember(coachId, driver.id, 'driver');
  await signIn(page, driver.id);
  for (const part of ['tires', 'targets', 'air', 'settings']) {
    await open(page, `/coaches/${coachId}/${part}`);
    await expect(page.getByRole('main').getByRole('button')).toHaveCount(0);
    await expect(page.getByRole('link', { name: /^Change/ })).toHaveCount(0);
  }
  await open(page, `/coaches/${coachId}`);
  await expect(page.getByRole('link', { name: 'Start a round' })).toBeVisible();
});

test('a coach is removed only when its name is typed', async ({ page }) => {
  const owner = await createUser();
  const { coachId } = await createCoach(owner.id, { name: 'Old Plover' });
  await signIn(page, owner.id);
  await open(page, `/coaches/${coachId}/settings`);
  await page.getByLabel('Its name, to be sure').fill('Old');
  await page.getByRole('button', { name: 'Remove the coach' }).click();
  await expect(page.getByRole('alert')).toContainText('Type “Old Plover” to remove it.');
  await page.getByLabel('Its name, to be sure').fill('old plover');
  await page.getByRole('button', { name: 'Remove the coach' }).click();
  await expect(page.getByRole('heading', { name: 'No coach yet' })).toBeVisible();
  expect((await page.goto(`/coaches/${coachId}`))?.status()).toBe(404);
});

test.describe('without script', () => {
  test.use({ javaScriptEnabled: false });

  test('a coach is made and its volume estimated on the server', async ({ page }) => {
    await signIn(page, (await createUser({ pressureUnit: 'kPa' })).id);
    await page.goto('/coaches/new');
    await page.getByLabel('Name', { exact: true }).fill('Late Heron');
    for (const name of ['Steer', 'Drive']) {
      const axle = page.getByRole('group', { name: `${name} axle` });
      await axle.getByLabel('Target, cold').fill('650');
      await axle.getByLabel('Tire size').fill('295/75R22.5');
      await axle.getByLabel('Sidewall limit').fill('830');
      await axle.getByLabel('Wheel limit').fill('8,5 bar');
    }
    await page.getByRole('button', { name: 'Make the coach' }).click();
    await expect(page.getByRole('heading', { name: 'Late Heron' })).toBeVisible();
    const [tire] = await query<{ wheel: number; source: string }>(
      `SELECT wheel_limit_kpa AS wheel, volume_source AS source
       FROM fittings JOIN tires ON tires.id = tire_id WHERE fittings.coach_id = $1 LIMIT 1`,
      [coachIdOf(page)],
    );
    expect(tire).toEqual({ wheel: 850, source: 'estimated' });
  });
});
