import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect, test } from 'playwright/test';
import { complaintsOf, expectAccessible, goTo } from './page-checks.ts';
import { rowsInPdf } from './printed-rows.ts';
import { Program } from './program.ts';

let program: Program;

test.beforeEach(async () => {
  program = await Program.inNewHome();
});

test.afterEach(async () => {
  await program.end();
});

interface FiledSet {
  readonly groups: readonly {
    readonly smoothing: { readonly method: string; readonly degree: number; readonly converged: boolean };
    readonly rows: readonly {
      readonly score: number;
      readonly printed: string;
      readonly smoothed: { readonly 'percentile-rank': number };
      readonly interval: { readonly low: number; readonly high: number };
    }[];
  }[];
}

test('smoothed ranks with their intervals, from the Curve station to print', async ({ page }) => {
  const complaints = complaintsOf(page);
  await page.goto(await program.start());
  await page.getByRole('button', { name: 'Open the sample cohort' }).click();

  await goTo(page, 'Curve');
  await page.locator('[data-choice="smoothing"]').click();
  await page.getByRole('radio', { name: /^smoothed by a log-linear model Keeps/ }).click();
  await expect(page.getByRole('columnheader', { name: 'BIC' })).toBeVisible();
  await page.locator('[data-choice="degree"]').click();
  await page.getByRole('radio', { name: /^chosen by AIC/ }).click();
  await expect(page.getByText(/Largest move of a rank/)).toBeVisible();
  await page.locator('[data-choice="reliability"]').click();
  await page.getByRole('textbox', { name: 'Reliability of the test' }).fill('0.9');
  await page.getByRole('button', { name: 'Use this' }).click();

  await page.getByRole('textbox', { name: 'samples' }).fill('100');
  await page.keyboard.press('Tab');
  await page.getByRole('button', { name: 'Draw', exact: true }).click();
  await expect(page.getByText('could be treated so')).toContainText(/100 of\s+100 samples/, { timeout: 30_000 });
  await expectAccessible(page);

  await page.getByRole('button', { name: 'Smooth Grade 4 in its own way' }).click();
  await page.locator('[data-choice="degree"]').click();
  await page.getByRole('radio', { name: /^3 Keeps/ }).click();
  await page.getByRole('button', { name: 'All groups' }).click();
  await expect(page.getByRole('button', { name: /^Grade 4 n = .* degree 3, \d+ ranks change$/ })).toBeVisible();
  await expectAccessible(page);

  await goTo(page, 'Table');
  await page.locator('[data-choice="columns"]').click();
  await page.getByRole('checkbox', { name: /^95 % interval/ }).click();
  await page.getByRole('checkbox', { name: /^measurement band/ }).click();
  await page.getByRole('button', { name: 'Done' }).click();
  await page.getByRole('button', { name: /^95 % interval .*, raw score 24$/ }).click();
  await expect(page.getByText(/^The 95 % Wilson interval of the observed share/)).toBeVisible();
  await expect(page.getByRole('heading', { name: 'What else could be printed?' })).toBeVisible();

  await goTo(page, 'Release');
  await page.getByRole('button', { name: 'Press a proof' }).click();
  await expect(page.getByText('Pressed.')).toBeVisible({ timeout: 60_000 });
  await expect(page.getByText(/Smoothed tables are not worked out a second time\./)).toBeVisible();
  const [folder = ''] = readdirSync(program.projects).map((name) => join(program.projects, name));
  const filed = JSON.parse(readFileSync(join(folder, 'norm-set.json'), 'utf8')) as FiledSet;
  expect(filed.groups.map(({ smoothing }) => [smoothing.method, smoothing.converged])).toEqual(
    Array(3).fill(['log-linear', true]),
  );
  expect(filed.groups[0]?.smoothing.degree).toBe(3);
  const titles = ['Grade 4', 'Grade 5', 'Grade 6'];
  const expected = filed.groups.flatMap(({ rows }, index) =>
    rows.map(({ score, printed }) => `${titles[index] ?? ''}|${String(score)}|${printed}`),
  );
  const inPdf = await rowsInPdf(new Uint8Array(readFileSync(join(folder, 'booklet.pdf'))));
  expect(inPdf.map(({ group, score, printed }) => `${group}|${score}|${printed}`).sort()).toEqual(expected.sort());
  expect(complaints).toEqual([]);
});

test('ranks made by another rule are recognised, and a group that cannot be smoothed is not pressed', async ({
  page,
}) => {
  await page.goto(await program.start());
  await page.getByRole('button', { name: 'New norm project' }).click();
  await page.getByRole('button', { name: 'Type or paste counts' }).click();
  await page
    .getByRole('textbox', { name: 'Counts, one score and its count a line' })
    .fill('0 2\n1 5\n2 11\n3 14\n4 9\n5 6\n6 3');
  await page.getByRole('button', { name: 'Take these counts' }).click();

  await goTo(page, 'Table');
  await page.getByRole('button', { name: 'Compare with somebody’s ranks' }).click();
  // 100 (below + at)/50, whole numbers.
  await page.getByRole('textbox', { name: 'Raw score and rank' }).fill('0 4\n1 14\n2 36\n3 64\n4 82\n5 94\n6 100');
  await page.getByRole('button', { name: 'Compare', exact: true }).click();
  await expect(page.getByText(/^All 7 ranks are reproduced by: scoring at the same score or below/)).toBeVisible();

  await goTo(page, 'Curve');
  await page.locator('[data-choice="smoothing"]').click();
  await page.getByRole('radio', { name: /^smoothed by a log-linear model Keeps/ }).click();
  await page.locator('[data-choice="degree"]').click();
  await page.getByRole('radio', { name: /^9 / }).click();
  await expect(page.getByRole('button', { name: /^Take what works nearest/ })).toBeVisible();
  await goTo(page, 'Release');
  await page.getByRole('button', { name: 'Press a proof' }).click();
  await expect(page.getByRole('alert')).toContainText('cannot be smoothed as chosen');
  await page.getByRole('button', { name: 'Close' }).click();
  await goTo(page, 'Curve');
  await page.getByRole('button', { name: /^Take what works nearest/ }).click();
  await expect(page.getByText(/Largest move of a rank/)).toBeVisible();
});
