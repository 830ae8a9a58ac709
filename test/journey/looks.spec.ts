import { expect, test, type Page } from 'playwright/test';
import { complaintsOf, DARK, expectAccessible, goTo, keepPicture, LARGE, showIn, SMALL } from './page-checks.ts';
import { Program } from './program.ts';

const STATIONS = ['Cohort', 'Groups', 'Curve', 'Table', 'Sheet', 'Release'];

let program: Program;

test.beforeEach(async () => {
  program = await Program.inNewHome();
});

test.afterEach(async () => {
  await program.end();
});

/** What the checker finds depends on the colours, not on the size of the window: it looks once in each scheme. */
async function lookAt(page: Page, name: string): Promise<void> {
  for (const look of [SMALL, LARGE, DARK]) {
    await showIn(page, look);
    await page.waitForTimeout(250);
    if (look !== LARGE) await expectAccessible(page);
    await keepPicture(page, name.toLowerCase(), look);
  }
}

test('every station in the least window, a usual one and a dark one', async ({ page }) => {
  test.setTimeout(240_000);
  const complaints = complaintsOf(page);
  await page.goto(await program.start());
  await expect(page.getByRole('heading', { name: 'Normloom' })).toBeVisible();
  await lookAt(page, 'Start');
  await page.getByRole('button', { name: 'Open the sample cohort' }).click();
  for (const station of STATIONS) {
    await goTo(page, station);
    if (station === 'Table') await page.getByRole('button', { name: /^percentile rank .*, raw score 24$/ }).click();
    if (station === 'Sheet') await expect(page.getByText(/^page 1 of \d+$/)).toBeVisible({ timeout: 30_000 });
    await lookAt(page, station);
  }
  expect(complaints).toEqual([]);
});
