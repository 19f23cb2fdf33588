import type { Page } from '@playwright/test';
import { tap, walkTo, type Answers } from './support/at-the-car';
import { expect, test } from './support/test';
import { readyWithoutNetwork, signIn } from './support/visits';
import { rowsOf } from './support/what-is-kept';

/** Takes the ramp that the bench offers, and says that the noise never stopped. */
async function listenToTheBench(page: Page): Promise<void> {
  await page.getByRole('button', { name: 'Take a log of the scan tool instead' }).click();
  await page.getByRole('button', { name: /Take the bench's log/ }).click();
  await expect(page.getByText('421 samples')).toBeVisible();
  await tap(page.getByRole('button', { name: 'Take this series' }));
  await tap(page.getByRole('button', { name: 'It never stopped' }));
}

/** What a careful apprentice enters, told by the bench alone. */
const coldMorning: Answers = {
  gear: { gauge: 'G-12', scanTool: 'S-3', probe: 'L-2', barometer: 'B-1', thermometer: 'T-4' },
  read: { '2e': ['14', '13'], '4': ['1014'], '5': ['94.0'], '6': ['93.7'], '15b': ['0.0'] },
  way: { '4': 'Altimeter setting' },
  codes: { '3': ['P0068 stored', 'P0171 pending'], '18a': ['P0068 stored', 'P0171 pending'] },
  choose: {
    '13': ['Only at the manifold valve'],
    '17b': ['Carbon on it'],
    '18b': ['They are cleared'],
    '19': ['The other half is still to come'],
  },
  text: { '17b': 'a black crust on one side of the plate' },
  listen: listenToTheBench,
};

test('an apprentice finds a planted fault without a network, is told so, and nothing of it is ever sent', async ({
  product,
  switchOn,
}) => {
  test.setTimeout(180_000);
  const { page, context } = await switchOn();
  await signIn(page, 'brandt');
  await readyWithoutNetwork(page);
  await context.setOffline(true);

  await page.goto('/practice');
  await expect(page.locator('bay-practice-bay-page')).toHaveClass(/practice-edge/);
  await page.getByRole('button', { name: /Start\s+A cold morning, hissing somewhere/ }).click();
  await expect(page.locator('bay-run-header')).toContainText('Practice');
  await expect(page.locator('.practice-edge')).toBeVisible();

  await walkTo(page, '5', coldMorning);
  await expect(page.getByRole('region', { name: 'What the bench shows' })).toContainText('94.0 kPa');
  await walkTo(page, 'the end', coldMorning);
  for (const name of [/Keep the write-up/, /To the closing/, 'Close the run', 'To the debrief']) {
    await tap(page.getByRole('button', { name }));
  }

  await expect(page.getByRole('heading', { name: 'You found what was planted.' })).toBeVisible();
  await expect(page.getByText('Carbon on the plate holds the manifold valve open')).toBeVisible();
  await expect(page.getByText(/All \d+ as the instruments showed them/)).toBeVisible();
  await page.getByRole('link', { name: 'Back to the Practice bay' }).click();
  await expect(page.getByText('tried once, found once')).toBeVisible();

  await context.setOffline(false);
  await page.goto('/');
  await expect(page.getByText(/All sent/)).toBeVisible({ timeout: 30_000 });
  expect(await rowsOf(product.databaseUrl, 'SELECT run_id FROM run')).toEqual([]);
});
