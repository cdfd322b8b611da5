import { defineConfig } from '@playwright/test';

const url = process.env['WINDCHEST_URL'];
if (!url) throw new Error('WINDCHEST_URL is not set: run the journeys through `npm test -- e2e`.');

/** The journeys, in Debian's Chromium, against a whole running stand. */
export default defineConfig({
  testDir: '.',
  timeout: 90_000,
  expect: { timeout: 15_000 },
  workers: 2,
  fullyParallel: false,
  retries: 0,
  forbidOnly: true,
  outputDir: '../.windchest/test-results',
  use: {
    baseURL: url,
    locale: 'en-IE',
    timezoneId: 'Europe/Dublin',
    viewport: { width: 1280, height: 900 },
    screenshot: 'only-on-failure',
    launchOptions: {
      executablePath: process.env['CHROMIUM'] ?? '/usr/bin/chromium',
      args: ['--no-sandbox', '--disable-dev-shm-usage', '--disable-background-networking', '--no-first-run'],
    },
  },
});
