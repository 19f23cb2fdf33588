import type { Page } from '@playwright/test';
import { walkTo, type Answers } from './support/at-the-car';
import { bringChecker, measuredControls, sideways, violations } from './support/measured';
import { expect, test } from './support/test';
import { openVisit, signIn } from './support/visits';
import { rowsOf } from './support/what-is-kept';

const tablet = { width: 1280, height: 800 } as const;
const sizes = [tablet, { width: 800, height: 1280 }, { width: 360, height: 740 }] as const;
const gear: Answers = {
  gear: { gauge: 'G-12', scanTool: 'S-3', probe: 'L-2', barometer: 'B-1', thermometer: 'T-4' },
};

/** The screen fits each size, breaks no rule of accessibility, and keeps its contrast by night and in glare. */
async function checkScreen(page: Page, name: string): Promise<void> {
  for (const size of sizes) {
    await page.setViewportSize(size);
    expect.soft(await sideways(page), `${name} at ${size.width} x ${size.height}`).toEqual([]);
  }
  await page.setViewportSize(tablet);
  expect.soft(await violations(page), `${name} by day`).toEqual([]);
  for (const theme of ['night', 'glare']) {
    await page.evaluate((to) => (document.documentElement.dataset['theme'] = to), theme);
    expect.soft(await violations(page, ['color-contrast']), `${name}, ${theme}`).toEqual([]);
  }
  await page.evaluate(() => (document.documentElement.dataset['theme'] = 'day'));
}

test('each kind of screen fits a tablet both ways and a phone, breaks no rule of accessibility, and suits a glove', async ({
  page,
  product,
}) => {
  test.setTimeout(120_000);
  await page.emulateMedia({ reducedMotion: 'reduce' });
  await bringChecker(page);
  await page.goto('/');
  await expect(page.getByRole('heading', { name: 'Sign in' })).toBeVisible();
  await checkScreen(page, 'sign-in');

  // A lead may enter every room.
  await signIn(page, 'adeyemi');
  await expect(page.locator('bay-ready-list')).toContainText(/[1-9]\d* procedure/);
  await checkScreen(page, 'Bench');

  await openVisit(page, {
    VIN: '7ZZFD9HA0NP310446',
    Make: 'Merrow',
    Model: 'Packhorse',
    'Repair order (RO)': '4490',
    Odometer: '152300',
    "Concern, in the customer's words": 'Whistle at idle, hesitates under load',
  });
  await page.getByRole('button', { name: 'Keep the visit' }).click();
  await expect(page.getByText('Procedures that fit')).toBeVisible();
  await checkScreen(page, 'Visit');

  await page.getByRole('button', { name: /Start the cold half/ }).click();
  await walkTo(page, '2e', gear);
  await expect(page.locator('bay-number-pad')).toBeVisible();
  await checkScreen(page, 'reading step');
  const { keys, nearestToStop } = await measuredControls(page);
  expect(keys.map(({ name }) => name)).toHaveLength(12);
  for (const { name, widthMm, heightMm } of keys) {
    expect.soft(widthMm, `width of ${name}`).toBeGreaterThanOrEqual(20);
    expect.soft(heightMm, `height of ${name}`).toBeGreaterThanOrEqual(16);
  }
  expect.soft(nearestToStop.mm, `from Stop to ${nearestToStop.name}`).toBeGreaterThanOrEqual(13);

  const sent = () => rowsOf(product.databaseUrl, `SELECT 1 FROM run WHERE repair_order = '4490'`);
  await expect.poll(sent, { timeout: 20_000 }).toHaveLength(1);
  await page.goto('/records');
  await expect(page.locator('bay-record-table').getByText('4490').first()).toBeVisible();
  await checkScreen(page, 'Record room');
});
