import type { Page } from '@playwright/test';
import { expect } from './test';

/** Signs in on the sign-in page, wherever the app asked for it. */
export async function signIn(page: Page, name: string, password = 'ossenholt-demo'): Promise<void> {
  await page.goto('/');
  await page.getByLabel('Name').fill(name);
  await page.getByLabel('Password', { exact: true }).fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await expect(page.locator('bay-top-bar')).toBeVisible();
}

/** Signs out from the person's menu, which every page but a run's has. */
export async function signOut(page: Page, displayName: string): Promise<void> {
  await page.getByRole('button', { name: displayName }).click();
  await page.getByRole('button', { name: 'Sign out' }).click();
  await expect(page.getByRole('heading', { name: 'Sign in' })).toBeVisible();
}

/** Waits until the page's service worker controls it, all is cached and the procedures are there: the network may go. */
export async function readyWithoutNetwork(page: Page): Promise<void> {
  await page.evaluate(async () => {
    await navigator.serviceWorker.ready;
  });
  await expect
    .poll(() => page.evaluate(async () => (await caches.keys()).some((key) => key.includes(':assets:app:cache'))))
    .toBe(true);
  await page.reload();
  await expect.poll(() => page.evaluate(() => navigator.serviceWorker.controller !== null)).toBe(true);
  await expect(page.getByText('Ready without network')).toBeVisible();
  await expect(page.locator('bay-ready-list')).toContainText(/[1-9]\d* procedure/);
}

/** The typed part of a new visit; every field by its label. */
export async function openVisit(page: Page, fields: Readonly<Record<string, string>>): Promise<void> {
  await page
    .getByRole('link', { name: 'New visit' })
    .or(page.getByRole('button', { name: 'New visit' }))
    .click();
  for (const [label, text] of Object.entries(fields)) await page.getByRole('textbox', { name: label }).fill(text);
}
