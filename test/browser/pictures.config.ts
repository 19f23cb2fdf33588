import { defineConfig } from '@playwright/test';
import config from './playwright.config';

/** Takes the pictures of every screen: `npm run screenshots`. */
export default defineConfig(config, {
  testMatch: '**/take-pictures.ts',
  outputDir: '../../test-results/pictures',
  timeout: 600_000,
  workers: 1,
  reporter: [['list']],
});
