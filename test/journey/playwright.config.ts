import { defineConfig } from 'playwright/test';

const browser = process.env['BROWSER_PATH'];

/** Journeys start the browser host themselves; each has the machine for itself, so that times mean something. */
export default defineConfig({
  testDir: '.',
  testMatch: '**/*.spec.ts',
  outputDir: '../../.cache/journey',
  workers: 1,
  timeout: 120_000,
  expect: { timeout: 15_000 },
  forbidOnly: true,
  retries: 0,
  reporter: [['list'], ['json', { outputFile: '../../.cache/journey.json' }]],
  use: {
    browserName: 'chromium',
    viewport: { width: 1280, height: 860 },
    locale: 'en-GB',
    acceptDownloads: true,
    trace: 'retain-on-failure',
    launchOptions: browser === undefined ? {} : { executablePath: browser },
  },
});
