import { defineConfig } from '@playwright/test';

import { CHROMIUM_FLAGS, findChromium } from './browser.mjs';

const report = process.env.STRANDLINE_BROWSER_REPORT;

export default defineConfig({
  testDir: '../e2e',
  globalSetup: './serve-built-app.ts',
  outputDir: '../../test-results',
  workers: 1,
  retries: 0,
  timeout: 90_000,
  expect: { timeout: 15_000 },
  reporter: report ? [['list'], ['json', { outputFile: report }]] : [['list']],
  use: {
    baseURL: process.env.STRANDLINE_TEST_URL,
    actionTimeout: 20_000,
    navigationTimeout: 30_000,
    viewport: { width: 1440, height: 960 },
    locale: 'en-GB',
    timezoneId: 'Europe/Zurich',
    screenshot: 'only-on-failure',
    launchOptions: { executablePath: findChromium() ?? undefined, args: CHROMIUM_FLAGS },
  },
});
