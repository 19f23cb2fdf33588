import type { Browser, Page } from '@playwright/test';
import { tap } from './support/at-the-car';
import { expect, test } from './support/test';
import { readyWithoutNetwork, signIn } from './support/visits';
import { rowsOf } from './support/what-is-kept';

// What is begun here would be on every other file's Bench as well.
test.use({ productName: 'same-half' });

/** A tablet of its own on the visit that waits, ready to go without a network. */
async function tabletAtVisit(browser: Browser, name: string): Promise<Page> {
  const page = await (await browser.newContext({ viewport: { width: 1280, height: 800 } })).newPage();
  await signIn(page, name);
  await readyWithoutNetwork(page);
  await page.getByRole('link', { name: /^Take it/ }).click();
  await expect(page.getByRole('button', { name: /the cold half/ })).toBeVisible();
  return page;
}

async function beginColdHalf(page: Page): Promise<void> {
  await page.getByRole('button', { name: /Start the cold half/ }).click();
  await expect(page.locator('.frame h1').first()).toBeVisible();
}

test('the same half on two tablets: neither is blocked offline, both are told, a third is begun with a reason alone', async ({
  product,
  browser,
}) => {
  test.setTimeout(120_000);
  const one = await tabletAtVisit(browser, 'okafor');
  const other = await tabletAtVisit(browser, 'adeyemi');
  const visit = one.url();
  for (const page of [one, other]) {
    await page.context().setOffline(true);
    await beginColdHalf(page);
  }

  // Both come back to the network: each hears of the other's run with the next sync.
  await one.context().setOffline(false);
  await other.context().setOffline(false);
  const runs = () => rowsOf<{ status: string }>(product.databaseUrl, 'SELECT status FROM run');
  await expect.poll(async () => (await runs()).length, { timeout: 30_000 }).toBe(2);
  await other.goto('/');
  await expect(other.locator('bay-twice-begun')).toContainText('the cold half was begun twice', { timeout: 30_000 });
  await expect(other.locator('bay-twice-begun')).toContainText(/I\. Okafor, today \d+:\d\d, on tablet .*: still open/i);
  await one.goto('/');
  await expect(one.locator('bay-twice-begun')).toContainText(/R\. Adeyemi, today .*: still open/, { timeout: 30_000 });
  await one.getByRole('link', { name: 'See the visit' }).click();
  await expect(one).toHaveURL(visit);
  await expect(one.locator('bay-twice-begun')).toContainText(
    'The cold half was begun twice. Neither knew of the other',
  );

  // Another one is not begun by a mere tap.
  await one.getByRole('button', { name: /Cold half again/ }).click();
  await expect(one.getByRole('heading', { name: /was begun on this visit already, 2 times/ })).toBeFocused();
  await expect(one.getByRole('link', { name: /^Open it/ })).toHaveCount(1);
  await tap(one.getByRole('button', { name: 'Begin another' }));
  await expect(one.getByRole('alert')).toContainText('Say why another is begun');
  await one.getByRole('button', { name: 'The other one was given up' }).click();
  await tap(one.getByRole('button', { name: 'Begin another' }));
  await expect(one.locator('.frame h1').first()).toBeVisible();
  await expect.poll(async () => (await runs()).length, { timeout: 30_000 }).toBe(3);

  // In the Record room the three stand side by side, with the reason for the third.
  await other.goto('/records');
  await other.locator('bay-record-table').getByRole('link').first().click();
  const region = other.getByRole('region', { name: '3 runs of the same cold half' });
  await expect(region.getByRole('listitem')).toHaveCount(3);
  await expect(region).toContainText('The other one was given up');
  await expect(region).toContainText('Not each was begun knowing of the others');
  await one.context().close();
  await other.context().close();
});
