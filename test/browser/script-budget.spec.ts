import { gzipSync } from 'node:zlib';
import type { Browser, Page } from '@playwright/test';
import { expect, test } from './support/test';
import { signIn } from './support/visits';

/** What a technician's tablet may have to fetch of script, gzip, before the first step can be read. */
const budgetBytes = 220_000;

/** In every build of it and in nothing else: a message of mathjs, the expression library. */
const expressionLibrary = 'Unexpected end of expression';

/** The library's own chunk has 53 kB: what is more than this lies in it and should be counted. */
const libraryBytes = 56_000;

interface Script {
  readonly name: string;
  readonly bytes: number;
  readonly isLibrary: boolean;
}

/**
 * A page without a service worker that notes every script as it comes. What the app fetches in idle time is left out:
 * nobody waits for it.
 */
async function countedPage(browser: Browser): Promise<{ page: Page; scripts: () => Promise<readonly Script[]> }> {
  const context = await browser.newContext({ serviceWorkers: 'block' });
  const page = await context.newPage();
  await page.addInitScript(() => {
    window.requestIdleCallback = () => 0;
  });
  const coming: Promise<Script>[] = [];
  page.on('response', (response) => {
    if (response.request().resourceType() !== 'script') return;
    const name = new URL(response.url()).pathname;
    coming.push(
      response
        .body()
        .then((body) => ({ name, bytes: gzipSync(body).length, isLibrary: body.includes(expressionLibrary) })),
    );
  });
  return { page, scripts: () => Promise.all(coming) };
}

const sum = (scripts: readonly Script[]): number => scripts.reduce((total, { bytes }) => total + bytes, 0);

test('from the sign-in to the first step at most 220 kB of script are fetched, without the expression library', async ({
  browser,
}, info) => {
  const { page, scripts } = await countedPage(browser);
  await signIn(page, 'okafor');
  await page.getByRole('link', { name: /^Take it/ }).click();
  await page.getByRole('button', { name: /the cold half|Cold half again/ }).click();
  await expect(page.locator('bay-start-entry h1').first()).toBeVisible();
  const come = await scripts();
  const library = come.filter(({ isLibrary }) => isLibrary);
  expect(library).toHaveLength(1);
  expect(sum(library)).toBeLessThanOrEqual(libraryBytes);
  const fetched = come.filter(({ isLibrary }) => !isLibrary).sort((a, b) => b.bytes - a.bytes);
  const total = sum(fetched);
  const largest = fetched.slice(0, 12).map(({ name, bytes }) => `${bytes} ${name}`);
  info.annotations.push({ type: 'script', description: `${total} bytes gzip in ${fetched.length} files` });
  expect(total, largest.join('\n')).toBeGreaterThan(100_000);
  expect(total, largest.join('\n')).toBeLessThanOrEqual(budgetBytes);
  await page.context().close();
});
