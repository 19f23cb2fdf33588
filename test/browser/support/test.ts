import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { test as base, type ViewportSize } from '@playwright/test';
import { startProduct, type Product } from './product';
import { launchTablet, type Tablet } from './tablet';

/** Switches this test's tablet on (again): the profile is the test's own and outlives a closed or killed browser. */
export type SwitchOn = (options?: { viewport?: ViewportSize; switches?: readonly string[] }) => Promise<Tablet>;

/**
 * The browser tests' `test`: `product` is one per worker, `page` and `switchOn` are each test's own. A file that changes
 * what all others rely on names a product of its own with `test.use({ productName })`.
 *
 *     test('keeps a reading that was typed offline', async ({ product, switchOn }) => { ... });
 */
export const test = base.extend<{ switchOn: SwitchOn }, { productName: string; product: Product }>({
  productName: ['shared', { scope: 'worker', option: true }],
  product: [
    // Playwright reads the parameters' text, so an empty pattern has to stand here.
    async ({}, use) => {
      const product = await startProduct();
      await use(product);
      await product.remove();
    },
    { scope: 'worker', timeout: 120_000 },
  ],
  baseURL: async ({ product }, use) => use(product.baseUrl),
  switchOn: async ({ product }, use) => {
    const userDataDir = mkdtempSync(join(tmpdir(), 'bayhand-tablet-'));
    const tablets: Tablet[] = [];
    await use(async (options = {}) => {
      const tablet = await launchTablet({ userDataDir, baseUrl: product.baseUrl, ...options });
      tablets.push(tablet);
      return tablet;
    });
    for (const tablet of tablets) await tablet.close();
    rmSync(userDataDir, { recursive: true, force: true });
  },
});

export { expect } from '@playwright/test';
