import { defineConfig } from 'playwright/test';

const browser = process.env['BROWSER_PATH'];

/** Journeys start the browser host themselves, each its own in a home of its own, so that several can walk side by side. */
export default defineConfig({
  testDir: '.',
  testMatch: '**/*.spec.ts',
  outputDir: '../../.cache/journey',
  workers: 2,
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
    // A trace of every step makes the walk half as long again: npm run journey -- --trace on keeps one.
    launchOptions: browser === undefined ? {} : { executablePath: browser },
  },
});
