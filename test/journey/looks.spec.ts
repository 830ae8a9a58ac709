import { expect, test } from 'playwright/test';
import { complaintsOf, expectAccessible, expectNoSidewaysScroll, goTo } from './page-checks.ts';
import { Program } from './program.ts';

const STATIONS = ['Cohort', 'Groups', 'Curve', 'Table', 'Sheet', 'Release'];
const SIZES = [
  { width: 1024, height: 700, scheme: 'light' },
  { width: 1440, height: 900, scheme: 'light' },
  { width: 1280, height: 800, scheme: 'dark' },
] as const;

let program: Program;

test.beforeEach(async () => {
  program = await Program.inNewHome();
});

test.afterEach(async () => {
  await program.end();
});

for (const { width, height, scheme } of SIZES) {
  test(`every station at ${width}×${height}, ${scheme}`, async ({ page }) => {
    const complaints = complaintsOf(page);
    await page.setViewportSize({ width, height });
    await page.emulateMedia({ colorScheme: scheme });
    await page.goto(await program.start());
    const shot = (name: string): Promise<unknown> =>
      page.screenshot({ path: `.cache/journey-pictures/${name.toLowerCase()}-${width}-${scheme}.png` });
    await expect(page.getByRole('heading', { name: 'Normloom' })).toBeVisible();
    await expectAccessible(page);
    await shot('Start');
    await page.getByRole('button', { name: 'Open the sample cohort' }).click();
    for (const station of STATIONS) {
      await goTo(page, station);
      if (station === 'Table') await page.getByRole('button', { name: /^percentile rank .*, raw score 24$/ }).click();
      if (station === 'Sheet') await expect(page.getByText(/^page 1 of \d+$/)).toBeVisible({ timeout: 30_000 });
      await page.waitForTimeout(400);
      await expectNoSidewaysScroll(page);
      await expectAccessible(page);
      await shot(station);
    }
    expect(complaints).toEqual([]);
  });
}
