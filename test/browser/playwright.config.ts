import { defineConfig } from '@playwright/test';
import { chromiumPath, chromiumSwitches } from './support/chromium';

/** Real Chromium from Debian's packages, against servers that the tests start themselves. */
export default defineConfig({
  testDir: '.',
  testMatch: '**/*.spec.ts',
  outputDir: '../../test-results/browser',
  globalSetup: './support/begin.mjs',
  // Three tablets at a time: each mostly waits, as a person would.
  workers: 3,
  fullyParallel: false,
  retries: 0,
  forbidOnly: true,
  timeout: 60_000,
  expect: { timeout: 10_000 },
  reporter: [['list'], ['json', { outputFile: '../../test-results/browser.json' }]],
  use: {
    browserName: 'chromium',
    headless: true,
    actionTimeout: 15_000,
    launchOptions: { executablePath: chromiumPath, args: [...chromiumSwitches] },
    // A tablet that lies on the fender.
    viewport: { width: 1280, height: 800 },
    locale: 'en-GB',
    timezoneId: 'UTC',
    trace: 'retain-on-failure',
  },
});
